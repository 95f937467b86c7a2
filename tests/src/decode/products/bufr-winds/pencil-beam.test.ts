import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { readBufrSwaths } from '../../../../../src/decode/products/bufr-winds/read-bufr-swaths.ts';
import { encodeBufrMessage } from '../../../../../src/demo/encode-bufr-message.ts';
import { listFlags } from '../../../../../src/wind/flags.ts';

// 12 cells of 3 12 028 written by ecCodes, and the values ecCodes reads back: tests/fixtures/bufr/make-fixtures.py.
const folder = new URL('../../../../fixtures/bufr/', import.meta.url);
const bytes = new Uint8Array(readFileSync(new URL('pencil-beam-028.bufr', folder)));
const subsets: (number | null)[][] = JSON.parse(readFileSync(new URL('pencil-beam-028.json', folder), 'utf8')).subsets;

const { swaths, problems } = readBufrSwaths(bytes, 'pencil.bufr');
const [swath] = swaths;

test('reads a Ku-band pencil-beam pass with its row numbers, its slots and its four looks', () => {
  expect([problems, swaths.length]).toEqual([[], 1]);
  // Cells are numbered 30 to 33: the places before them were never looked at.
  expect([swath.rows, swath.columns, swath.state.filter((state) => state !== 0).length]).toEqual([3, 33, 12]);
  expect([swath.band, swath.viewing, swath.platformCode, swath.cellSizeM]).toEqual(['Ku', 'pencil-beam', 905, 25_000]);
  expect([swath.solutions?.slots, swath.beams?.count]).toEqual([2, 4]);
});

test('gives each cell the wind, place, background and looks of the file', () => {
  subsets.forEach((subset, index) => {
    const cell = Math.floor(index / 4) * 33 + 29 + (index % 4);
    expect(swath.lat[cell]).toBe(subset[14]);
    expect(swath.lon[cell]).toBe(subset[15]);
    expect(swath.speedMs[cell]).toBe(Math.fround(subset[30] ?? Number.NaN));
    expect(swath.directionFrom[cell]).toBe(Math.fround(subset[32] ?? Number.NaN));
    expect(swath.background?.directionFrom[cell]).toBe(45);
    // The time of the row, not the difference in seconds that follows it.
    expect(new Date(swath.timeMs[cell]).getUTCSeconds()).toBe(9 + Math.floor(index / 4));
    for (const look of [0, 1, 2, 3]) {
      expect(swath.beams?.incidenceDeg[cell * 4 + look]).toBe(look % 2 ? 54 : 46);
      expect(swath.beams?.backscatterDb[cell * 4 + look]).toBe(-15 - look);
    }
  });
});

test('checks the flag bits of its own table against the winds', () => {
  expect(swath.flagReading).toBe('as-table');
  const words = [29, 2 * 33 + 32].map((cell) => listFlags(swath.flags[cell]));
  expect(words).toEqual([['atMost3Ms'], ['landInCell']]);
});

test('takes likelihoods that do not sum to 1 over a cell for no probabilities', () => {
  const changed = subsets.map((subset) => subset.map((value) => (value === -0.301 ? -5 : value)));
  const message = encodeBufrMessage({
    edition: 4,
    isCompressed: true,
    descriptors: [312028],
    subsets: changed,
    timeMs: 0,
  });
  const other = readBufrSwaths(message, 'x').swaths[0];
  expect(swath.solutions?.probability[29 * 2]).toBeCloseTo(0.5, 3);
  expect(other.solutions?.probability.every(Number.isNaN)).toBe(true);
  expect(other.notes.some((note) => note.includes('no probabilities'))).toBe(true);
});
