import type { BitReader } from '../../../bytes/bit-reader.ts';
import type { Column } from './lay-out-data.ts';

/** Where the numbers of a column go: value n to `values[first + n * step]`. */
export interface Target {
  values: Float64Array | Float32Array;
  first: number;
  step: number;
}

/**
 * Reads the numbers of a column, one for each of `subsetCount` subsets; NaN where missing. `scratch` has room for one
 * block. Not for text: see `readTexts`.
 */
export function readNumbers(
  reader: BitReader,
  column: Column,
  subsetCount: number,
  scratch: Float64Array,
  { values, first, step }: Target,
): void {
  const { element, widthBits, strideBits, base } = column;
  reader.moveTo(column.position);
  const power = 10 ** Math.abs(element.scale);
  const [divisor, factor] = element.scale < 0 ? [1, power] : [power, 1];
  // A field of all ones is missing, whether it is the whole value or an increment (FM 94 regulations 94.1.5, 94.6.3).
  const missingField = element.canBeMissing ? 2 ** widthBits - 1 : -1;
  const missingValue = element.canBeMissing ? 2 ** element.widthBits - 1 : -1;
  const unpack = (field: number) =>
    field === missingField || base + field === missingValue
      ? Number.NaN
      : ((base + field + element.reference) / divisor) * factor;
  if (strideBits === 0) {
    const value = unpack(reader.read(widthBits));
    for (let i = 0, at = first; i < subsetCount; i++, at += step) values[at] = value;
    return;
  }
  reader.readRun(widthBits, strideBits, subsetCount, scratch);
  for (let i = 0, at = first; i < subsetCount; i++, at += step) values[at] = unpack(scratch[i]);
}

/** Reads the texts of a column, without trailing blanks; null where missing. Characters are CCITT IA5. */
export function readTexts(reader: BitReader, column: Column, subsetCount: number): (string | null)[] {
  const texts: (string | null)[] = [];
  for (let i = 0; i < subsetCount; i++) {
    reader.moveTo(column.position + i * column.strideBits);
    const octets = reader.readOctets(column.widthBits / 8);
    const isMissing = octets.every((octet) => octet === 0xff);
    texts.push(isMissing ? null : String.fromCharCode(...octets).replace(/[ \0]+$/, ''));
  }
  return texts;
}
