import { expect, test } from 'vitest';
import { rainAt, type Storm, speedAndDirection, stormCentre, windAt } from '../../../src/demo/storm.ts';
import { destination } from '../../../src/geometry/sphere.ts';

const storm: Storm = {
  start: { timeMs: 0, lon: 179.5, lat: 54 },
  courseDeg: 90,
  speedKmPerHour: 50,
  vortexMs: 25,
  vortexGrowthMsPerHour: 0,
  radiusKm: 200,
  frontTurnDeg: 30,
  high: { lon: -150, lat: 44 },
  smallLow: null,
};

function windBeside(bearing: number, distanceKm: number) {
  const [lon, lat] = destination(storm.start.lon, storm.start.lat, bearing, distanceKm);
  return speedAndDirection(windAt(storm, lon, lat, 0));
}

function turnDeg(a: number, b: number): number {
  return Math.abs(((a - b + 540) % 360) - 180);
}

// Buys Ballot's law: in the northern hemisphere the wind goes counter-clockwise round a low, drawn in towards it.
test('blows counter-clockwise round the low and inwards', () => {
  expect(turnDeg(windBeside(0, 200).directionFrom, 70)).toBeLessThan(15);
  expect(turnDeg(windBeside(90, 200).directionFrom, 160)).toBeLessThan(40);
  expect(turnDeg(windBeside(270, 200).directionFrom, 340)).toBeLessThan(15);
});

test('blows clockwise round the high', () => {
  const calm = { ...storm, vortexMs: 0 };
  const [eastLon, eastLat] = destination(-150, 44, 90, 500);
  expect(turnDeg(speedAndDirection(windAt(calm, eastLon, eastLat, 0)).directionFrom, 0)).toBeLessThan(60);
});

test('is strongest south of the centre, about its radius away, and light in the middle', () => {
  expect(windBeside(200, 200).speedMs).toBeGreaterThan(windBeside(20, 200).speedMs);
  expect(windBeside(200, 200).speedMs).toBeGreaterThan(windBeside(200, 600).speedMs);
  expect(windBeside(200, 1).speedMs).toBeLessThan(8);
});

test('veers by more than forty degrees across the cold front', () => {
  const ahead = windBeside(142, 500).directionFrom;
  const behind = windBeside(158, 500).directionFrom;
  expect(behind - ahead).toBeGreaterThan(40);
});

test('moves over the date line along its course', () => {
  const [lon, lat] = stormCentre(storm, 2 * 3_600_000);
  expect(lon).toBeCloseTo(179.5 + 100 / (111.195 * Math.cos((54 * Math.PI) / 180)) - 360, 1);
  expect(lat).toBeCloseTo(54, 1);
});

test('rains along the front and not far behind it', () => {
  const rainBeside = (bearing: number, distanceKm: number) =>
    rainAt(storm, ...destination(storm.start.lon, storm.start.lat, bearing, distanceKm), 0);
  expect(rainBeside(147, 500)).toBeGreaterThan(2);
  expect(rainBeside(185, 500)).toBeLessThan(0.1);
});
