import { expect, test } from 'vitest';
import {
  countPasses,
  describeRadar,
  describeSpan,
  describeStrongest,
} from '../../../../renderer/panels/passes/words.ts';

const at = (moment: string) => Date.parse(`${moment}Z`);

test('gives the span of a pass, its second date only where it differs', () => {
  expect(describeSpan({ startMs: at('2031-01-17T01:10:00'), endMs: at('2031-01-17T01:22:00') })).toBe(
    '2031-01-17 01:10 to 01:22 UTC',
  );
  expect(describeSpan({ startMs: at('2031-01-16T23:50:00'), endMs: at('2031-01-17T00:05:00') })).toBe(
    '2031-01-16 23:50 to 2031-01-17 00:05 UTC',
  );
});

test('names the radar in neutral words and says what the file does not', () => {
  expect(describeRadar({ band: 'Ku', viewing: 'pencil-beam', cellSizeM: 12_500 })).toBe(
    'Ku band, pencil-beam, cells of 12.5 km',
  );
  expect(describeRadar({ band: null, viewing: null, cellSizeM: null })).toBe('band not stated, viewing not stated');
});

test('gives the strongest wind in the chosen unit, and says where a pass has none', () => {
  expect(describeStrongest({ maxSpeedMs: 27.9 }, 'knots')).toBe('strongest 54 kt, storm');
  expect(describeStrongest({ maxSpeedMs: 27.9 }, 'metresPerSecond')).toBe('strongest 27.9 m/s, storm');
  expect(describeStrongest({ maxSpeedMs: null }, 'knots')).toBe('no wind in it');
});

test('counts passes in the window, hidden and in all', () => {
  expect(countPasses(3, 1, 5)).toBe('3 in the window, 1 hidden, 5 in all');
  expect(countPasses(3, 0, 3)).toBe('3 in the window');
  expect(countPasses(0, 0, 0)).toBe('none');
});
