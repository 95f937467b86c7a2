import { type BitReader, MOST_SCALED_BITS } from '../../../bytes/bit-reader.ts';
import type { Column } from './lay-out-data.ts';

/** The numbers a column may physically have. Each other one becomes NaN and is reported by its subset, from 0. */
export interface PhysicalRange {
  least: number;
  most: number;
  onOutside: (subset: number) => void;
}

/** Where numbers go: that of subset n to `values[first + n * step]`. */
export interface Target {
  values: Float32Array;
  first: number;
  step: number;
}

/** Reads the numbers of a column, one for each of `count` subsets, in single precision; NaN where missing. Not for text. */
export function readNumbers(
  reader: BitReader,
  column: Column,
  count: number,
  target: Target,
  range?: PhysicalRange,
): void {
  const { widthBits, strideBits } = column;
  const isScaled = strideBits > 0 && widthBits <= MOST_SCALED_BITS;
  if (isScaled && readScaled(reader, column, count, target, range)) return;
  const { values, first, step } = target;
  if (strideBits === 0) {
    const value = readConstant(reader, column, count, range);
    for (let i = 0, place = first; i < count; i++, place += step) values[place] = value;
  } else {
    const exact = new Float64Array(count);
    readExactNumbers(reader, column, count, exact, range);
    for (let i = 0, place = first; i < count; i++, place += step) values[place] = exact[i];
  }
}

/** Reads the numbers of a column to the front of `into` in double precision; NaN where missing. Not for text. */
export function readExactNumbers(
  reader: BitReader,
  column: Column,
  count: number,
  into: Float64Array,
  range?: PhysicalRange,
): void {
  if (column.strideBits === 0) {
    into.fill(readConstant(reader, column, count, range), 0, count);
    return;
  }
  const unpack = createUnpacker(column, range);
  reader.moveTo(column.position);
  reader.readRun(column.widthBits, column.strideBits, count, into);
  for (let i = 0; i < count; i++) into[i] = unpack(into[i], i);
}

/** Reads the texts of a column, without trailing blanks; null where missing. Characters are CCITT IA5. */
export function readTexts(reader: BitReader, column: Column, count: number): (string | null)[] {
  const texts: (string | null)[] = [];
  for (let i = 0; i < count; i++) {
    reader.moveTo(column.position + i * column.strideBits);
    const octets = reader.readOctets(column.widthBits / 8);
    const isMissing = octets.every((octet) => octet === 0xff);
    texts.push(isMissing ? null : String.fromCharCode(...octets).replace(/[ \0]+$/, ''));
  }
  return texts;
}

/** Reads a column in one tight loop; false, and nothing reported, where values outside the range must be looked into. */
function readScaled(
  reader: BitReader,
  column: Column,
  count: number,
  { values, first, step }: Target,
  range?: PhysicalRange,
): boolean {
  const { element, widthBits, strideBits, base } = column;
  const power = 10 ** element.scale;
  const add = base + element.reference;
  const [missing, lowestMissing] = missingFields(column);
  const least = range ? Math.ceil(range.least * power) - add : 0;
  const most = Math.min(lowestMissing - 1, range ? Math.floor(range.most * power) - add : 2 ** widthBits);
  const run = { widthBits, strideBits, count, add, factor: 10 ** -element.scale, least, most, missing };
  reader.moveTo(column.position);
  const isAnyOutside = reader.readScaledRun(run, values, first, step);
  return !isAnyOutside || !range;
}

function readConstant(reader: BitReader, column: Column, count: number, range?: PhysicalRange): number {
  const unpack = createUnpacker(column, range);
  reader.moveTo(column.position);
  const field = reader.read(column.widthBits);
  const value = unpack(field, 0);
  if (range && Number.isNaN(value)) for (let subset = 1; subset < count; subset++) unpack(field, subset);
  return value;
}

/** Turns the field of a subset into its value; NaN where missing or, which it reports, outside the range. */
function createUnpacker(column: Column, range?: PhysicalRange): (field: number, subset: number) => number {
  const { element, base } = column;
  const [missing, otherMissing] = missingFields(column);
  const add = base + element.reference;
  // A division by a power of ten rounds to the decimal the file means; a multiplication by its inverse may not.
  const [divisor, factor] = element.scale < 0 ? [1, 10 ** -element.scale] : [10 ** element.scale, 1];
  return (field, subset) => {
    if (field === missing || field === otherMissing) return Number.NaN;
    const value = ((field + add) / divisor) * factor;
    if (!range || (value >= range.least && value <= range.most)) return value;
    range.onOutside(subset);
    return Number.NaN;
  };
}

/**
 * The fields that mean missing: all ones, be it of the field or of the whole value (FM 94 regulation 94.1.5
 * and data compression); the second is never the higher one. No field does where an element cannot be missing.
 */
function missingFields({ element, widthBits, base }: Column): [number, number] {
  if (!element.canBeMissing) return [-1, Number.POSITIVE_INFINITY];
  const ones = 2 ** widthBits - 1;
  return [ones, Math.min(ones, 2 ** element.widthBits - 1 - base)];
}
