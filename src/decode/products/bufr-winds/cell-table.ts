import type { BitReader } from '../../../bytes/bit-reader.ts';
import { createBackground, createBeams, createSolutions, createSwath, type Swath } from '../../../swath/swath.ts';
import { flagBit } from '../../../wind/flags.ts';
import type { Column, DataBlock } from '../../containers/bufr/lay-out-data.ts';
import { type PhysicalRange, readExactNumbers, readNumbers } from '../../containers/bufr/read-column.ts';
import { findCellColumns } from './cell-columns.ts';
import { readTimes } from './cell-times.ts';

/** Every cell of a file, in the file's order, before cells are put in rows. */
export interface CellTable {
  /** The cells as one long row. Its solutions' probabilities are still the file's likelihoods. */
  cells: Swath;
  platformCode: Float32Array;
  cellSizeM: Float32Array;
  rowNumber: Float32Array;
  cellNumber: Float32Array;
  /** The file's index of the selected solution, counted from 1. */
  selected: Float32Array;
  /** How many values of each kind were outside their physical range: they are NaN and their cells flagged. */
  outside: Map<ValueKind, number>;
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
  const empty = () => new Float32Array(count).fill(Number.NaN);
  cells.iceProbability = empty();
  return {
    cells,
    platformCode: empty(),
    cellSizeM: empty(),
    rowNumber: empty(),
    cellNumber: empty(),
    selected: empty(),
    outside: new Map(),
  };
}

/** Reads the cells of a block into a table from its cell `firstCell` on. */
export function fillCells(table: CellTable, firstCell: number, reader: BitReader, block: DataBlock): void {
  const columns = findCellColumns(reader, block);
  const count = block.subsetCount;
  const { lon, lat, timeMs, rawFlags, solutions, beams, background, iceProbability } = table.cells;
  const fill = (column: Column | undefined, values: Float32Array, kind?: ValueKind, slot = 0, slots = 1) => {
    const range = kind && rangeOf(table, firstCell, kind);
    if (column) readNumbers(reader, column, count, { values, first: firstCell * slots + slot, step: slots }, range);
  };
  const fillExactly = (column: Column | undefined, values: Float64Array, kind: ValueKind) => {
    if (column) readExactNumbers(reader, column, count, values.subarray(firstCell), rangeOf(table, firstCell, kind));
  };
  fill(columns.platform, table.platformCode);
  fill(columns.cellSize, table.cellSizeM);
  fill(columns.rowNumber, table.rowNumber);
  fill(columns.cellNumber, table.cellNumber, 'cell number');
  fill(columns.selected, table.selected);
  fillExactly(columns.lat, lat, 'latitude');
  fillExactly(columns.lon, lon, 'longitude');
  readTimes(reader, columns.time, count, timeMs.subarray(firstCell));
  readFlagWords(reader, columns.flagWord, count, rawFlags.subarray(firstCell));
  if (background) fill(columns.backgroundSpeed, background.speedMs, 'background speed');
  if (background) fill(columns.backgroundDirection, background.directionFrom, 'background direction');
  if (iceProbability) fill(columns.iceProbability, iceProbability, 'ice probability');
  for (const [n, look] of columns.looks.entries()) {
    if (!beams) break;
    fill(look.incidence, beams.incidenceDeg, 'incidence angle', n, beams.count);
    fill(look.azimuth, beams.azimuthDeg, 'look azimuth', n, beams.count);
    fill(look.backscatter, beams.backscatterDb, undefined, n, beams.count);
    fill(look.noise, beams.noisePercent, undefined, n, beams.count);
  }
  for (const [n, solution] of columns.solutions.entries()) {
    if (!solutions) break;
    fill(solution.speed, solutions.speedMs, 'wind speed', n, solutions.slots);
    fill(solution.direction, solutions.directionFrom, 'wind direction', n, solutions.slots);
    fill(solution.fitDistance, solutions.fitDistance, undefined, n, solutions.slots);
    fill(solution.likelihood, solutions.probability, undefined, n, solutions.slots);
  }
}

/** Far above any 10-m mean wind measured; what a file gives beyond it is damage. Common practice, no source. */
const MOST_SPEED_MS = 100;

/** What values can physically be, both ends included. Cell numbers count from 1; their elements have 8 bits at most. */
const physicalRanges = {
  latitude: [-90, 90],
  longitude: [-180, 180],
  'cell number': [1, 255],
  'wind speed': [0, MOST_SPEED_MS],
  'wind direction': [0, 360],
  'background speed': [0, MOST_SPEED_MS],
  'background direction': [0, 360],
  'incidence angle': [0, 90],
  'look azimuth': [0, 360],
  'ice probability': [0, 1],
} as const;

export type ValueKind = keyof typeof physicalRanges;

function rangeOf({ cells, outside }: CellTable, firstCell: number, kind: ValueKind): PhysicalRange {
  const [least, most] = physicalRanges[kind];
  const onOutside = (subset: number) => {
    cells.flags[firstCell + subset] |= flagBit.outOfRange;
    outside.set(kind, (outside.get(kind) ?? 0) + 1);
  };
  return { least, most, onOutside };
}

/** A word of all ones is missing, never all flags set; it stays 0xffffffff. */
function readFlagWords(reader: BitReader, column: Column | undefined, count: number, into: Uint32Array): void {
  if (!column) return;
  const words = new Float32Array(count);
  readNumbers(reader, column, count, { values: words, first: 0, step: 1 });
  for (let i = 0; i < count; i++) if (words[i] >= 0) into[i] = words[i];
}
