import { expect, test } from 'vitest';
import { fanBeamOrbit, ROW_INTERVAL_S } from '../../../src/demo/fan-beam-geometry.ts';
import { findTrackPoint } from '../../../src/demo/orbit.ts';
import { distanceKm } from '../../../src/geometry/sphere.ts';

const equator = { lon: 10, lat: 0, timeMs: 0, isAscending: true };

// Expected figures were measured on real passes of such an orbit: shift 25.340 degrees, heading 347, rows 25.07 km apart.
test('comes back to the equator 25.34 degrees farther west after one turn', () => {
  const { lon, lat } = findTrackPoint(fanBeamOrbit, equator, fanBeamOrbit.periodS);
  expect(lat).toBeCloseTo(0, 6);
  expect(lon).toBeCloseTo(10 - 25.34, 2);
});

test('crosses the equator northward heading 347 degrees, and southward heading 193', () => {
  expect(findTrackPoint(fanBeamOrbit, equator, 0).headingDeg).toBeCloseTo(347.4, 0);
  expect(findTrackPoint(fanBeamOrbit, { ...equator, isAscending: false }, 0).headingDeg).toBeCloseTo(192.6, 0);
});

test('moves 25 km over the ground from one row to the next', () => {
  for (const seconds of [-600, 0, 900]) {
    const from = findTrackPoint(fanBeamOrbit, equator, seconds);
    const to = findTrackPoint(fanBeamOrbit, equator, seconds + ROW_INTERVAL_S);
    expect(distanceKm(from.lon, from.lat, to.lon, to.lat)).toBeCloseTo(25.1, 0);
  }
});

test('passes the crossing at its own place, north or south bound', () => {
  for (const isAscending of [true, false]) {
    const { lon, lat } = findTrackPoint(fanBeamOrbit, { lon: 179.9, lat: 52, timeMs: 0, isAscending }, 0);
    expect([lon, lat]).toEqual([expect.closeTo(179.9, 6), expect.closeTo(52, 6)]);
  }
});
