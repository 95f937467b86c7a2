import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { layEqualAreaGrid } from '../../../src/geometry/equal-area-grid.ts';
import { createLand, nearestLand } from '../../../src/geometry/land.ts';
import { edgesOfRings, isInside, paintPolygons, unwrapRing } from '../../../src/geometry/paint-polygons.ts';
import { EARTH_RADIUS_KM } from '../../../src/geometry/sphere.ts';

const square = createLand([
  [
    [
      [10, -1],
      [12, -1],
      [12, 1],
      [10, 1],
    ],
  ],
]);
const minuteKm = (EARTH_RADIUS_KM * Math.PI) / 180 / 60;

test('measures to the nearest shore along the equator: one degree is sixty minutes of arc', () => {
  const land = nearestLand(square, 9, 0);
  expect(land?.distanceKm).toBeCloseTo(60 * minuteKm, 6);
  expect(land?.bearingDeg).toBeCloseTo(90, 6);
});

test('says 0 on land and nothing beyond 1,000 km', () => {
  expect(nearestLand(square, 11, 0)?.distanceKm).toBe(0);
  expect(nearestLand(square, 0, 0)).toBeNull();
});

test('finds land on the other side of the date line', () => {
  const island = createLand([
    [
      [
        [-179, -1],
        [-178, -1],
        [-178, 1],
        [-179, 1],
      ],
    ],
  ]);
  expect(nearestLand(island, 179, 0)?.distanceKm).toBeCloseTo(120 * minuteKm, 6);
});

test('knows a position in a ring across the date line in whatever turn it is given', () => {
  const edges = edgesOfRings([
    unwrapRing([
      [170, -10],
      [-170, -10],
      [-170, 10],
      [170, 10],
    ]),
  ]);
  expect([175, -175, 185, 160, -160].map((lon) => isInside(edges, lon, 0))).toEqual([true, true, true, false, false]);
});

test('gives the whole sphere the area 4 pi R squared', () => {
  const grid = layEqualAreaGrid({ west: -180, south: -90, east: 180, north: 90 }, 10_000);
  expect(grid.pointKm2 * grid.columns * grid.rows).toBeCloseTo(4 * Math.PI * EARTH_RADIUS_KM ** 2, 3);
});

test('paints a zone across the date line with the area of its closed form', () => {
  const grid = layEqualAreaGrid({ west: 160, south: -20, east: -160, north: 20 }, 100_000);
  const edges = edgesOfRings([
    unwrapRing([
      [170, -10],
      [-170, -10],
      [-170, 10],
      [170, 10],
    ]),
  ]);
  const painted = paintPolygons(grid, edges).reduce((sum, point) => sum + point, 0) * grid.pointKm2;
  const closedForm = ((EARTH_RADIUS_KM ** 2 * (20 * Math.PI)) / 180) * 2 * Math.sin((10 * Math.PI) / 180);
  expect(painted / closedForm).toBeCloseTo(1, 2);
});

test('finds about 29 percent of the earth to be land on the base map', () => {
  // 29.2 % is the share commonly printed in atlases (value from memory); the base map leaves out lakes' water.
  const { coordinates } = JSON.parse(readFileSync('assets/coastline/land-50m.json', 'utf8'));
  const grid = layEqualAreaGrid({ west: -180, south: -90, east: 180, north: 90 }, 200_000);
  const land = paintPolygons(grid, createLand(coordinates).edges);
  const share = land.reduce((sum, point) => sum + point, 0) / land.length;
  expect(share).toBeGreaterThan(0.285);
  expect(share).toBeLessThan(0.3);
});
