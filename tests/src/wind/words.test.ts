import { expect, test } from 'vitest';
import { compassWord } from '../../../src/wind/compass.ts';
import { normaliseDegrees, normaliseLongitude } from '../../../src/wind/units.ts';
import { formatAge, formatDirection, formatPosition } from '../../../src/wind/words.ts';

test('gives the sixteen-point word, a boundary going to the next point', () => {
  // 16-point boundaries at 11.25, 33.75 ...: common practice, no source.
  expect([0, 11.24, 11.25, 33.75, 180, 268.5, 348.74, 348.75, 360].map(compassWord)).toEqual([
    'north',
    'north',
    'north-north-east',
    'north-east',
    'south',
    'west',
    'north-north-west',
    'north',
    'north',
  ]);
});

test('writes north as 360 and pads to three digits', () => {
  // FM 12/13 report calm as 00 and north as 360 (value from memory).
  expect([0, 359.6, 7.4, 268.5].map(formatDirection)).toEqual(['360°', '360°', '007°', '269°']);
});

test('writes positions in whole minutes with hemisphere letters on both sides of the date line and the equator', () => {
  expect(formatPosition(78.60849, -52.50862)).toBe('52°31′S 078°37′E');
  expect(formatPosition(-179.9999, 0.001)).toBe('00°00′N 180°00′W');
  expect(formatPosition(190, 10.9999)).toBe('11°00′N 170°00′W');
});

test('brings directions and longitudes into their ranges', () => {
  expect([-10, 360, 725].map(normaliseDegrees)).toEqual([350, 0, 5]);
  expect([180, -180, 359, 540].map(normaliseLongitude)).toEqual([-180, -180, -1, -180]);
});

test('tells an age in minutes, hours, days and years, and a later time as such', () => {
  const now = Date.UTC(2031, 0, 18, 12);
  const ago = (minutes: number) => formatAge(now - minutes * 60_000, now);
  expect([0, 41, 161, 120, 3000, 60 * 24 * 40, 60 * 24 * 1000].map(ago)).toEqual([
    'just now',
    '41 min ago',
    '2 h 41 min ago',
    '2 h ago',
    '2 days 2 h ago',
    '40 days ago',
    '2 years ago',
  ]);
  expect(ago(-12)).toBe('in 12 min');
});
