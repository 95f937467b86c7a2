import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { findMessages } from '../../../src/decode/containers/bufr/find-messages.ts';
import { readBufrSwaths } from '../../../src/decode/products/bufr-winds/read-bufr-swaths.ts';
import { encodeFanBeamBufr, type FanBeamOptions } from '../../../src/demo/encode-fan-beam-bufr.ts';
import { NEVER_LOOKED, type Swath } from '../../../src/swath/swath.ts';

// A pass that ecCodes wrote (tests/fixtures/bufr/make-fixtures.py), read by the reader that its own tests hold to ecCodes.
const original = readBufrSwaths(
  new Uint8Array(readFileSync(new URL('../../fixtures/bufr/fan-beam-compressed.bufr', import.meta.url))),
  'original',
).swaths[0];

function writeAndRead(swath: Swath, options: Partial<FanBeamOptions>) {
  const bytes = encodeFanBeamBufr(swath, { platformCode: 904, ...options });
  const { swaths, problems } = readBufrSwaths(bytes, 'written');
  expect(problems).toEqual([]);
  return { bytes, swath: swaths[0] };
}

test.each([
  ['in edition 4', {}],
  ['in edition 3', { edition: 3 }],
  ['plain', { isCompressed: false }],
  ['in messages that end within a row', { cellsPerMessage: 5 }],
  ['in bulletins', { cellsPerMessage: 5, hasHeadings: true }],
] as [string, Partial<FanBeamOptions>][])('writes a pass %s that is read back as it was', (_, options) => {
  expect(writeAndRead(original, options).swath).toEqual(original);
});

test('puts a heading before every message', () => {
  const { bytes } = writeAndRead(original, { cellsPerMessage: 10, hasHeadings: true });
  const { messages } = findMessages(bytes);
  expect(messages.length).toBe(3);
  const text = new TextDecoder('latin1').decode(bytes.subarray(0, messages[0].startByte));
  expect(text.slice(8)).toBe('00\x01\r\r\n001\r\r\nISXX01 XXXX 172359\r\r\n');
  expect(Number(text.slice(0, 8))).toBe(messages[0].endByte - messages[0].startByte + text.length - 10 + 4);
});

test('writes no cell for a place never looked at', () => {
  const state = Uint8Array.from(original.state);
  state[2] = NEVER_LOOKED;
  const { swath } = writeAndRead({ ...original, state }, {});
  expect(swath.state[2]).toBe(NEVER_LOOKED);
  expect([swath.lat[2], swath.flags[2], swath.beams?.azimuthDeg[6]]).toEqual([Number.NaN, 0, Number.NaN]);
  expect(swath.state[3]).toBe(original.state[3]);
});

test('writes the flag bits where their table puts them, if asked to', () => {
  const { swath } = writeAndRead(original, { flagPlacesLower: 0 });
  expect(swath.flagReading).toBe('as-table');
  expect(swath.flags).toEqual(original.flags);
  expect(swath.rawFlags).toEqual(original.rawFlags.map((word) => word * 2));
});
