import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { readBufrSwaths } from '../../../../../src/decode/products/bufr-winds/read-bufr-swaths.ts';
import { LOOKED_NO_WIND, type Swath, WIND } from '../../../../../src/swath/swath.ts';
import { listFlags } from '../../../../../src/wind/flags.ts';

const folder = new URL('../../../../fixtures/bufr/', import.meta.url);
const bytesOf = (name: string) => new Uint8Array(readFileSync(new URL(`${name}.bufr`, folder)));

// The cells of these fixtures, and why they are as they are: tests/fixtures/bufr/make-fixtures.py, fan_beam_cell. The
// messages were written by ecCodes; the values expected below are what ecCodes reads back (the .json beside each).
const COLUMNS = 6;
const subsets: (number | null)[][] = JSON.parse(
  readFileSync(new URL('fan-beam-compressed.json', folder), 'utf8'),
).subsets;
const number = (value: number | null) => value ?? Number.NaN;
const readPass = (name: string): Swath => {
  const { swaths, problems } = readBufrSwaths(bytesOf(name), `${name}.bufr`);
  expect([swaths.length, problems]).toEqual([1, []]);
  return swaths[0];
};

test('puts cells in rows by their time and in columns by their cell number', () => {
  const swath = readPass('fan-beam-compressed');
  expect([swath.rows, swath.columns]).toEqual([4, COLUMNS]);
  expect(Array.from(swath.timeMs, (timeMs) => new Date(timeMs).toISOString().slice(8, 19))).toEqual(
    ['17T23:59:52', '17T23:59:56', '18T00:00:00', '18T00:00:04'].flatMap((time) => new Array(COLUMNS).fill(time)),
  );
});

test('keeps positions to the last decimal of the file, on both sides of the date line', () => {
  const swath = readPass('fan-beam-compressed');
  expect([...swath.lat]).toEqual(subsets.map((subset) => subset[12]));
  expect([...swath.lon]).toEqual(subsets.map((subset) => subset[13]));
  expect([Math.min(...swath.lon) < -179, Math.max(...swath.lon) > 179]).toEqual([true, true]);
});

test('takes the wind the file selects by its index from 1, not the first', () => {
  const swath = readPass('fan-beam-compressed');
  subsets.forEach((subset, cell) => {
    const selected = subset[90];
    expect(swath.chosenSolution[cell]).toBe(selected ?? 0);
    const speedMs = selected === null ? Number.NaN : number(subset[92 + 4 * (selected - 1)]);
    const directionFrom = selected === null ? Number.NaN : number(subset[93 + 4 * (selected - 1)]) % 360;
    expect(swath.speedMs[cell]).toBe(Math.fround(speedMs));
    expect(swath.directionFrom[cell]).toBe(Math.fround(directionFrom));
  });
  expect(swath.chosenSolution.filter((number) => number === 2).length).toBe(6);
});

// WMO-No. 306, FM 94 table B, class 11: 0 11 011 is the direction from which the wind blows.
test('states that directions are those the wind blows from, and turns 360 to 0', () => {
  const swath = readPass('fan-beam-compressed');
  expect(swath.isDirectionStated).toBe(true);
  expect(number(subsets[0][93])).toBe(360);
  expect(swath.directionFrom[0]).toBe(0);
});

test('tells cells looked at without a wind from cells with one', () => {
  const { state } = readPass('fan-beam-compressed');
  const withoutWind = Array.from(state.keys()).filter((cell) => state[cell] === LOOKED_NO_WIND);
  expect(withoutWind).toEqual([10, 23]);
  expect(state.filter((one) => one === WIND).length).toBe(22);
});

test('keeps every solution with its fit and its probability, the power of ten of its likelihood', () => {
  const { solutions } = readPass('fan-beam-compressed');
  expect(solutions?.slots).toBe(2);
  subsets.forEach((subset, cell) => {
    for (const n of [0, 1]) {
      expect(solutions?.speedMs[cell * 2 + n]).toBe(Math.fround(number(subset[92 + 4 * n])));
      expect(solutions?.fitDistance[cell * 2 + n]).toBe(Math.fround(number(subset[94 + 4 * n])));
      expect(solutions?.probability[cell * 2 + n]).toBe(Math.fround(10 ** number(subset[95 + 4 * n])));
    }
  });
});

