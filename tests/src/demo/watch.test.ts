import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { expect, test } from 'vitest';
import { readFileSwaths } from '../../../src/decode/read-file.ts';
import { speedAndDirection } from '../../../src/demo/storm.ts';
import { demonstrationNowMs, demonstrationTitle, trueWindAt } from '../../../src/demo/watch.ts';
import { distanceKm } from '../../../src/geometry/sphere.ts';
import { NEVER_LOOKED, type Swath, WIND } from '../../../src/swath/swath.ts';
import { beaufortOfSpeed, isGale } from '../../../src/wind/beaufort.ts';
import { flagBit } from '../../../src/wind/flags.ts';

function readAsset(name: string): Buffer {
  return readFileSync(fileURLToPath(new URL(`../../../assets/demo/${name}`, import.meta.url)));
}

function readPass(name: string): Swath {
  const { swaths, problems } = readFileSwaths(new Uint8Array(readAsset(name)), name);
  expect(problems).toEqual([]);
  expect(swaths).toHaveLength(1);
  return swaths[0];
}

function listWinds({ state }: Swath): number[] {
  return [...state.keys()].filter((cell) => state[cell] === WIND);
}

function countFlag({ flags }: Swath, cells: number[], mask: number): number {
  return cells.filter((cell) => (flags[cell] & mask) !== 0).length;
}

function turnDeg(a: number, b: number): number {
  return Math.abs(((a - b + 540) % 360) - 180);
}

function rootMeanSquare(values: number[]): number {
  return Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);
}

/** Speed errors, and direction errors where the truth is 4 m/s or more, of winds that carry none of the flags. */
function compareWithTruth(swath: Swath, withoutFlags: number) {
  const clean = listWinds(swath).filter((cell) => (swath.flags[cell] & withoutFlags) === 0);
  const pairs = clean.map((cell) => ({
    cell,
    truth: speedAndDirection(trueWindAt(swath.lon[cell], swath.lat[cell], swath.timeMs[cell])),
  }));
  return {
    speedErrors: pairs.map(({ cell, truth }) => swath.speedMs[cell] - truth.speedMs),
    turns: pairs
      .filter(({ truth }) => truth.speedMs >= 4)
      .map(({ cell, truth }) => turnDeg(swath.directionFrom[cell], truth.directionFrom)),
  };
}

const first = readPass('c-band-pass-1.bufr');
const second = readPass('c-band-pass-2.bufr');
const pencil = readPass('ku-band-pass.nc');

// Counted in the same files by ecCodes 2.28 and, in the third, by the netCDF C library 4.9, both through Python.
test.each([
  {
    name: 'first C-band pass',
    swath: first,
    counts: { cells: 4704, winds: 4289, sum: 46951.35, gales: 640, notFirst: 1245, strongest: 29.05, east: 1661 },
  },
  {
    name: 'second C-band pass',
    swath: second,
    counts: { cells: 4704, winds: 4146, sum: 46721.36, gales: 820, notFirst: 1164, strongest: 32.2, east: 1191 },
  },
  {
    name: 'Ku-band pass',
    swath: pencil,
    counts: { cells: 8064, winds: 6276, sum: 83597.95, gales: 1414, notFirst: 0, strongest: 32.02, east: 4101 },
  },
])('holds in the $name what general libraries count in it', ({ swath, counts }) => {
  const winds = listWinds(swath);
  const sum = winds.reduce((total, cell) => total + swath.speedMs[cell], 0);
  expect({
    cells: swath.state.filter((state) => state !== NEVER_LOOKED).length,
    winds: winds.length,
    sum: Number(sum.toFixed(2)),
    gales: winds.filter((cell) => isGale(swath.speedMs[cell])).length,
    notFirst: winds.filter((cell) => swath.chosenSolution[cell] > 1).length,
    strongest: Number(Math.max(...winds.map((cell) => swath.speedMs[cell])).toFixed(2)),
    east: winds.filter((cell) => swath.lon[cell] > 0).length,
  }).toEqual(counts);
});

