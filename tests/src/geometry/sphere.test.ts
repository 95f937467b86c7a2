import geodesicLibrary from 'geographiclib-geodesic';
import { expect, test } from 'vitest';
import {
  bearingDeg,
  destination,
  distanceKm,
  EARTH_RADIUS_KM,
  longitudeDifference,
} from '../../../src/geometry/sphere.ts';

// Great-circle cases computed on a sphere where 1' = 1 NM, checked by half-angle and vector forms; the distances are
// angles, so they are compared as angles. [lon1, lat1, lon2, lat2, initial course, nautical miles]
const cases = [
  [-122.4, 37 + 48.5 / 60, 139 + 39 / 60, 35.45, 303.168, 4472.521],
  [175, -40, -175, -40, 93.219, 459.385],
  [-5, 50, -70, 41, 284.538, 2697.65],
  [170, -10, -170, 10, 45.439, 1692.725],
  [0, 60, -90, 60, 310.893, 2484.577],
];

test.each(cases)('finds course and distance from %d %d to %d %d', (lon1, lat1, lon2, lat2, course, nauticalMiles) => {
  expect(bearingDeg(lon1, lat1, lon2, lat2)).toBeCloseTo(course, 2);
  const minutes = (distanceKm(lon1, lat1, lon2, lat2) / EARTH_RADIUS_KM) * (180 / Math.PI) * 60;
  expect(minutes).toBeCloseTo(nauticalMiles, 2);
});

test.each(cases)('arrives where bearing and distance lead, from %d %d', (lon1, lat1, lon2, lat2) => {
  const [lon, lat] = destination(lon1, lat1, bearingDeg(lon1, lat1, lon2, lat2), distanceKm(lon1, lat1, lon2, lat2));
  expect(longitudeDifference(lon, lon2)).toBeCloseTo(0, 9);
  expect(lat).toBeCloseTo(lat2, 9);
});

test('goes the short way round in longitude', () => {
  expect([longitudeDifference(170, -170), longitudeDifference(-170, 170), longitudeDifference(0, 180)]).toEqual([
    20, -20, -180,
  ]);
});

test('stays within 0.6 percent of the WGS 84 geodesic on 2,000 random legs', () => {
  // GeographicLib (Karney 2013, J. Geodesy 87, 43-55); the flattening of 1/298.257 allows 0.56 %.
  const random = seededRandom(7);
  for (let leg = 0; leg < 2000; leg++) {
    const [lon1, lon2] = [random() * 360 - 180, random() * 360 - 180];
    const [lat1, lat2] = [random() * 178 - 89, random() * 178 - 89];
    const geodesic = geodesicLibrary.Geodesic.WGS84.Inverse(lat1, lon1, lat2, lon2).s12 as number;
    expect((distanceKm(lon1, lat1, lon2, lat2) * 1000) / geodesic).toBeGreaterThan(0.994);
    expect((distanceKm(lon1, lat1, lon2, lat2) * 1000) / geodesic).toBeLessThan(1.006);
  }
});

function seededRandom(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state * 48271) % 2147483647;
    return state / 2147483647;
  };
}
