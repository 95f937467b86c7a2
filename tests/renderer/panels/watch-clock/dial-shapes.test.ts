import { expect, test } from 'vitest';
import {
  ageOfPoint,
  angleOfAge,
  labelled,
  pointAt,
  RING_OUTER,
  WEDGE_LENGTH,
  wedgeOf,
} from '../../../../renderer/panels/watch-clock/dial-shapes.ts';

const HOUR_MS = 3_600_000;

test('puts three hours ago at the left, six at the bottom and nine at the right', () => {
  expect(pointAt(angleOfAge(3 * HOUR_MS), 1).map(Math.round)).toEqual([-1, -0]);
  expect(pointAt(angleOfAge(6 * HOUR_MS), 1).map(Math.round)).toEqual([-0, 1]);
  expect(pointAt(angleOfAge(9 * HOUR_MS), 1).map(Math.round)).toEqual([1, 0]);
});

test('finds the age under a point again', () => {
  for (const hours of [0.5, 3, 7.25, 11.9]) {
    const [x, y] = pointAt(angleOfAge(hours * HOUR_MS), 40);
    expect(ageOfPoint(x, y) / HOUR_MS).toBeCloseTo(hours, 9);
  }
});

test('makes a wedge as long as the share of water seen', () => {
  const half = wedgeOf(HOUR_MS, 2 * HOUR_MS, 0.5);
  const whole = wedgeOf(HOUR_MS, 2 * HOUR_MS, 1);
  expect((whole?.tipRadius ?? 0) - (half?.tipRadius ?? 0)).toBeCloseTo(WEDGE_LENGTH / 2, 9);
  expect(whole?.tipRadius).toBeCloseTo(RING_OUTER + 2 + WEDGE_LENGTH, 9);
});

test('has no wedge for a pass older than the dial or still to come', () => {
  expect(wedgeOf(12 * HOUR_MS, 13 * HOUR_MS, 1)).toBeNull();
  expect(wedgeOf(-2 * HOUR_MS, -HOUR_MS, 1)).toBeNull();
});

test('labels no two wedges nearer than their room, also across the top', () => {
  expect(labelled([-10, -20, -40, 345], 20)).toEqual([true, false, true, false]);
});
