import { expect, test } from 'vitest';
import { unwrapRing, wrapRing } from '../../../../renderer/layers/areas/rings.ts';

test('runs a ring on across the date line the short way', () => {
  expect(
    unwrapRing([
      [170, 50],
      [-170, 50],
      [-170, 40],
      [170, 40],
    ]),
  ).toEqual([
    [170, 50],
    [190, 50],
    [190, 40],
    [170, 40],
  ]);
});

test('brings a drawn ring back into -180 to 180', () => {
  expect(
    wrapRing([
      [190, 50],
      [-181, 40],
      [180, 0],
    ]),
  ).toEqual([
    [-170, 50],
    [179, 40],
    [-180, 0],
  ]);
});