// Counted by the same libraries.
test('has gales with a land flag, rain flags in Ku band alone, and light winds', () => {
  const gales = (swath: Swath) => listWinds(swath).filter((cell) => isGale(swath.speedMs[cell]));
  expect(countFlag(second, gales(second), flagBit.landInCell)).toBe(51);
  expect(countFlag(pencil, listWinds(pencil), flagBit.rain)).toBe(402);
  expect(countFlag(first, listWinds(first), flagBit.rain) + countFlag(second, listWinds(second), flagBit.rain)).toBe(0);
  expect(countFlag(first, listWinds(first), flagBit.atMost3Ms)).toBeGreaterThan(100);
});

test('lets each C-band pass see the storm up to storm force, 400 km and more apart', () => {
  const [from, to] = [first, second].map((swath) => {
    const strongest = listWinds(swath).reduce((best, cell) =>
      swath.speedMs[cell] > swath.speedMs[best] ? cell : best,
    );
    expect(beaufortOfSpeed(swath.speedMs[strongest])).toBeGreaterThanOrEqual(11);
    return { lon: swath.lon[strongest], lat: swath.lat[strongest] };
  });
  expect(distanceKm(from.lon, from.lat, to.lon, to.lat)).toBeGreaterThan(400);
  expect(from.lon).toBeGreaterThan(0);
  expect(to.lon).toBeLessThan(0);
});

test('leaves gales at the rim of what each C-band pass saw', () => {
  const hasGaleIn = (swath: Swath, column: number) =>
    listWinds(swath).some((cell) => cell % swath.columns === column && isGale(swath.speedMs[cell]));
  expect([0, 20].every((column) => hasGaleIn(first, column))).toBe(true);
  expect([21, 41].every((column) => hasGaleIn(second, column))).toBe(true);
});

const coastOrBadFit = flagBit.landInCell | flagBit.iceInCell | flagBit.fitQualityFailed;

// 0.5 m/s and 5 degrees: the spread that the noise put in allows; real passes scatter about a model by 1 m/s and more.
test.each([
  { name: 'first', swath: first },
  { name: 'second', swath: second },
])('holds winds of the $name C-band pass within 0.5 m/s and 5 degrees of the drawn storm', ({ swath }) => {
  const { speedErrors, turns } = compareWithTruth(swath, coastOrBadFit);
  expect(rootMeanSquare(speedErrors)).toBeLessThan(0.5);
  expect(rootMeanSquare(turns)).toBeLessThan(5);
});

test('has a second solution that points about the other way in nearly every cell', () => {
  const slots = first.solutions?.slots ?? 0;
  const directions = first.solutions?.directionFrom ?? new Float32Array();
  const winds = listWinds(first).filter((cell) => directions[cell * slots + 1] >= 0);
  const opposite = winds.filter((cell) => turnDeg(directions[cell * slots], directions[cell * slots + 1]) > 150);
  expect(opposite.length / winds.length).toBeGreaterThan(0.95);
});

test('errs in rain in Ku band: more than three times as far from the storm where the flag is set', () => {
  const wet = listWinds(pencil).filter((cell) => (pencil.flags[cell] & flagBit.rain) !== 0);
  const errorOf = (cell: number) =>
    pencil.speedMs[cell] -
    speedAndDirection(trueWindAt(pencil.lon[cell], pencil.lat[cell], pencil.timeMs[cell])).speedMs;
  const dry = compareWithTruth(pencil, flagBit.rain).speedErrors;
  expect(rootMeanSquare(dry)).toBeLessThan(1);
  expect(rootMeanSquare(wet.map(errorOf))).toBeGreaterThan(3 * rootMeanSquare(dry));
});

test('stands 40 to 90 minutes after its newest pass, at the time and under the title of its own', () => {
  const stated = JSON.parse(readAsset('watch.json').toString('utf8'));
  expect([stated.nowMs, stated.title]).toEqual([demonstrationNowMs, demonstrationTitle]);
  const newestMs = second.timeMs.reduce((latest, time) => Math.max(latest, time), 0);
  expect((stated.nowMs - newestMs) / 60_000).toBeGreaterThan(40);
  expect((stated.nowMs - newestMs) / 60_000).toBeLessThan(90);
});

test('is small enough to ship: well under a megabyte', () => {
  const names = ['c-band-pass-1.bufr', 'c-band-pass-2.bufr', 'ku-band-pass.nc'];
  expect(names.reduce((sum, name) => sum + readAsset(name).length, 0)).toBeLessThan(700_000);
});
