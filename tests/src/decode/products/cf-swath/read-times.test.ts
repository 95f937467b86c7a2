import { expect, test } from 'vitest';
import { fillMissingTimes, parseTimeUnits } from '../../../../../src/decode/products/cf-swath/read-times.ts';
import { SmallFile } from './small-swath.ts';

// CF conventions 4.4: '<unit> since <reference>', UTC if no zone is given. References by hand with Date.UTC.
test.each([
  ['seconds since 1990-01-01 00:00:00', 1000, Date.UTC(1990, 0, 1)],
  ['seconds since 1990-01-01', 1000, Date.UTC(1990, 0, 1)],
  ['Hours since 2031-1-7 6:00', 3_600_000, Date.UTC(2031, 0, 7, 6)],
  ['days since 1992-10-08 15:15:42.5 -6:00', 86_400_000, Date.UTC(1992, 9, 8, 21, 15, 42) + 500],
  ['minutes since 2031-01-17T12:00:00Z', 60_000, Date.UTC(2031, 0, 17, 12)],
  ['milliseconds since 2031-01-17 00:00:00 UTC', 1, Date.UTC(2031, 0, 17)],
  ['s since 2031-01-17 00:00:00 +0530', 1000, Date.UTC(2031, 0, 16, 18, 30)],
])("reads the unit '%s'", (units, stepMs, originMs) => {
  expect(parseTimeUnits(units, '')).toEqual({ stepMs, originMs });
});

test.each(['', 'seconds', 'fortnights since 1990-01-01', 'days since 0001-01-01', 'seconds since yesterday'])(
  "refuses the unit '%s'",
  (units) => {
    expect(() => parseTimeUnits(units, '')).toThrow(expect.objectContaining({ code: 'not-a-swath' }));
  },
);

test('refuses a calendar that is not the real one', () => {
  expect(() => parseTimeUnits('days since 2031-01-01', '360_day')).toThrow("calendar '360_day'");
  expect(parseTimeUnits('days since 2031-01-01', 'proleptic_gregorian').stepMs).toBe(86_400_000);
});

test('spreads one time for each row, and a single time, over the cells', () => {
  const file = new SmallFile();
  file.content.dimensions[0].length = 2;
  for (const name of ['lat', 'lon', 'wind_speed', 'wind_dir'])
    file.fill(name, 'double', Float64Array.of(1, 2, 3, 4, 5, 6));
  Object.assign(file.get('time'), { dimensions: ['row'], values: Float64Array.of(0, 4) });
  const start = Date.UTC(2031, 0, 17);
  expect(Array.from(file.swath().timeMs, (time) => time - start)).toEqual([0, 0, 0, 4000, 4000, 4000]);
  Object.assign(file.get('time'), { dimensions: [], values: Float64Array.of(7) });
  expect(Array.from(file.swath().timeMs, (time) => time - start)).toEqual(Array(6).fill(7000));
});

test('gives cells without a time that of the nearest cell that was looked at', () => {
  const timeMs = Float64Array.of(Number.NaN, Number.NaN, 3, Number.NaN, 5);
  expect(fillMissingTimes(timeMs, Uint8Array.of(0, 1, 1, 1, 1))).toBe(2);
  expect(Array.from(timeMs)).toEqual([Number.NaN, 3, 3, 3, 5]);
});

test('refuses a swath in which no cell has a time', () => {
  const file = new SmallFile().fill('time', 'double', Float64Array.of(Number.NaN, Number.NaN, 1e300));
  expect(file.refusal().message).toContain('None of the cells has a time');
});
