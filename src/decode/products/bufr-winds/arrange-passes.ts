import { Problem } from '../../../problems/problem.ts';
import type { CellTable } from './cell-table.ts';

/** One pass: which cell of the table stands at each row and column, row-major; -1 where the swath never looked. */
export interface PassPlan {
  rows: number;
  columns: number;
  cellAt: Int32Array;
}

/** Rows further apart than this belong to different passes. */
const LONGEST_PAUSE_MS = 20 * 60_000;

/** Cells of one numbered row are seen within this time; a row number met again later is another row. */
const LONGEST_ROW_MS = 60_000;

/** A pass of more places than this must fill one in so many: damaged times would make a row of every cell. */
const MOST_PLACES = 1_000_000;
const MOST_PLACES_PER_CELL = 16;

/**
 * Puts cells in rows by their time and in columns by their cross-track cell number, and parts passes where the platform
 * or the cell size changes or time pauses. A row may go on from one message to the next. A cell that stands twice gets
 * a row of its own, so that nothing the file holds is lost. Cells without a place or time are in no pass.
 */
export function arrangePasses(table: CellTable): PassPlan[] {
  const { platformCode, cellSizeM, cellNumber } = table;
  const rowTimeMs = timeRows(table);
  const isSamePass = (a: number, b: number) =>
    Object.is(platformCode[a], platformCode[b]) &&
    Object.is(cellSizeM[a], cellSizeM[b]) &&
    rowTimeMs[b] - rowTimeMs[a] <= LONGEST_PAUSE_MS;
  const order = sortCells(
    listPlacedCells(table),
    (a, b) =>
      compareNumbers(platformCode[a], platformCode[b]) ||
      compareNumbers(cellSizeM[a], cellSizeM[b]) ||
      rowTimeMs[a] - rowTimeMs[b] ||
      cellNumber[a] - cellNumber[b],
  );
  const passes: PassPlan[] = [];
  for (let first = 0; first < order.length; ) {
    let next = first + 1;
    while (next < order.length && isSamePass(order[next - 1], order[next])) next++;
    passes.push(planPass(order.subarray(first, next), rowTimeMs, cellNumber));
    first = next;
  }
  return passes;
}

/** Whether a cell can be drawn: it has a place, a time and a number across the track. */
export function isPlaced({ cells, cellNumber }: CellTable, cell: number): boolean {
  return !Number.isNaN(cells.timeMs[cell] + cells.lon[cell] + cells.lat[cell] + cellNumber[cell]);
}

/** The time a cell's row goes by: its own, or that of the first cell of a row the file numbers. */
function timeRows({ cells, rowNumber }: CellTable): Float64Array {
  const { timeMs } = cells;
  const rowTimeMs = timeMs.slice();
  for (let i = 1; i < rowTimeMs.length; i++) {
    if (rowNumber[i] !== rowNumber[i - 1]) continue;
    if (Math.abs(timeMs[i] - rowTimeMs[i - 1]) <= LONGEST_ROW_MS) rowTimeMs[i] = rowTimeMs[i - 1];
  }
  return rowTimeMs;
}

function listPlacedCells(table: CellTable): Int32Array {
  const placed = new Int32Array(table.cellNumber.length);
  let count = 0;
  for (let cell = 0; cell < placed.length; cell++) if (isPlaced(table, cell)) placed[count++] = cell;
  return placed.subarray(0, count);
}

/** Files are in order as a rule; only others are sorted. Cells that stand twice keep the file's order. */
function sortCells(order: Int32Array, compare: (a: number, b: number) => number): Int32Array {
  for (let i = 1; i < order.length; i++) {
    if (compare(order[i - 1], order[i]) >= 0) return order.sort((a, b) => compare(a, b) || a - b);
  }
  return order;
}

/** Numbers ascending, what is not known last. */
function compareNumbers(a: number, b: number): number {
  if (a === b) return 0;
  return Number.isNaN(a) ? (Number.isNaN(b) ? 0 : 1) : Number.isNaN(b) ? -1 : a - b;
}

function planPass(order: Int32Array, rowTimeMs: Float64Array, cellNumber: Float32Array): PassPlan {
  const rowOf = new Int32Array(order.length);
  let columns = 0;
  let rows = 0;
  for (let i = 0, firstRow = 0, copy = 0; i < order.length; i++) {
    const [cell, before] = [order[i], order[i - 1]];
    const isSameTime = i > 0 && rowTimeMs[cell] === rowTimeMs[before];
    if (!isSameTime) firstRow = rows;
    // The second cell of one time and number stands in a second row of that time, and so on.
    copy = isSameTime && cellNumber[cell] === cellNumber[before] ? copy + 1 : 0;
    rowOf[i] = firstRow + copy;
    rows = Math.max(rows, rowOf[i] + 1);
    columns = Math.max(columns, cellNumber[cell]);
  }
  if (rows * columns > MOST_PLACES && rows * columns > order.length * MOST_PLACES_PER_CELL) {
    throw new Problem('damaged', `${order.length} cells are scattered over ${rows} rows of ${columns} places.`);
  }
  const cellAt = new Int32Array(rows * columns).fill(-1);
  for (let i = 0; i < order.length; i++) cellAt[rowOf[i] * columns + cellNumber[order[i]] - 1] = order[i];
  return { rows, columns, cellAt };
}
