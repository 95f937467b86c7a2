import { flagBit } from '../../../wind/flags.ts';
import type { CellTable } from './cell-table.ts';

/** What was outside its physical range, in words, and in how many cells. */
export type RangeCounts = Map<string, number>;

/** Far above any 10-m mean wind measured; what a file gives beyond it is damage. Common practice, no source. */
const MOST_SPEED_MS = 100;

/**
 * Looks at every value that has a physical range. A value outside it becomes NaN, never something plausible, its cell is
 * flagged outOfRange, and it is counted by kind.
 */
export function checkRanges(table: CellTable): RangeCounts {
  const counts: RangeCounts = new Map();
  const { cells } = table;
  const { solutions, beams, background } = cells;
  const check = (kind: string, values: Float64Array | Float32Array, perCell: number, least: number, most: number) => {
    const marked = markOutside(values, perCell, least, most, cells.flags);
    if (marked > 0) counts.set(kind, (counts.get(kind) ?? 0) + marked);
  };
  check('latitude', cells.lat, 1, -90, 90);
  check('longitude', cells.lon, 1, -180, 180);
  check('cell number', table.cellNumber, 1, 1, 1000);
  if (solutions) {
    check('wind speed', solutions.speedMs, solutions.slots, 0, MOST_SPEED_MS);
    check('wind direction', solutions.directionFrom, solutions.slots, 0, 360);
  }
  if (background) {
    check('background speed', background.speedMs, 1, 0, MOST_SPEED_MS);
    check('background direction', background.directionFrom, 1, 0, 360);
  }
  if (beams) {
    check('incidence angle', beams.incidenceDeg, beams.count, 0, 90);
    check('look azimuth', beams.azimuthDeg, beams.count, 0, 360);
  }
  if (cells.iceProbability) check('ice probability', cells.iceProbability, 1, 0, 1);
  return counts;
}

function markOutside(
  values: Float64Array | Float32Array,
  perCell: number,
  least: number,
  most: number,
  flags: Uint32Array,
): number {
  let marked = 0;
  for (let i = 0; i < values.length; i++) {
    if (!(values[i] < least || values[i] > most)) continue;
    values[i] = Number.NaN;
    flags[Math.floor(i / perCell)] |= flagBit.outOfRange;
    marked++;
  }
  return marked;
}
