import type { BitReader } from '../../../bytes/bit-reader.ts';
import type { Column } from '../../containers/bufr/lay-out-data.ts';
import { readNumbers } from '../../containers/bufr/read-column.ts';

/**
 * Reads the times of a block's cells, milliseconds UTC, from year, month, day, hour, minute and second. NaN where a part
 * is missing or the parts are no time of the calendar: a 31st of June is not made a 1st of July.
 */
export function readTimes(
  reader: BitReader,
  columns: readonly (Column | undefined)[],
  count: number,
  into: Float64Array,
): void {
  const [year, month, day, hour, minute, second] = columns.map((column) => {
    const values = new Float32Array(count).fill(Number.NaN);
    if (column) readNumbers(reader, column, count, { values, first: 0, step: 1 });
    return values;
  });
  for (let i = 0; i < count; i++) {
    const j = i - 1;
    // The cells of a row share their time, so most are as the one before.
    const isSameMinute =
      i > 0 && minute[i] === minute[j] && hour[i] === hour[j] && day[i] === day[j] && month[i] === month[j];
    const isSameTime = isSameMinute && second[i] === second[j] && year[i] === year[j];
    into[i] = isSameTime ? into[j] : toTimeMs(year[i], month[i], day[i], hour[i], minute[i], second[i]);
  }
}

function toTimeMs(year: number, month: number, day: number, hour: number, minute: number, second: number): number {
  // 60 is the second a leap second adds.
  if (!(hour < 24 && minute < 60 && second <= 60)) return Number.NaN;
  const midnightMs = Date.UTC(year, month - 1, day);
  const date = new Date(midnightMs);
  if (date.getUTCFullYear() !== year || date.getUTCMonth() !== month - 1 || date.getUTCDate() !== day) {
    return Number.NaN;
  }
  return midnightMs + ((hour * 60 + minute) * 60 + second) * 1000;
}
