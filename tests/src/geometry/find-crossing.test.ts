import { expect, test } from 'vitest';
import { findCrossing } from '../../../src/geometry/find-crossing.ts';

test('finds where a bow tie crosses itself, also across the date line', () => {
  expect(
    findCrossing([
      [-1, -1],
      [1, 1],
      [1, -1],
      [-1, 1],
    ]),
  ).toEqual([0, 0]);
  expect(
    findCrossing([
      [178, -2],
      [-178, 2],
      [-178, -2],
      [178, 2],
    ]),
  ).toEqual([-180, 0]);
});

test('finds nothing wrong with a sound ring, bent or across the date line', () => {
  expect(
    findCrossing([
      [0, 0],
      [4, 0],
      [4, 4],
      [2, 1],
      [0, 4],
    ]),
  ).toBeNull();
  expect(
    findCrossing([
      [178, -2],
      [-178, -2],
      [-178, 2],
      [178, 2],
    ]),
  ).toBeNull();
});
