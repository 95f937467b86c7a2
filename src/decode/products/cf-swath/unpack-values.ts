import { type NetcdfValue, netcdfTypeOfArray, netcdfTypes } from '../../containers/netcdf-classic/netcdf-types.ts';
import type { NetcdfVariable } from '../../containers/netcdf-classic/read-netcdf-header.ts';
import { readNumbers } from '../../containers/netcdf-classic/read-variable.ts';
import { type CfFile, numberAttribute } from './cf-file.ts';

/** How one variable's values are to be taken. */
export interface Taking {
  /** Index of the first value, and how many. */
  first: number;
  count: number;
  /** Factor from the variable's unit to ours. */
  factor: number;
  /** The most the quantity can be, in our unit; a stated range far beyond it is not believed. */
  plausibleHighest: number;
  /** What to put where a value is outside the range that the file states: OUT_OF_RANGE, or NaN not to tell it from missing. */
  outOfRange: number;
}

/** A value outside the range that the file itself states, for a taker that wants to know. */
export const OUT_OF_RANGE = Number.POSITIVE_INFINITY;

/** So many values at a time stay in the processor's nearest cache. */
const CHUNK_LENGTH = 2048;

/**
 * Hands on a variable's values chunk by chunk, unpacked and in our unit, missing ones as NaN: CF conventions 2.5.1 and
 * 8.1. Fill, missing value and valid range are in the packed type and compared before unpacking. By CF a value outside
 * the stated range is missing too; `outOfRange` says how it is marked. The chunk is only lent: it is filled anew.
 */
export function unpackValues(
  file: CfFile,
  variable: NetcdfVariable,
  taking: Taking,
  take: (values: Float64Array, start: number) => void,
): void {
  const packing = readPacking(variable, taking);
  readInChunks(file, variable, taking.first, taking.count, (values, start) => {
    unpackChunk(values, packing);
    take(values, start);
  });
}

/** Hands on some of a variable's values chunk by chunk, as the file packs them. The chunk is only lent. */
export function readInChunks(
  file: CfFile,
  variable: NetcdfVariable,
  first: number,
  count: number,
  take: (values: Float64Array, start: number) => void,
): void {
  const scratch = new Float64Array(Math.min(CHUNK_LENGTH, count));
  for (let start = 0; start < count; start += CHUNK_LENGTH) {
    const chunk = scratch.subarray(0, Math.min(CHUNK_LENGTH, count - start));
    readNumbers(file.bytes, file.header, variable, first + start, chunk);
    take(chunk, start);
  }
}

interface Packing {
  scale: number;
  offset: number;
  /** The packed values that count. */
  range: Interval;
  missing: Interval[];
  /** What is added to negative values that are meant unsigned; 0 where none are. */
  signedGap: number;
  outOfRange: number;
}

function readPacking(variable: NetcdfVariable, { factor, plausibleHighest, outOfRange }: Taking): Packing {
  const unsigned = isUnsigned(variable);
  const scale = factor * (numberAttribute(variable.attributes, 'scale_factor')[0] ?? 1);
  const offset = factor * (numberAttribute(variable.attributes, 'add_offset')[0] ?? 0);
  return {
    scale,
    offset,
    range: statedRange(variable, unsigned, (packed) => packed * scale + offset, plausibleHighest),
    missing: missingIntervals(variable, unsigned),
    signedGap: unsigned ? 2 ** (8 * netcdfTypes[variable.type].byteLength) : 0,
    outOfRange,
  };
}

function unpackChunk(values: Float64Array, packing: Packing): void {
  const { scale, offset, signedGap, outOfRange } = packing;
  if (signedGap > 0) for (let i = 0; i < values.length; i++) if (values[i] < 0) values[i] += signedGap;
  // Few variables have more than one missing value: those are taken out beforehand, to keep the loop below tight.
  for (const interval of packing.missing.slice(1)) eraseInterval(values, interval);
  const { lowest, highest } = packing.range;
  const { lowest: lowestFill, highest: highestFill } = packing.missing[0];
  for (let i = 0; i < values.length; i++) {
    const packed = values[i];
    if (packed >= lowestFill && packed <= highestFill) values[i] = Number.NaN;
    else if (packed >= lowest && packed <= highest) values[i] = packed * scale + offset;
    else values[i] = Number.isNaN(packed) ? packed : outOfRange;
  }
}

