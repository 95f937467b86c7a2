import { expect, test } from 'vitest';
import { measureCover, rasterLand } from '../../../src/demo/surface.ts';

function rectangle(west: number, south: number, east: number, north: number): number[][] {
  return [
    [west, south],
    [east, south],
    [east, north],
    [west, north],
    [west, south],
  ];
}

// An island cut at the date line with a lake in its western part, and a continent that the box only touches.
const polygons = [
  [rectangle(178, 50, 180, 52), rectangle(178.5, 50.5, 179.5, 51.5)],
  [rectangle(-180, 50, -179, 52)],
  [rectangle(-10, 45, 171, 49)],
];
const isLand = rasterLand(polygons, { west: 170, south: 44, widthDeg: 20, heightDeg: 10 }, 0.05);

test('knows land on both sides of the date line, and the lake in it', () => {
  expect(isLand(178.2, 51)).toBe(true);
  expect(isLand(179, 51)).toBe(false);
  expect(isLand(179.9, 51)).toBe(true);
  expect(isLand(-179.5, 51)).toBe(true);
  expect(isLand(-178.9, 51)).toBe(false);
});

test('knows the edge of land that lies mostly outside the box', () => {
  expect(isLand(170.5, 47)).toBe(true);
  expect(isLand(171.5, 47)).toBe(false);
  expect(isLand(160, 47)).toBe(false);
});

test('measures the share of a footprint that is land, and ice on what is not land', () => {
  const surface = { isLand: (lon: number) => lon < 0, isIce: (_lon: number, lat: number) => lat > 0 };
  // Of seven sample columns three lie west of the middle; of the other four, three rows of seven lie north of it.
  expect(measureCover(surface, 0, 0, 25)).toEqual({ land: 21 / 49, ice: 12 / 49 });
});
