import { Problem } from '../../../problems/problem.ts';
import { type NetcdfValue, netcdfTypeOfArray, netcdfTypes } from '../../containers/netcdf-classic/netcdf-types.ts';
import type { NetcdfVariable } from '../../containers/netcdf-classic/read-netcdf-header.ts';
import { readVariableAsNumbers } from '../../containers/netcdf-classic/read-variable.ts';
import { type CfFile, numberAttribute } from './cf-file.ts';

/**
 * A variable's values in its unit, missing ones as NaN: CF conventions 2.5.1 and 8.1. Fill, missing value and valid
 * range are in the packed type and compared before unpacking. Values outside the stated range count as missing, which
 * is told in the file's problems. `plausibleHighest` is the most the quantity can be, in the same unit: a stated range
 * that goes far beyond it was left behind by a copy that unpacked the values, and is not applied.
 */
export function unpackValues(file: CfFile, variable: NetcdfVariable, plausibleHighest: number): Float64Array {
  const values = readVariableAsNumbers(file.bytes, file.header, variable);
  const unsigned = isUnsigned(variable);
  if (unsigned) makeUnsigned(values, variable);
  const scale = numberAttribute(variable.attributes, 'scale_factor')[0] ?? 1;
  const offset = numberAttribute(variable.attributes, 'add_offset')[0] ?? 0;
  const range = statedRange(variable, unsigned, (packed) => packed * scale + offset, plausibleHighest);
  const [first, ...others] = missingIntervals(variable, unsigned);
  // Few variables have more than one missing value: those are taken out beforehand, to keep the loop below tight.
  for (const other of others) eraseInterval(values, other);

  let outside = 0;
  for (let i = 0; i < values.length; i++) {
    const packed = values[i];
    if (packed >= first.lowest && packed <= first.highest) values[i] = Number.NaN;
    else if (packed >= range.lowest && packed <= range.highest) values[i] = packed * scale + offset;
    else {
      if (!Number.isNaN(packed)) outside++;
      values[i] = Number.NaN;
    }
  }
  if (outside > 0) file.problems.push(tellOutside(file, variable, outside));
  return values;
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

function makeUnsigned(values: Float64Array, variable: NetcdfVariable): void {
  for (let i = 0; i < values.length; i++) values[i] = asUnsigned(values[i], variable);
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

function tellOutside(file: CfFile, variable: NetcdfVariable, count: number): Problem {
  const values = count === 1 ? 'One value' : `${count} values`;
  return new Problem(
    'values-out-of-range',
    `${values} of ${variable.name} outside the range the file itself states; taken as missing.`,
    { file: file.header.fileName, part: `variable ${variable.name}` },
  );
}