/** Both ends belong to it. */
interface Interval {
  lowest: number;
  highest: number;
}

/**
 * The packed values that mean 'missing': _FillValue (under its misspelt names too) and missing_value, or what the
 * library writes by default. Re-served copies hold fills that are not equal bit for bit (1.e+30 as float and as
 * double), so of floating-point types those within a millionth are missing too.
 */
export function missingIntervals(variable: NetcdfVariable, unsigned: boolean): Interval[] {
  const { attributes, type } = variable;
  const names = [...attributes.keys()].filter((name) => /^(_?fill_?value|missing_value)$/i.test(name));
  const stated = names.flatMap((name) => numberAttribute(attributes, name)).filter((value) => !Number.isNaN(value));
  // netCDF Users Guide, attribute conventions: no default fill is assumed for bytes.
  const isByte = netcdfTypes[type].byteLength === 1;
  const fills = stated.length > 0 || isByte ? stated : [netcdfTypes[type].defaultFill];
  const slack = type === 'float' || type === 'double' ? 1e-6 : 0;
  const intervals = [...new Set(fills)].map((fill) => {
    const value = unsigned ? asUnsigned(fill, variable) : fill;
    return { lowest: value - slack * Math.abs(value), highest: value + slack * Math.abs(value) };
  });
  return intervals.length > 0 ? intervals : [{ lowest: Number.NaN, highest: Number.NaN }];
}

/** Signed numbers that are meant unsigned: `_Unsigned` of the netCDF Users Guide, or (CF 2.2) a range that says so. */
export function isUnsigned(variable: NetcdfVariable): boolean {
  if (!['byte', 'short', 'int'].includes(variable.type)) return false;
  if (/^true$/i.test(String(variable.attributes.get('_Unsigned') ?? ''))) return true;
  if (variable.type === 'int') return false;
  const { lowest, highest } = rangeAttributes(variable);
  const signedHighest = 2 ** (8 * netcdfTypes[variable.type].byteLength - 1) - 1;
  return lowest >= 0 && (highest < 0 || (highest > signedHighest && highest <= 2 * signedHighest + 1));
}

/** A signed number's bits read as unsigned. */
export function asUnsigned(value: number, variable: NetcdfVariable): number {
  return value < 0 ? value + 2 ** (8 * netcdfTypes[variable.type].byteLength) : value;
}

/** The stated range of packed values, applied only if its type and its packing agree with the variable's. */
function statedRange(
  variable: NetcdfVariable,
  unsigned: boolean,
  unpack: (packed: number) => number,
  plausibleHighest: number,
): Interval {
  const everything = { lowest: -Infinity, highest: Infinity };
  const named = ['valid_range', 'valid_min', 'valid_max'].flatMap((name) => variable.attributes.get(name) ?? []);
  if (!unsigned && named.some((value) => !hasTypeOf(variable, value))) return everything;
  const { lowest, highest } = rangeAttributes(variable);
  const range = unsigned
    ? { lowest: asUnsigned(lowest, variable), highest: asUnsigned(highest, variable) }
    : { lowest, highest };
  return Number.isFinite(range.highest) && unpack(range.highest) > 2 * plausibleHighest ? everything : range;
}

function hasTypeOf(variable: NetcdfVariable, value: NetcdfValue): boolean {
  return typeof value !== 'string' && netcdfTypeOfArray(value) === variable.type;
}

function rangeAttributes(variable: NetcdfVariable): Interval {
  const [rangeLowest, rangeHighest] = numberAttribute(variable.attributes, 'valid_range');
  const [lowest] = numberAttribute(variable.attributes, 'valid_min');
  const [highest] = numberAttribute(variable.attributes, 'valid_max');
  return { lowest: rangeLowest ?? lowest ?? -Infinity, highest: rangeHighest ?? highest ?? Infinity };
}

function eraseInterval(values: Float64Array, interval: Interval): void {
  for (let i = 0; i < values.length; i++) {
    if (values[i] >= interval.lowest && values[i] <= interval.highest) values[i] = Number.NaN;
  }
}