test('keeps the beams in the order of the file, each with what it lacks', () => {
  const { beams } = readPass('fan-beam-compressed');
  expect(beams?.count).toBe(3);
  subsets.forEach((subset, cell) => {
    for (const n of [0, 1, 2]) {
      const at = 20 + 14 * n;
      expect(beams?.incidenceDeg[cell * 3 + n]).toBe(Math.fround(number(subset[at + 1])));
      expect(beams?.azimuthDeg[cell * 3 + n]).toBe(Math.fround(number(subset[at + 2])));
      expect(beams?.backscatterDb[cell * 3 + n]).toBe(Math.fround(number(subset[at + 3])));
      expect(beams?.noisePercent[cell * 3 + n]).toBe(Math.fround(number(subset[at + 4])));
    }
  });
  // The fore beam of cells 7 and 8 has an azimuth and nothing else.
  const fore = 7 * 3;
  expect([beams?.incidenceDeg[fore], beams?.backscatterDb[fore]]).toEqual([Number.NaN, Number.NaN]);
  expect(beams?.azimuthDeg[fore]).toBeGreaterThan(0);
});

test('keeps the model wind apart from the observation, and the probability of ice', () => {
  const { background, iceProbability } = readPass('fan-beam-compressed');
  subsets.forEach((subset, cell) => {
    expect(background?.speedMs[cell]).toBe(Math.fround(number(subset[84])));
    expect(background?.directionFrom[cell]).toBe(Math.fround(number(subset[85])));
    expect(iceProbability?.[cell]).toBe(Math.fround(number(subset[86])));
  });
});

test('finds by the winds themselves that the flag bits stand one place lower, and keeps the words as they are', () => {
  const swath = readPass('fan-beam-compressed');
  expect(swath.flagReading).toBe('one-bit-lower');
  expect(swath.notes[0]).toBe(
    'Flag bits stand one place lower than their table puts them: checked against 13 winds of 3 m/s or less or above 30 m/s.',
  );
  expect([...swath.rawFlags]).toEqual(subsets.map((subset) => subset[88]));
  expect(listFlags(swath.flags[10])).toEqual(['landInCell', 'tooFewLooks']);
  expect(listFlags(swath.flags[0])).toEqual(['atMost3Ms']);
  expect(listFlags(swath.flags[22])).toEqual(['above30Ms']);
});

test('keeps the wind of a cell with land in it', () => {
  const swath = readPass('fan-beam-compressed');
  expect(listFlags(swath.flags[15])).toContain('landInCell');
  expect([swath.state[15], swath.speedMs[15]]).toEqual([WIND, Math.fround(number(subsets[15][92]))]);
});

test('says what is known of the source in neutral words', () => {
  const { platformCode, band, viewing, cellSizeM, sourceAsRead } = readPass('fan-beam-compressed');
  expect([platformCode, band, viewing, cellSizeM, sourceAsRead]).toEqual([904, 'C', 'fan-beam', 12_500, null]);
});

test.each(['fan-beam-plain', 'fan-beam-edition-3'])('reads %s into the same swath as the compressed one', (name) => {
  expect(readPass(name)).toEqual(readPass('fan-beam-compressed'));
});

test('names the format by its editions', () => {
  expect(readBufrSwaths(bytesOf('fan-beam-plain'), 'x').format).toBe('BUFR edition 4');
  const both = Uint8Array.from([...bytesOf('fan-beam-plain'), ...bytesOf('fan-beam-edition-3')]);
  expect(readBufrSwaths(both, 'x').format).toBe('BUFR editions 3 and 4');
});

test('reads beams without winds, in two descriptors and no wind part, as cells looked at', () => {
  const swath = readPass('beams-only');
  expect([swath.rows, swath.columns, swath.solutions, swath.background]).toEqual([4, COLUMNS, null, null]);
  expect(swath.state.every((state) => state === LOOKED_NO_WIND)).toBe(true);
  expect(swath.beams).toEqual(readPass('fan-beam-compressed').beams);
  expect(swath.flagReading).toBe('absent');
  expect(swath.flags.every((flags) => listFlags(flags).includes('qualityUnknown'))).toBe(true);
});

test('refuses messages that are no swath, and swaths without cell numbers, by name', () => {
  const other = readBufrSwaths(bytesOf('nested-plain'), 'weather.bufr');
  expect(other.swaths).toEqual([]);
  expect(other.problems[0]).toMatchObject({
    code: 'not-a-swath',
    place: { file: 'weather.bufr', part: 'message 1' },
  });
  const older = readBufrSwaths(bytesOf('any-older-fan-beam'), 'older.bufr');
  expect(older.problems[0]).toMatchObject({ code: 'unsupported-format', place: { part: 'message 1' } });
  expect(older.problems[0].message).toContain('3 12 021');
});

test('says so when there is no message at all', () => {
  expect(readBufrSwaths(new Uint8Array(100), 'zeros').problems[0]).toMatchObject({ code: 'unknown-format' });
});
