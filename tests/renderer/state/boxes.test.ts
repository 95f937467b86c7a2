import { expect, test } from 'vitest';
import { boxRound, boxWidthDeg, growBox, isBoxInside, wholeEarth } from '../../../renderer/state/boxes.ts';

test('measures a box across the date line by its short way', () => {
  expect(boxWidthDeg({ west: 170, south: 0, east: -170, north: 10 })).toBe(20);
  expect(boxWidthDeg(wholeEarth)).toBe(360);
});

test('grows a box past the date line and stops at the pole', () => {
  const grown = growBox({ west: 160, south: 60, east: 176, north: 80 }, 0.5);
  expect(grown).toEqual({ west: 152, south: 50, east: -176, north: 90 });
});

test('grows a wide box to go all the way round', () => {
  const grown = growBox({ west: -120, south: 0, east: 120, north: 10 }, 0.5);
  expect([grown.west, grown.east]).toEqual([-180, 180]);
});

test('finds a box inside another across the date line, and one that pokes out not inside', () => {
  const outer = { west: 160, south: 0, east: -160, north: 20 };
  expect(isBoxInside({ west: 175, south: 1, east: -175, north: 19 }, outer)).toBe(true);
  expect(isBoxInside({ west: 175, south: 1, east: -155, north: 19 }, outer)).toBe(false);
  expect(isBoxInside({ west: -10, south: 1, east: 10, north: 19 }, outer)).toBe(false);
  expect(isBoxInside(outer, wholeEarth)).toBe(true);
});

test('lays the smallest box round positions on both sides of the date line', () => {
  const box = boxRound([
    [178, -50],
    [-178, -48],
    [-170, -52],
  ]);
  expect(box).toEqual({ west: 178, south: -52, east: -170, north: -48 });
});

test('has no box round nothing', () => {
  expect(boxRound([])).toBeNull();
});
