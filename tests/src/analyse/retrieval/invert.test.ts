import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { expect, test } from 'vitest';
import { modelBackscatter } from '../../../../src/analyse/retrieval/cmod5n.ts';
import {
  invertCell,
  measureCost,
  type RadarLook,
  solutionProbabilities,
} from '../../../../src/analyse/retrieval/invert.ts';

interface Minimum {
  cost: number;
  directionFrom: number;
  speedMs: number;
}

function readFixture<Cell>(name: string): { cells: Cell[] } {
  const path = fileURLToPath(new URL(`../../../fixtures/retrieval/${name}`, import.meta.url));
  return JSON.parse(readFileSync(path, 'utf8'));
}

// Both computed with CMOD5.N by a separate program, at whole degrees of direction; the looks of the second are of a real file.
const noiseFree = readFixture<{ name: string; looks: RadarLook[]; minima: Minimum[] }>('inversion.json').cells;
const real = readFixture<{
  name: string;
  looks: { incidenceDeg: number; azimuthDeg: number; backscatterDb: number; noisePercent: number }[];
  selected: { directionFrom: number; speedMs: number };
  minima: Minimum[];
}>('real-cells.json').cells.map((cell) => ({
  ...cell,
  looks: cell.looks.map(({ incidenceDeg, azimuthDeg, backscatterDb, noisePercent }) => ({
    incidenceDeg,
    azimuthDeg,
    backscatter: 10 ** (backscatterDb / 10),
    noise: noisePercent / 100,
  })),
}));

function turnDeg(a: number, b: number): number {
  return Math.abs(((a - b + 540) % 360) - 180);
}

/** The lowest cost at a direction within the printed speed's tolerance, 0.02 m/s. */
function lowestCostNear(looks: RadarLook[], { speedMs, directionFrom }: Minimum): number {
  const steps = Array.from({ length: 81 }, (_, i) => speedMs - 0.02 + i * 0.0005);
  return Math.min(...steps.map((speed) => measureCost(looks, speed, directionFrom)));
}

test.each([...noiseFree, ...real])('finds every minimum of $name in its rank', ({ looks, minima }) => {
  const solutions = invertCell(looks);
  expect(solutions).toHaveLength(minima.length);
  minima.forEach((minimum, rank) => {
    const found = solutions[rank];
    expect(turnDeg(found.directionFrom, minimum.directionFrom)).toBeLessThanOrEqual(1);
    expect(Math.abs(found.speedMs - minimum.speedMs)).toBeLessThanOrEqual(0.02);
    expect(found.cost).toBeLessThanOrEqual(minimum.cost * 1.01 + 2e-6);
  });
});

test.each([...noiseFree, ...real])('measures the cost of the minima of $name', ({ looks, minima }) => {
  for (const minimum of minima) {
    expect(Math.abs(lowestCostNear(looks, minimum) - minimum.cost)).toBeLessThanOrEqual(minimum.cost * 0.02 + 1e-6);
  }
});

test.each(real)('comes near the wind that the producer chose for $name', ({ looks, selected }) => {
  const nearest = invertCell(looks).reduce((best, other) =>
    turnDeg(other.directionFrom, selected.directionFrom) < turnDeg(best.directionFrom, selected.directionFrom)
      ? other
      : best,
  );
  expect(Math.abs(nearest.speedMs - selected.speedMs)).toBeLessThanOrEqual(0.6);
  expect(turnDeg(nearest.directionFrom, selected.directionFrom)).toBeLessThanOrEqual(5);
});

test('gives back the wind that made the looks, from 2 to 45 m/s and all round the compass', () => {
  for (const speedMs of [2, 4, 7, 12, 20, 30, 45]) {
    for (let directionFrom = 0; directionFrom < 360; directionFrom += 33) {
      const best = invertCell(makeLooks(speedMs, directionFrom))[0];
      expect(Math.abs(best.speedMs - speedMs), `${speedMs} m/s from ${directionFrom}`).toBeLessThan(0.02);
      expect(turnDeg(best.directionFrom, directionFrom)).toBeLessThan(0.2);
    }
  }
});

test('finds no lower cost anywhere on a fine grid of speeds and directions', () => {
  const looks = makeLooks(9, 200).map((look, i) => ({
    ...look,
    backscatter: look.backscatter * [1.06, 0.93, 1.02][i],
  }));
  let lowest = Number.POSITIVE_INFINITY;
  for (let speedMs = 0.2; speedMs <= 50; speedMs += 0.1) {
    for (let directionFrom = 0; directionFrom < 360; directionFrom += 2) {
      lowest = Math.min(lowest, measureCost(looks, speedMs, directionFrom));
    }
  }
  expect(invertCell(looks)[0].cost).toBeLessThanOrEqual(lowest);
});

test('leaves out solutions whose cost is too many times the best', () => {
  const { looks } = real[1];
  expect(invertCell(looks)).toHaveLength(4);
  expect(invertCell(looks, { spuriousRatio: 20 })).toHaveLength(2);
});

test('gives no solution from a single look', () => {
  expect(invertCell(noiseFree[0].looks.slice(0, 1))).toEqual([]);
});

test('gives probabilities that add up to one and fall with the likelihood of the noise', () => {
  const solutions = [
    { speedMs: 8, directionFrom: 10, cost: 1 },
    { speedMs: 8, directionFrom: 190, cost: 2 },
  ];
  const [first, second] = solutionProbabilities(solutions, 3);
  expect(first + second).toBeCloseTo(1, 12);
  expect(first / second).toBeCloseTo(Math.exp(1.5), 12);
});

/** Three noise-free looks of a left-hand cell in mid swath. */
function makeLooks(speedMs: number, directionFrom: number): RadarLook[] {
  return [
    { incidenceDeg: 52.8, azimuthDeg: 122.65 },
    { incidenceDeg: 41.65, azimuthDeg: 77.27 },
    { incidenceDeg: 52.8, azimuthDeg: 31.88 },
  ].map(({ incidenceDeg, azimuthDeg }) => ({
    incidenceDeg,
    azimuthDeg,
    backscatter: modelBackscatter(speedMs, directionFrom - azimuthDeg - 180, incidenceDeg),
    noise: 0.05,
  }));
}
