import { expect, test } from 'vitest';
import { formatCount, splitFigures } from '../../../../renderer/panels/shared/figures.ts';

const figuresOf = (text: string) =>
  splitFigures(text)
    .filter((piece) => piece.isFigure)
    .map((piece) => piece.text);

test('sets positions, times, dates and directions apart whole, without the punctuation after them', () => {
  expect(figuresOf('from 269°: 52°31′S 078°37′E, at 2031-01-17 01:19:33 UTC, 2 h 41 min ago.')).toEqual([
    '269°',
    '52°31′S',
    '078°37′E',
    '2031-01-17',
    '01:19:33',
    '2',
    '41',
  ]);
});

test('loses nothing of a text', () => {
  const text = 'In this view 54 kt (27.9 m/s), 49 % unseen';
  expect(
    splitFigures(text)
      .map((piece) => piece.text)
      .join(''),
  ).toBe(text);
});

test('sets thousands apart', () => {
  expect(formatCount(68544)).toBe('68\u202f544');
  expect(formatCount(1234567)).toBe('1\u202f234\u202f567');
  expect(formatCount(336)).toBe('336');
});
