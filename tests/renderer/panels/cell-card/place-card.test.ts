import { expect, test } from 'vitest';
import { sideForCard } from '../../../../renderer/panels/cell-card/place-card.ts';

test('stands the card where it does not cover its cell', () => {
  const chart = { width: 1100, height: 700 };
  expect(sideForCard({ x: 400, y: 300 }, chart, 336)).toBe('right');
  expect(sideForCard({ x: 900, y: 300 }, chart, 336)).toBe('left');
  expect(sideForCard({ x: 250, y: 100 }, { width: 500, height: 500 }, 336)).toBe('bottom');
  expect(sideForCard({ x: 250, y: 400 }, { width: 500, height: 500 }, 336)).toBe('top');
});
