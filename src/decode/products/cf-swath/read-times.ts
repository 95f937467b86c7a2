import { Problem } from '../../../problems/problem.ts';
import { NEVER_LOOKED } from '../../../swath/swath.ts';
import type { NetcdfDimension, NetcdfVariable } from '../../containers/netcdf-classic/read-netcdf-header.ts';
import { type CfFile, textAttribute } from './cf-file.ts';
import { unpackValues } from './unpack-values.ts';

/**
 * Sets the time of every cell of a pass, milliseconds since 1970-01-01 UTC, NaN where missing. A time for each row (or
 * for each pass of a merged file) is spread over its cells. `first` is the index of the pass's first cell in the file.
 */
export function readTimes(
  file: CfFile,
  variable: NetcdfVariable,
  dimensions: NetcdfDimension[],
  first: number,
  timeMs: Float64Array,
): void {
  const place = { file: file.header.fileName, part: `variable ${variable.name}` };
  const units = textAttribute(variable.attributes, 'units');
  const unit = parseTimeUnits(units, textAttribute(variable.attributes, 'calendar'), place);
  const own = variable.dimensions.filter((dimension) => dimension.length !== 1);
  if (own.some((dimension) => !dimensions.includes(dimension))) {
    throw new Problem(
      'not-a-swath',
      `The times in ${variable.name} do not belong to rows or cells of the swath.`,
      place,
    );
  }
  const isForEachCell =
    own.length === dimensions.length && own.every((dimension, axis) => dimension === dimensions[axis]);
  const count = own.reduce((product, { length }) => product * length, 1);
  const times = isForEachCell ? timeMs : new Float64Array(count);
  const taking = {
    first: isForEachCell ? first : 0,
    count: times.length,
    factor: 1,
    plausibleHighest: Infinity,
    outOfRange: Number.NaN,
  };
  unpackValues(file, variable, taking, (values, start) => {
    for (let i = 0; i < values.length; i++) {
      const time = values[i] * unit.stepMs + unit.originMs;
      times[start + i] = Math.abs(time) <= MOST_TIME_MS ? Math.round(time) : Number.NaN;
    }
  });
  if (!isForEachCell) spread(times, own, dimensions, first, timeMs);
}

/** The furthest time from 1970 that a date can hold: ECMAScript, time values. */
const MOST_TIME_MS = 8.64e15;

const stepsMs: [RegExp, number][] = [
  [/^(microseconds?|microsecs?|us)$/, 0.001],
  [/^(milliseconds?|millisecs?|msecs?|ms)$/, 1],
  [/^(seconds?|secs?|s)$/, 1000],
  [/^(minutes?|mins?)$/, 60_000],
  [/^(hours?|hrs?|h)$/, 3_600_000],
  [/^(days?|d)$/, 86_400_000],
];

/**
 * A CF time unit, '<unit> since <reference>' (CF conventions 4.4), as the length of a step and the reference in
 * milliseconds since 1970-01-01 UTC. UTC where no zone is given. Other calendars than the real one, and references
 * before it (15 October 1582), are refused.
 */
export function parseTimeUnits(units: string, calendar: string, place = {}): { stepMs: number; originMs: number } {
  const parts = /^(\w+)\s+since\s+(.+)$/i.exec(units.trim());
  const stepMs = parts && stepsMs.find(([spelling]) => spelling.test(parts[1].toLowerCase()))?.[1];
  const originMs = parts ? parseReference(parts[2]) : Number.NaN;
  if (!stepMs || !(originMs >= Date.UTC(1582, 9, 15))) {
    const said = units.trim() === '' ? 'no unit' : `the unit '${units}'`;
    throw new Problem(
      'not-a-swath',
      `The times have ${said}; a unit such as 'seconds since 1990-01-01' is needed.`,
      place,
    );
  }
  if (!['', 'standard', 'gregorian', 'proleptic_gregorian', 'utc'].includes(calendar.toLowerCase())) {
    throw new Problem('unsupported-format', `Times in the calendar '${calendar}' cannot be read.`, place);
  }
  return { stepMs, originMs };
}

function parseReference(text: string): number {
  const date = /^(\d{4})-(\d{1,2})-(\d{1,2})(?:[T\s]+(\d{1,2}):(\d{1,2})(?::(\d{1,2}(?:\.\d*)?))?)?\s*(.*)$/i.exec(
    text.trim(),
  );
  if (!date) return Number.NaN;
  const [year, month, day, hour = 0, minute = 0, second = 0] = date.slice(1, 7).map((part) => Number(part ?? 0));
  // Date.UTC takes years before 100 for years of the twentieth century.
  if (year < 1582 || month < 1 || month > 12 || day < 1 || day > 31 || hour > 24 || minute > 59) return Number.NaN;
  return Date.UTC(year, month - 1, day, hour, minute) + second * 1000 - parseZone(date[7]);
}

/** A zone's lead over UTC in milliseconds; NaN for one that is not understood. */
function parseZone(text: string): number {
  if (/^(|z|utc|gmt)$/i.test(text)) return 0;
  const zone = /^(?:utc|gmt)?\s*([+-]?)(\d{1,2}):?(\d{2})?$/i.exec(text);
  if (!zone) return Number.NaN;
  return (zone[1] === '-' ? -1 : 1) * (Number(zone[2]) * 60 + Number(zone[3] ?? 0)) * 60_000;
}

/** Repeats values of some of the dimensions along the others, for cells from the index `first` on. */
function spread(
  values: Float64Array,
  own: NetcdfDimension[],
  all: NetcdfDimension[],
  first: number,
  target: Float64Array,
): void {
  const strides = all.map((dimension) => {
    const at = own.indexOf(dimension);
    return at < 0 ? 0 : own.slice(at + 1).reduce((product, { length }) => product * length, 1);
  });
  for (let cell = 0; cell < target.length; cell++) {
    let index = 0;
    let rest = first + cell;
    for (let axis = all.length - 1; axis >= 0; axis--) {
      index += (rest % all[axis].length) * strides[axis];
      rest = Math.floor(rest / all[axis].length);
    }
    target[cell] = values[index];
  }
}

/**
 * Gives each looked-at cell without a time that of the nearest looked-at cell before it in the array, else after it:
 * its own row, or the row beside it, a few seconds away. Returns how many were filled; -1 when there is no time at all.
 */
export function fillMissingTimes(timeMs: Float64Array, state: Uint8Array): number {
  let missing = 0;
  for (let cell = 0; cell < timeMs.length; cell++) {
    if (Number.isNaN(timeMs[cell]) && state[cell] !== NEVER_LOOKED) missing++;
  }
  if (missing === 0) return 0;
  let nearest = timeMs.find((time, cell) => state[cell] !== NEVER_LOOKED && !Number.isNaN(time));
  if (nearest === undefined) return -1;
  for (let cell = 0; cell < timeMs.length; cell++) {
    if (state[cell] === NEVER_LOOKED) continue;
    if (Number.isNaN(timeMs[cell])) timeMs[cell] = nearest;
    else nearest = timeMs[cell];
  }
  return missing;
}
