import { expect, test } from 'vitest';
import { latOfMercator, lonOfMercator, mercatorX, mercatorY } from '../../../renderer/map/mercator.ts';
import {
  boxOf,
  copiesTouching,
  holdsReach,
  nearTo,
  reachOf,
  toMercator,
  toScreen,
  type View,
} from '../../../renderer/map/view.ts';

function viewAt(lon: number, lat: number, zoom: number, bearing = 0): View {
  return { x: mercatorX(lon), y: mercatorY(lat), zoom, bearing, widthPx: 1000, heightPx: 600 };
}

test('counts Web Mercator as EPSG:3857 does', () => {
  // EPSG Guidance Note 7-2, 1024 'Popular Visualisation Pseudo Mercator', worked example: 24°22'54.433"N 100°20'00.000"W
  // gives easting -11169055.58 m, northing 2800000.00 m on a radius of 6378137 m.
  const worldM = 2 * Math.PI * 6_378_137;
  expect((mercatorX(-(100 + 20 / 60)) - 0.5) * worldM).toBeCloseTo(-11_169_055.58, 1);
  expect((0.5 - mercatorY(24 + 22 / 60 + 54.433 / 3600)) * worldM).toBeCloseTo(2_800_000, 0);
});

test('comes back from Web Mercator to the same position', () => {
  for (const [lon, lat] of [
    [-180, -85],
    [0, 0],
    [12.5, 59.9],
    [179.99, 84],
  ]) {
    expect(lonOfMercator(mercatorX(lon))).toBeCloseTo(lon, 9);
    expect(latOfMercator(mercatorY(lat))).toBeCloseTo(lat, 9);
  }
});

test('puts the centre in the middle of the screen, east to the right and north to the top', () => {
  const view = viewAt(20, 50, 5);
  expect(toScreen(view, view.x, view.y)).toEqual([500, 300]);
  const [xPx, yPx] = toScreen(view, mercatorX(21), mercatorY(51));
  expect(xPx).toBeGreaterThan(500);
  expect(yPx).toBeLessThan(300);
});

test('turns the map against its bearing: with 90 degrees east is up', () => {
  const view = viewAt(20, 50, 5, 90);
  const [xPx, yPx] = toScreen(view, mercatorX(21), view.y);
  expect(xPx).toBeCloseTo(500, 6);
  // One degree at zoom 5 is 512 * 32 / 360 pixels.
  expect(yPx).toBeCloseTo(300 - (512 * 32) / 360, 6);
});

test('finds under a screen position what it drew there, however the map is turned', () => {
  const view = viewAt(-30, -55, 4.3, 37);
  const [x, y] = toMercator(view, 123, 456);
  const [xPx, yPx] = toScreen(view, x, y);
  expect([xPx, yPx]).toEqual([expect.closeTo(123, 6), expect.closeTo(456, 6)]);
});

test('gives a box with west greater than east across the date line', () => {
  const box = boxOf(viewAt(180, 50, 5));
  // 1000 pixels at zoom 5 are 1000 / (512 * 32) of 360 degrees.
  const widthDeg = (1000 / (512 * 32)) * 360;
  expect(box.west).toBeCloseTo(180 - widthDeg / 2, 6);
  expect(box.east).toBeCloseTo(-180 + widthDeg / 2, 6);
  expect(box.south).toBeLessThan(50);
  expect(box.north).toBeGreaterThan(50);
});

test('gives the whole way round once a world is in view', () => {
  expect(boxOf(viewAt(100, 0, 0.5))).toMatchObject({ west: -180, east: 180 });
  expect(boxOf(viewAt(100, 0, 1))).not.toMatchObject({ west: -180, east: 180 });
});

test('boxes a turned view by its corners', () => {
  const upright = boxOf(viewAt(0, 0, 5));
  const turned = boxOf(viewAt(0, 0, 5, 45));
  expect(turned.east).toBeGreaterThan(upright.east);
  expect(turned.north).toBeGreaterThan(upright.north);
});

test('finds the copies of the world in which a place is in reach', () => {
  const copiesOf = (view: View, lon: number) => {
    const { first, last } = copiesTouching(reachOf(view), mercatorX(lon), mercatorX(lon));
    return Array.from({ length: last - first + 1 }, (_, i) => first + i);
  };
  const acrossDateLine = viewAt(179, 0, 5);
  expect([178, -178, 0].map((lon) => copiesOf(acrossDateLine, lon))).toEqual([[0], [1], []]);
  expect(copiesOf(viewAt(0, 0, 0.5), 170)).toEqual([-1, 0]);
});

test('finds a box held on the other side of the date line', () => {
  const outer = reachOf(viewAt(179, 0, 5), 200);
  expect(holdsReach(outer, reachOf(nearTo(outer, viewAt(-179, 0, 5))))).toBe(true);
  expect(holdsReach(outer, reachOf(nearTo(outer, viewAt(-150, 0, 5))))).toBe(false);
});
