import { expect, test } from 'vitest';
import { BitReader } from '../../../../../src/bytes/bit-reader.ts';
import { layOutData } from '../../../../../src/decode/containers/bufr/lay-out-data.ts';
import { listSubsets } from '../../../../../src/decode/containers/bufr/open-message.ts';
import { planDescriptors } from '../../../../../src/decode/containers/bufr/plan.ts';
import { readNumbers } from '../../../../../src/decode/containers/bufr/read-column.ts';
import type { Problem } from '../../../../../src/problems/problem.ts';

/** A data section from a picture of its bits: blanks are for the eye, text in <> is 8 bits a character. */
function open(descriptors: number[], picture: string, subsets: number, isCompressed: boolean) {
  const digits = picture
    .replace(/<(.*?)>/g, (_, text: string) => [...text].map((c) => binary(c.charCodeAt(0), 8)).join(''))
    .replaceAll(' ', '');
  const bytes = Uint8Array.from(digits.match(/.{1,8}/g) ?? [], (byte) => Number.parseInt(byte.padEnd(8, '0'), 2));
  const reader = new BitReader(bytes, 0, bytes.length);
  return { reader, blocks: layOutData(reader, planDescriptors(descriptors, 0), subsets, isCompressed) };
}

function values(descriptors: number[], picture: string, subsets: number, isCompressed: boolean) {
  const opened = open(descriptors, picture, subsets, isCompressed);
  return [...listSubsets(opened)].map((subset) => subset.map(({ value }) => value));
}

function binary(value: number, width: number): string {
  return value.toString(2).padStart(width, '0');
}

// How compressed data are packed: WMO-No. 306, FM 94, data compression, worked by hand.
test('adds increments to the smallest value; an increment of all ones is missing', () => {
  expect(values([11012], `${binary(100, 12)} 000011 000 101 111`, 3, true)).toEqual([[10], [10.5], [null]]);
});

test('gives one value to all where increments have no width, and none to all where it is all ones', () => {
  expect(values([11012], `${binary(77, 12)} 000000`, 2, true)).toEqual([[7.7], [7.7]]);
  expect(values([11012], `${'1'.repeat(12)} 000000`, 2, true)).toEqual([[null], [null]]);
});

test('takes a sum that is all ones of the element as missing too', () => {
  expect(values([11012], `${binary(4090, 12)} 000100 0101 0100 1111`, 3, true)).toEqual([[null], [409.4], [null]]);
});

test('takes all ones as a value in 1-bit elements and in class 31', () => {
  expect(values([101000, 31000, 4006], '1 000101', 1, false)).toEqual([[1, 5]]);
  expect(values([31001], '11111111', 1, false)).toEqual([[255]]);
  expect(values([21155], '1'.repeat(24), 1, false)).toEqual([[null]]);
});

test('counts the increments of text in octets', () => {
  const name = 'TWENTY CHARACTERS OK';
  expect(values([1015, 4006], `<${name}> 000000 000011 000000`, 2, true)).toEqual([
    [name, 3],
    [name, 3],
  ]);
  const zeros = '0'.repeat(160);
  expect(values([1015, 4006], `${zeros} 000010 <AB> <C > 000011 000000`, 2, true)).toEqual([
    ['AB', 3],
    ['C', 3],
  ]);
});

test('reads values of negative scale, negative reference and more than 25 bits', () => {
  expect(
    values([5033, 21062, 6001], `${binary(2500, 16)} ${binary(3000, 13)} ${binary(100_000, 26)}`, 1, false),
  ).toEqual([[25_000, -20, -179]]);
});

test('keeps neighbouring subsets of one layout in one block, and parts them where a count changes', () => {
  const subset = (...seconds: number[]) => binary(seconds.length, 8) + seconds.map((s) => binary(s, 6)).join('');
  const picture = [subset(1, 2), subset(3, 4), subset(), subset(5), subset(6)].join('');
  const { blocks } = open([101000, 31001, 4006], picture, 5, false);
  expect(blocks.map(({ firstSubset, subsetCount }) => [firstSubset, subsetCount])).toEqual([
    [0, 2],
    [2, 1],
    [3, 2],
  ]);
  expect(values([101000, 31001, 4006], picture, 5, false)).toEqual([[2, 1, 2], [2, 3, 4], [0], [1, 5], [1, 6]]);
});

test('numbers the occurrences of an element along a subset', () => {
  const { blocks } = open([4006, 101002, 4006], `${'0'.repeat(18)}`, 1, false);
  expect(blocks[0].columns.map(({ occurrence }) => occurrence)).toEqual([0, 1, 2]);
});

test('reports a number outside its physical range with its subset and does not give it', () => {
  const { reader, blocks } = open([11011], `${binary(350, 9)} 000101 00000 01010 01011 11111`, 4, true);
  const read = new Float32Array(4);
  const outside: number[] = [];
  const range = { least: 0, most: 360, onOutside: (subset: number) => outside.push(subset) };
  readNumbers(reader, blocks[0].columns[0], 4, { values: read, first: 0, step: 1 }, range);
  expect([...read]).toEqual([350, 360, Number.NaN, Number.NaN]);
  expect(outside).toEqual([2]);
});

function refusal(action: () => unknown): Problem {
  try {
    action();
  } catch (thrown) {
    return thrown as Problem;
  }
  throw new Error('nothing was refused');
}

test('refuses compressed counts that differ, and accepts equal ones however they are written', () => {
  const same = `${binary(1, 8)} 000010 01 01 ${binary(7, 6)} 000000 ${binary(8, 6)} 000000`;
  expect(values([101000, 31001, 4006], same, 2, true)).toEqual([
    [2, 7, 8],
    [2, 7, 8],
  ]);
  const other = `${binary(1, 8)} 000010 01 00 ${'0'.repeat(40)}`;
  expect(refusal(() => open([101000, 31001, 4006], other, 2, true)).code).toBe('damaged');
});

test('refuses counts and widths that reach past the data, by place, without allocating for them', () => {
  const many = refusal(() => open([101000, 31002, 4006], `${'1'.repeat(16)} ${'0'.repeat(24)}`, 1, false));
  expect(many).toMatchObject({ code: 'truncated', place: { byte: 5 } });
  const subsets = refusal(() => open([4006], `${binary(3, 6)} 001000 ${'0'.repeat(16)}`, 65_535, true));
  expect(subsets).toMatchObject({ code: 'truncated', place: { byte: 1 } });
  expect(refusal(() => open([4006], `${binary(3, 6)} 111111 ${'0'.repeat(160)}`, 2, true)).code).toBe('damaged');
});

test('ends replications within replications of millions of elements at once', () => {
  const bomb = [105255, 104255, 103255, 102255, 101255, 31000];
  expect(refusal(() => open(bomb, '0'.repeat(400_000), 1, false)).code).toBe('damaged');
  expect(refusal(() => open(bomb, '0'.repeat(4000), 1, true)).code).toBe('truncated');
});
