import type { BitReader } from '../../../bytes/bit-reader.ts';
import { createBackground, createBeams, createSolutions, createSwath, type Swath } from '../../../swath/swath.ts';
import type { Column, DataBlock } from '../../containers/bufr/lay-out-data.ts';
import { readNumbers } from '../../containers/bufr/read-column.ts';
import { type CellColumns, findCellColumns } from './cell-columns.ts';
import { readTimes } from './cell-times.ts';

/** Every cell of a file, in the file's order, before cells are put in rows. */
export interface CellTable {
  /** The cells as one long row. Its solutions' probabilities are still the file's likelihoods. */
  cells: Swath;
  platformCode: Float64Array;
  cellSizeM: Float64Array;
  rowNumber: Float64Array;
  cellNumber: Float64Array;
  /** The file's index of the selected solution, counted from 1. */
  selected: Float64Array;
}

/** How much room a table needs. */
export interface TableSize {
  cells: number;
  looks: number;
  solutions: number;
}

/** A table of a size, not filled. */
export function createCellTable({ cells: count, looks, solutions }: TableSize): CellTable {
  const cells = createSwath(1, count);
  if (solutions > 0) cells.solutions = createSolutions(count, solutions);
  if (looks > 0) cells.beams = createBeams(count, looks);
  cells.background = createBackground(count);
  cells.iceProbability = new Float32Array(count).fill(Number.NaN);
  const empty = () => new Float64Array(count).fill(Number.NaN);
  return {
    cells,
    platformCode: empty(),
    cellSizeM: empty(),
    rowNumber: empty(),
    cellNumber: empty(),
    selected: empty(),
  };
}

/** Reads the cells of a block into a table from its cell `firstCell` on. */
export function fillCells(table: CellTable, firstCell: number, reader: BitReader, block: DataBlock): void {
  const columns = findCellColumns(reader, block);
  const scratch = new Float64Array(block.subsetCount);
  const fill = (column: Column | undefined, values: Float64Array | Float32Array, slot = 0, slots = 1) => {
    if (!column) return;
    readNumbers(reader, column, block.subsetCount, scratch, { values, first: firstCell * slots + slot, step: slots });
  };
  fill(columns.platform, table.platformCode);
  fill(columns.cellSize, table.cellSizeM);
  fill(columns.rowNumber, table.rowNumber);
  fill(columns.cellNumber, table.cellNumber);
  fill(columns.selected, table.selected);
  fill(columns.lat, table.cells.lat);
  fill(columns.lon, table.cells.lon);
  readTimes(reader, columns.time, block.subsetCount, table.cells.timeMs.subarray(firstCell));
  fillFlagWords(table, firstCell, reader, columns.flagWord, block.subsetCount);
  fillWinds(table.cells, columns, fill);
}

type Fill = (column: Column | undefined, values: Float64Array | Float32Array, slot?: number, slots?: number) => void;

function fillWinds({ solutions, beams, background, iceProbability }: Swath, columns: CellColumns, fill: Fill): void {
  if (background) {
    fill(columns.backgroundSpeed, background.speedMs);
    fill(columns.backgroundDirection, background.directionFrom);
  }
  if (iceProbability) fill(columns.iceProbability, iceProbability);
  for (const [n, look] of columns.looks.entries()) {
    if (!beams) break;
    fill(look.incidence, beams.incidenceDeg, n, beams.count);
    fill(look.azimuth, beams.azimuthDeg, n, beams.count);
    fill(look.backscatter, beams.backscatterDb, n, beams.count);
    fill(look.noise, beams.noisePercent, n, beams.count);
  }
  for (const [n, solution] of columns.solutions.entries()) {
    if (!solutions) break;
    fill(solution.speed, solutions.speedMs, n, solutions.slots);
    fill(solution.direction, solutions.directionFrom, n, solutions.slots);
    fill(solution.fitDistance, solutions.fitDistance, n, solutions.slots);
    fill(solution.likelihood, solutions.probability, n, solutions.slots);
  }
}

function fillFlagWords(
  table: CellTable,
  firstCell: number,
  reader: BitReader,
  column: Column | undefined,
  count: number,
): void {
  if (!column) return;
  const words = new Float64Array(count);
  readNumbers(reader, column, count, words, { values: words, first: 0, step: 1 });
  // A word of all ones is missing, never all flags set; it stays 0xffffffff.
  for (let i = 0; i < count; i++) if (!Number.isNaN(words[i])) table.cells.rawFlags[firstCell + i] = words[i];
}
