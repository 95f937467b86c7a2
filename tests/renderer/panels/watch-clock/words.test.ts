import { expect, test } from 'vitest';
import { describeHours, describeShare, fromTyped, toTyped } from '../../../../renderer/panels/watch-clock/words.ts';

test('reads a typed moment as UTC, and writes it the same', () => {
  const moment = Date.UTC(2031, 0, 17, 4, 5);
  expect(fromTyped('2031-01-17 04:05')).toBe(moment);
  expect(fromTyped(' 2031-01-17T04:05Z ')).toBe(moment);
  expect(toTyped(moment)).toBe('2031-01-17 04:05');
});

test('takes no moment that is none', () => {
  for (const text of ['', '17/01/2031 04:05', '2031-02-30 04:05', '2031-01-17 25:00', '2031-01-17 04:61']) {
    expect(fromTyped(text)).toBeNull();
  }
});

test('never rounds a share to nothing or to all', () => {
  expect(describeShare(0.001)).toBe('under 1 %');
  expect(describeShare(0.9999)).toBe('over 99 %');
  expect(describeShare(0)).toBe('0 %');
  expect(describeShare(1)).toBe('100 %');
});

test('names lengths of the window', () => {
  expect([0.25, 12, 72, 96, 8784].map(describeHours)).toEqual(['15 min', '12 h', '72 h', '4 days', '366 days']);
});
