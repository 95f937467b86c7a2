import { expect, test } from 'vitest';
import { findFlagTable } from '../../../../../src/decode/products/bufr-winds/flag-tables.ts';
import { readFlags } from '../../../../../src/decode/products/bufr-winds/read-flags.ts';
import { createSwath, LOOKED_NO_WIND, type Swath, WIND } from '../../../../../src/swath/swath.ts';
import { type FlagName, listFlags } from '../../../../../src/wind/flags.ts';

const MISSING = 0xffffffff;

/** One row of cells, each a speed (NaN for no wind) and a flag word. */
function drawSwath(cells: [speedMs: number, word: number][]): Swath {
  const swath = createSwath(1, cells.length);
  cells.forEach(([speedMs, word], cell) => {
    swath.state[cell] = Number.isNaN(speedMs) ? LOOKED_NO_WIND : WIND;
    swath.chosenSolution[cell] = Number.isNaN(speedMs) ? 0 : 1;
    swath.speedMs[cell] = speedMs;
    swath.rawFlags[cell] = word;
  });
  return swath;
}

/** The word of some bits, by number, of flag table 0 21 155, each `lower` places lower: bit n is 2^(24-n). */
const wordOf = (lower: number, ...bits: number[]) => bits.reduce((word, bit) => word + 2 ** (24 - bit - lower), 0);

const light = (lower: number, count = 12): [number, number][] =>
  Array.from({ length: count }, (_, i) => [1 + i / 10, wordOf(lower, 12)]);
const ordinary: [number, number][] = Array.from({ length: 30 }, (_, i) => [5 + i / 2, 0]);

function flagsOf(swath: Swath): FlagName[][] {
  readFlags(swath, findFlagTable(21155));
  return Array.from(swath.flags, (flags) => listFlags(flags));
}

// The seen and the tabled place of each bit of 0 21 155, and the netCDF twin of the lower one: 2^22 for bit 1 down to 2^6.
const namesOfBits: FlagName[] = [
  'tooFewLooks',
  'poorLookGeometry',
  'noisyLook',
  'monitoringNotRun',
  'monitoringAlarm',
  'fitQualityFailed',
  'fieldConsistencyFailed',
  'landInCell',
  'iceInCell',
  'noWindSolution',
  'above30Ms',
  'atMost3Ms',
  'rainCheckNotUsable',
  'rain',
  'noBackgroundUsed',
  'redundant',
  'radarFitTooFar',
];

test.each([
  [0, 'as-table'],
  [1, 'one-bit-lower'],
] as const)('reads every bit that stands %i places lower than its table', (lower, reading) => {
  const cells = namesOfBits.map((_, index): [number, number] => [Number.NaN, wordOf(lower, index + 1)]);
  const swath = drawSwath([...cells, ...light(lower), ...ordinary]);
  const flags = flagsOf(swath);
  expect(swath.flagReading).toBe(reading);
  namesOfBits.forEach((name, index) => {
    expect(flags[index].at(-1)).toBe(name);
    expect(flags[index].length).toBe(1);
  });
});

test('never reads land as a failed consistency check, nor no solution as ice, where bits stand lower', () => {
  const swath = drawSwath([[6, 2 ** 15], [Number.NaN, 2 ** 13], ...light(1), ...ordinary]);
  expect(flagsOf(swath).slice(0, 2)).toEqual([['landInCell'], ['noWindSolution']]);
});

test('checks by winds above 30 m/s as well', () => {
  const strong = Array.from({ length: 10 }, (_, i): [number, number] => [30.5 + i, wordOf(0, 11)]);
  const swath = drawSwath([...strong, ...ordinary]);
  expect(flagsOf(swath)[0]).toEqual(['above30Ms']);
  expect(swath.flagReading).toBe('as-table');
});

test('reads no bit where too few winds can tell its place: set bits are unknown, unset ones are unset', () => {
  const swath = drawSwath([[6, 2 ** 15], [7, 0], ...light(1, 9)]);
  const flags = flagsOf(swath);
  expect(swath.flagReading).toBe('unknown');
  expect(flags.slice(0, 2)).toEqual([['qualityUnknown'], []]);
  expect(swath.rawFlags[0]).toBe(2 ** 15);
});

test('reads no bit, and trusts no unset one, where the winds agree with neither place', () => {
  const swath = drawSwath([[6, 2 ** 15], [2, 0], ...light(5), ...ordinary]);
  const flags = flagsOf(swath);
  expect(swath.flagReading).toBe('unknown');
  expect(flags.every((names) => names.includes('qualityUnknown'))).toBe(true);
});

test('takes a missing word as unknown quality, never as all flags set', () => {
  const swath = drawSwath([[6, MISSING], ...light(1), ...ordinary]);
  expect(flagsOf(swath)[0]).toEqual(['qualityUnknown']);
  const without = drawSwath([
    [6, MISSING],
    [7, MISSING],
  ]);
  expect(flagsOf(without)).toEqual([['qualityUnknown'], ['qualityUnknown']]);
  expect(without.flagReading).toBe('absent');
});

test('says that an unset rain bit is not "no rain" where no cell has one', () => {
  const dry = drawSwath([...light(1), ...ordinary]);
  flagsOf(dry);
  expect(dry.notes.some((note) => note.includes('not "no rain"'))).toBe(true);
  const wet = drawSwath([[9, wordOf(1, 14)], ...light(1), ...ordinary]);
  expect(flagsOf(wet)[0]).toEqual(['rain']);
  expect(wet.notes.some((note) => note.includes('not "no rain"'))).toBe(false);
});
