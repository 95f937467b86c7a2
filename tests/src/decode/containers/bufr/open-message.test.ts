import { readdirSync, readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { findMessages } from '../../../../../src/decode/containers/bufr/find-messages.ts';
import { listSubsets, openMessage } from '../../../../../src/decode/containers/bufr/open-message.ts';

const folder = new URL('../../../../fixtures/bufr/', import.meta.url);
const names = readdirSync(folder)
  .filter((name) => name.endsWith('.bufr'))
  .map((name) => name.replace('.bufr', ''));

interface Expected {
  descriptors: number[];
  /** One list where all subsets are alike. */
  elements: number[][];
  subsets: (number | string | null)[][];
}

function readFixture(name: string) {
  const bytes = new Uint8Array(readFileSync(new URL(`${name}.bufr`, folder)));
  const expected: Expected = JSON.parse(readFileSync(new URL(`${name}.json`, folder), 'utf8'));
  const { messages, problems } = findMessages(bytes);
  expect([messages.length, problems]).toEqual([1, []]);
  return { message: messages[0], expected, subsets: [...listSubsets(openMessage(bytes, messages[0]))] };
}

// Source: the messages were written and read back by ecCodes 2.28 (tests/fixtures/bufr/make-fixtures.py).
test.each(names)('reads every element of %s as ecCodes does', (name) => {
  const { message, expected, subsets } = readFixture(name);
  expect(message.descriptors).toEqual(expected.descriptors);
  expect(subsets.length).toBe(expected.subsets.length);
  subsets.forEach((subset, index) => {
    const elements = expected.elements[index] ?? expected.elements[0];
    expect(subset.map(({ element }) => element.descriptor)).toEqual(elements);
    subset.forEach(({ element, value }, place) => {
      const wanted = expected.subsets[index][place];
      const where = `subset ${index}, value ${place}, element ${element.descriptor}`;
      if (typeof wanted === 'number') expect(value, where).toBeCloseTo(wanted, 9);
      else expect(value, where).toBe(wanted);
    });
  });
});

test('the fixtures hold compressed and plain messages, both editions, and blocks that differ between subsets', () => {
  const read = names.map((name) => readFixture(name));
  expect(new Set(read.map(({ message }) => message.isCompressed))).toEqual(new Set([true, false]));
  expect(new Set(read.map(({ message }) => message.edition))).toEqual(new Set([3, 4]));
  const lengths = readFixture('any-fan-beam-plain').subsets.map((subset) => subset.length);
  // 92 values before the solutions, four for each of 2, 2, 0 and 3 of them.
  expect(lengths).toEqual([100, 100, 92, 104]);
});
