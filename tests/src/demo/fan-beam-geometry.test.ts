import { expect, test } from 'vitest';
import { fanBeamOrbit, locateFanBeamCells } from '../../../src/demo/fan-beam-geometry.ts';
import { distanceKm, longitudeDifference } from '../../../src/geometry/sphere.ts';

const rows = 9;
const middle = 4 * 42;
const northbound = locateFanBeamCells(fanBeamOrbit, { lon: -150, lat: 0, timeMs: 60_500, isAscending: true }, rows);

function distanceBetween({ lon, lat }: { lon: Float64Array; lat: Float64Array }, a: number, b: number): number {
  return distanceKm(lon[a], lat[a], lon[b], lat[b]);
}

// Widths and angles as measured on real passes: gap 742.7 km, each side 499.6 km, cells and rows 25 km apart.
test('leaves a nadir gap of 743 km between two half swaths of 500 km', () => {
  expect(distanceBetween(northbound.swath, middle + 20, middle + 21)).toBeCloseTo(742.7, 0);
  expect(distanceBetween(northbound.swath, middle, middle + 20)).toBeCloseTo(499.6, 0);
  expect(distanceBetween(northbound.swath, middle + 30, middle + 42 + 30)).toBeCloseTo(25, 0);
});

test('has the first cell in the west going north and in the east going south', () => {
  const southbound = locateFanBeamCells(fanBeamOrbit, { lon: -150, lat: 0, timeMs: 0, isAscending: false }, rows);
  const isWest = (lon: Float64Array) => longitudeDifference(lon[middle], lon[middle + 41]) > 0;
  expect(isWest(northbound.swath.lon)).toBe(true);
  expect(isWest(southbound.swath.lon)).toBe(false);
});

test('looks at 27.4 to 52.4 degrees amidships and 36.5 to 63.7 fore and aft', () => {
  const outer = northbound.beams.incidenceDeg.slice(middle * 3, middle * 3 + 3);
  const inner = northbound.beams.incidenceDeg.slice((middle + 20) * 3, (middle + 20) * 3 + 3);
  expect([...inner]).toEqual([36.6, 27.4, 36.6].map((angle) => expect.closeTo(angle, 0)));
  expect([...outer]).toEqual([63.6, 52.4, 63.6].map((angle) => expect.closeTo(angle, 0)));
});

test('points azimuths from the cell to the satellite, as a real file near the equator does', () => {
  const left = northbound.beams.azimuthDeg.slice(middle * 3, middle * 3 + 3);
  const right = northbound.beams.azimuthDeg.slice((middle + 41) * 3, (middle + 41) * 3 + 3);
  // The real cells: 122.91, 77.25, 31.68 on the left; 212.26, 257.67, 303.23 on the right.
  for (const [look, azimuth] of [122.91, 77.25, 31.68].entries()) {
    expect(Math.abs(left[look] - azimuth)).toBeLessThan(1.5);
  }
  for (const [look, azimuth] of [212.26, 257.67, 303.23].entries()) {
    expect(Math.abs(right[look] - azimuth)).toBeLessThan(1.5);
  }
});

test('gives every row one time in whole seconds', () => {
  const { timeMs } = northbound.swath;
  for (let cell = 0; cell < timeMs.length; cell++) {
    expect(timeMs[cell]).toBe(timeMs[cell - (cell % 42)]);
    expect(timeMs[cell] % 1000).toBe(0);
  }
});
