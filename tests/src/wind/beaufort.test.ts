import { expect, test } from 'vitest';
import { beaufortOfKnots, beaufortOfSpeed, describeBeaufortKnots, isGale } from '../../../src/wind/beaufort.ts';
import { toWholeKnots } from '../../../src/wind/units.ts';

// Limits in knots and in m/s: WMO-No. 306 code table 1100 (value from memory; several public tables agree).
const lowestKnots = [0, 1, 4, 7, 11, 17, 22, 28, 34, 41, 48, 56, 64];
const highestMsOfClass = [0.2, 1.5, 3.3, 5.4, 7.9, 10.7, 13.8, 17.1, 20.7, 24.4, 28.4, 32.6];

test('puts the first and last whole knot of each class in that class', () => {
  for (let beaufort = 0; beaufort <= 12; beaufort++) {
    expect(beaufortOfKnots(lowestKnots[beaufort])).toBe(beaufort);
    if (beaufort > 0) expect(beaufortOfKnots(lowestKnots[beaufort] - 1)).toBe(beaufort - 1);
  }
});

test('keeps the highest tabulated m/s of each class in that class', () => {
  expect(highestMsOfClass.map(beaufortOfSpeed)).toEqual([0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11]);
});

test('begins gale at 33.5 kt, so that 17.2 m/s (33.43 kt) is still Beaufort 7', () => {
  expect(beaufortOfSpeed(17.2)).toBe(7);
  expect(isGale((33.49 * 1852) / 3600)).toBe(false);
  expect(isGale((33.5 * 1852) / 3600 + 1e-9)).toBe(true);
});

test('rounds half a knot up and leaves a missing speed without a class', () => {
  expect(toWholeKnots((2.5 * 1852) / 3600 + 1e-12)).toBe(3);
  expect(beaufortOfSpeed(Number.NaN)).toBe(-1);
});

test('says the knots of a class in words', () => {
  expect([0, 8, 12].map(describeBeaufortKnots)).toEqual(['under 1', '34 to 40', '64 and over']);
});
