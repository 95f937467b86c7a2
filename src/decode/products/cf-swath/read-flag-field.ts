import { Problem } from '../../../problems/problem.ts';
import type { FlagName } from '../../../wind/flags.ts';
import { netcdfTypes } from '../../containers/netcdf-classic/netcdf-types.ts';
import type { NetcdfVariable } from '../../containers/netcdf-classic/read-netcdf-header.ts';
import { type CfFile, numberAttribute, tellProblem, textAttribute } from './cf-file.ts';
import { type FlagFamily, reviewFlagWord } from './flag-words.ts';
import { asUnsigned, missingIntervals, readInChunks } from './unpack-values.ts';

/** A raw flag word that is missing. */
export const MISSING_FLAGS = 0xffffffff;

/** One entry of a flag variable's list: a cell has it when (its word AND mask) equals value, or is not 0 where value is null. */
export interface FlagMeaning {
  word: string;
  mask: number;
  value: number | null;
  /** What it says of a cell; null for a word that was never reviewed. */
  flag: FlagName | null;
  family: FlagFamily | null;
}

/** A flag variable: the word of every cell, and what its bits mean; no meanings where the file's list is broken. */
export interface FlagField {
  name: string;
  raw: Uint32Array;
  meanings: FlagMeaning[] | null;
}

/**
 * Reads a flag variable's words of a pass into `raw`: CF conventions 3.5. A list whose parts do not match in number is
 * a Problem told, not thrown.
 */
export function readFlagField(file: CfFile, variable: NetcdfVariable, first: number, raw: Uint32Array): FlagField {
  const meanings = readMeanings(variable);
  if (!meanings) {
    const sentence = `The flag words of ${variable.name} and their masks or values do not match in number, so its flags are unknown.`;
    tellProblem(file, new Problem('flags-unknown', sentence, { part: `variable ${variable.name}` }));
  }
  readRawWords(file, variable, first, raw);
  return { name: variable.name, raw, meanings };
}

/** Whether a cell's word has a meaning of the list. */
export function hasMeaning(raw: number, { mask, value }: FlagMeaning): boolean {
  const masked = (raw & mask) >>> 0;
  return value === null ? masked !== 0 : masked === value;
}

function readMeanings(variable: NetcdfVariable): FlagMeaning[] | null {
  const { attributes } = variable;
  const words = textAttribute(attributes, 'flag_meanings')
    .split(/\s+/)
    .filter((word) => word !== '');
  const bits = (numbers: number[]) => numbers.map((number) => asUnsigned(number, variable) >>> 0);
  // One version of a writer spells the name of the masks with an e before it.
  const masks = bits([...numberAttribute(attributes, 'flag_masks'), ...numberAttribute(attributes, 'eflag_masks')]);
  const values = bits(numberAttribute(attributes, 'flag_values'));
  const counts = [masks.length, values.length].filter((count) => count > 0);
  if (words.length === 0 || counts.length === 0 || counts.some((count) => count !== words.length)) return null;
  return words.map((word, index) => {
    const review = reviewFlagWord(word);
    return {
      word,
      mask: masks[index] ?? 0xffffffff,
      value: values[index] ?? null,
      flag: review?.flag ?? null,
      family: review?.family ?? null,
    };
  });
}

/** The words as unsigned numbers, missing ones as MISSING_FLAGS. */
function readRawWords(file: CfFile, variable: NetcdfVariable, first: number, raw: Uint32Array): void {
  const isMissing = missingTest(variable);
  let last = Number.NaN;
  let word = MISSING_FLAGS;
  readInChunks(file, variable, first, raw.length, (values, start) => {
    for (let i = 0; i < values.length; i++) {
      // Neighbours mostly share their word.
      if (values[i] !== last) {
        last = values[i];
        word = asUnsigned(last, variable);
        if (isMissing(word)) word = MISSING_FLAGS;
      }
      raw[start + i] = word;
    }
  });
}

/**
 * Which words are missing: the stated fill, a word outside the stated range, and all bits of the type set (with or
 * without the sign), which versions of one writer use unstated.
 */
function missingTest(variable: NetcdfVariable): (word: number) => boolean {
  const bitCount = 8 * Math.min(4, netcdfTypes[variable.type].byteLength);
  const intervals = missingIntervals(variable, true);
  const stated =
    numberAttribute(variable.attributes, 'valid_max')[0] ?? numberAttribute(variable.attributes, 'valid_range')[1];
  const most = stated === undefined ? Infinity : asUnsigned(stated, variable);
  return (word) =>
    !(word <= most) ||
    word === 2 ** bitCount - 1 ||
    word === 2 ** (bitCount - 1) - 1 ||
    intervals.some(({ lowest, highest }) => word >= lowest && word <= highest);
}
