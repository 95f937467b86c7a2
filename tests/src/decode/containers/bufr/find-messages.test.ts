import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { findMessages } from '../../../../../src/decode/containers/bufr/find-messages.ts';
import { listSubsets, openMessage } from '../../../../../src/decode/containers/bufr/open-message.ts';

const folder = new URL('../../../../fixtures/bufr/', import.meta.url);
const edition4 = new Uint8Array(readFileSync(new URL('beams-only.bufr', folder)));
const edition3 = new Uint8Array(readFileSync(new URL('fan-beam-edition-3.bufr', folder)));

function join(...parts: (string | number[] | Uint8Array)[]): Uint8Array {
  const texts = parts.map((part) => (typeof part === 'string' ? new TextEncoder().encode(part) : part));
  return Uint8Array.from(texts.flatMap((part) => [...part]));
}

function found(bytes: Uint8Array) {
  const { messages, problems } = findMessages(bytes);
  return {
    starts: messages.map(({ startByte }) => startByte),
    problems: problems.map(({ code, place }) => `${code} in ${place.part} at ${place.byte}`),
    messages,
  };
}

const heading = '0000123400\x01\r\r\n001\r\r\nISXX01 XXXX 170600\r\r\n';

test('finds messages between bulletin headings and padding that is not all zero', () => {
  const bytes = join(heading, edition4, '\r\r\n\x03', heading, edition3, '\r\r\n\x030000000000', [0, 0], '0W');
  expect(found(bytes)).toMatchObject({
    starts: [heading.length, heading.length * 2 + edition4.length + 4],
    problems: [],
  });
});

test('passes over the four letters in other text', () => {
  expect(found(join('THIS BUFR BULLETIN AND BUFR AGAIN\r\n', edition4))).toMatchObject({ starts: [35], problems: [] });
});

test('keeps the whole messages when the last one is cut, and tells the loss', () => {
  const bytes = join(edition4, edition4.subarray(0, 500));
  expect(found(bytes)).toMatchObject({ starts: [0], problems: [`truncated in message 2 at ${edition4.length}`] });
  const inHead = join(edition4, edition4.subarray(0, 6));
  expect(found(inHead)).toMatchObject({ starts: [0], problems: [`truncated in message 2 at ${inHead.length}`] });
});

test('goes on after a message whose length lies, short or long', () => {
  for (const [at, change, code] of [
    [6, 1, 'damaged'],
    [6, -1, 'damaged'],
    [4, 100, 'truncated'],
  ] as const) {
    const lying = Uint8Array.from(edition4);
    lying[at] += change;
    const result = found(join(lying, edition4));
    expect(result.starts).toEqual([lying.length]);
    expect(result.problems[0]).toMatch(new RegExp(`^${code} in message 1 at`));
  }
});

test('refuses sections that do not fit in their message', () => {
  const section1 = 8;
  for (const length of [0, 5, 200, 60_000]) {
    const lying = Uint8Array.from(edition4);
    lying.set([length >> 16, (length >> 8) & 255, length & 255], section1);
    expect(found(lying).problems.length).toBe(1);
  }
});

// Octets: WMO-No. 306, FM 94, section 1; edition 0 has no total length and its edition stands in octet 4 of section 1.
test('reads editions 0, 2, 3 and 4 alike, with or without an optional section', () => {
  const sections3to5 = edition3.subarray(8 + edition3[10]);
  const section2 = [0, 0, 8, 0, 1, 2, 3, 4];
  const section1 = (octet4: number, flag: number) => [
    0,
    0,
    18,
    octet4,
    0,
    210,
    0,
    flag,
    12,
    8,
    13,
    1,
    98,
    2,
    3,
    4,
    5,
    0,
  ];
  const length = 8 + 18 + section2.length + sections3to5.length;
  const bytes = join(
    join('BUFR', section1(0, 0), sections3to5),
    join('BUFR', section1(0, 128), section2, sections3to5),
    join('BUFR', [0, length >> 8, length & 255, 2], section1(0, 128), section2, sections3to5),
    edition3,
    edition4,
  );
  const { messages, problems } = found(bytes);
  expect(problems).toEqual([]);
  expect(messages.map(({ edition }) => edition)).toEqual([0, 0, 2, 3, 4]);
  expect(messages.map(({ centre }) => centre).slice(0, 3)).toEqual([210, 210, 210]);
  const values = messages
    .slice(0, 4)
    .map((message) => [...listSubsets(openMessage(bytes, message))].map((s) => s[12].value));
  for (const list of values) expect(list).toEqual(values[3]);
});

test('names an edition and a master table that it does not know', () => {
  const edition = Uint8Array.from(edition4);
  edition[7] = 5;
  expect(findMessages(edition).problems[0]).toMatchObject({ code: 'unsupported-format', place: { byte: 7 } });
  const table = Uint8Array.from(edition4);
  table[8 + 3] = 10;
  expect(findMessages(table).problems[0]).toMatchObject({ code: 'unsupported-format', place: { byte: 11 } });
});

test('finds nothing in no bytes and in other bytes', () => {
  expect(found(new Uint8Array(0))).toMatchObject({ starts: [], problems: [] });
  expect(found(join('nothing here but B and BU and BUF'))).toMatchObject({ starts: [], problems: [] });
});
