import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { findMessages } from '../../../src/decode/containers/bufr/find-messages.ts';
import { listSubsets, openMessage } from '../../../src/decode/containers/bufr/open-message.ts';
import { type BufrContent, encodeBufrMessage } from '../../../src/demo/encode-bufr-message.ts';
import { Problem } from '../../../src/problems/problem.ts';

const folder = new URL('../../fixtures/bufr/', import.meta.url);

function dataOf(bytes: Uint8Array): Uint8Array {
  const [message] = findMessages(bytes).messages;
  return bytes.subarray(message.dataByte, message.dataEndByte);
}

// Source: the same values written by ecCodes 2.28 (tests/fixtures/bufr/make-fixtures.py).
test.each([
  'any-fan-beam-compressed',
  'any-fan-beam-plain',
  'any-older-fan-beam',
  'any-pencil-beam-026',
  'any-pencil-beam-028',
  'any-pencil-beam-029',
  'beams-only',
  'fan-beam-compressed',
  'fan-beam-plain',
])('packs the values of %s into the very bytes ecCodes packs them into', (name) => {
  const wanted = new Uint8Array(readFileSync(new URL(`${name}.bufr`, folder)));
  const { descriptors, subsets } = JSON.parse(readFileSync(new URL(`${name}.json`, folder), 'utf8'));
  const { isCompressed } = findMessages(wanted).messages[0];
  const message = encodeBufrMessage({ edition: 4, isCompressed, descriptors, subsets, timeMs: 0 });
  expect(dataOf(message)).toEqual(dataOf(wanted));
  expect(message.length).toBe(wanted.length);
});

const content: BufrContent = {
  edition: 4,
  isCompressed: true,
  descriptors: [1015, 101000, 31001, 11012],
  subsets: [
    ['NORTH BUOY', 2, 7.5, null],
    ['SOUTH BUOY', 2, 8.5, 9],
  ],
  timeMs: Date.UTC(2031, 0, 17, 6, 5, 4),
};

test.each([3, 4] as const)('writes text, counts and missing values in edition %i, compressed or not', (edition) => {
  for (const isCompressed of [true, false]) {
    const bytes = encodeBufrMessage({ ...content, edition, isCompressed });
    const [message] = findMessages(bytes).messages;
    const read = [...listSubsets(openMessage(bytes, message))].map((subset) => subset.map(({ value }) => value));
    expect([message.edition, message.isCompressed, bytes.length]).toEqual([edition, isCompressed, message.endByte]);
    expect(read).toEqual(content.subsets);
  }
});

// Octets of section 1: WMO-No. 306, FM 94.
test('puts the time in the head of the message', () => {
  expect([...encodeBufrMessage(content).subarray(8 + 15, 8 + 22)]).toEqual([7, 239, 1, 17, 6, 5, 4]);
  const edition3 = encodeBufrMessage({ ...content, edition: 3 });
  expect([...edition3.subarray(8 + 12, 8 + 17)]).toEqual([31, 1, 17, 6, 5]);
});

test('keeps every section of edition 3 an even number of octets long', () => {
  const bytes = encodeBufrMessage({ ...content, edition: 3, descriptors: [4006], subsets: [[7]] });
  expect(bytes.length % 2).toBe(0);
});

function refuses(change: Partial<BufrContent>) {
  expect(() => encodeBufrMessage({ ...content, ...change })).toThrow(Problem);
}

test('refuses values that their elements cannot hold, all ones among them', () => {
  refuses({ descriptors: [11012], subsets: [[409.5]] });
  refuses({ descriptors: [11012], subsets: [[-0.1]] });
  refuses({ descriptors: [11012], subsets: [['8']] });
  refuses({ descriptors: [11012], subsets: [[Number.NaN]] });
  refuses({ descriptors: [1015], subsets: [['A NAME LONGER THAN TWENTY']] });
  refuses({ descriptors: [31001, 4006], subsets: [[null, 3]] });
});

test('refuses subsets of another length than their descriptors ask for', () => {
  refuses({ descriptors: [4006], subsets: [[1, 2]] });
  refuses({ descriptors: [4006], subsets: [[1], []] });
  refuses({
    isCompressed: true,
    descriptors: [101000, 31001, 4006],
    subsets: [
      [1, 5],
      [2, 5, 6],
    ],
  });
});
