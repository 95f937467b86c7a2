import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { expect, test } from 'vitest';
import { modelBackscatter } from '../../../../src/analyse/retrieval/cmod5n.ts';

// Values of the published function (Hersbach 2010), computed by two separate codings: see tests/fixtures/README.md.
const rows = readFileSync(fileURLToPath(new URL('../../../fixtures/retrieval/cmod5n.csv', import.meta.url)), 'utf8')
  .trim()
  .split('\n')
  .slice(1)
  .map((line) => line.split(',').map(Number));

test('gives the published function at 100 speeds, directions and incidences', () => {
  expect(rows).toHaveLength(100);
  for (const [speedMs, relativeDirectionDeg, incidenceDeg, , decibel] of rows) {
    // The table prints 7 digits of sigma0 and 6 decimals of its decibels: the second is the finer near 1e-6.
    const expected = 10 ** (decibel / 10);
    const ratio = modelBackscatter(speedMs, relativeDirectionDeg, incidenceDeg) / expected;
    expect(Math.abs(ratio - 1), `${speedMs} m/s, ${relativeDirectionDeg}, ${incidenceDeg} deg`).toBeLessThan(1e-6);
  }
});

test('stays positive and finite beyond 57.1 degrees, where s0 is not positive', () => {
  // 57.14 degrees is 40 + 25 * 0.4971 / 0.7250, the zero of s0 = c12 + c13 x.
  for (const incidenceDeg of [57.13, 57.14, 57.15, 63.7, 66]) {
    for (const speedMs of [0.2, 1, 5, 30, 50]) {
      const sigma0 = modelBackscatter(speedMs, 45, incidenceDeg);
      expect(Number.isFinite(sigma0) && sigma0 > 0).toBe(true);
    }
  }
});

test('is symmetric about the look and repeats every 360 degrees', () => {
  expect(modelBackscatter(12, -70, 45)).toBeCloseTo(modelBackscatter(12, 70, 45), 12);
  expect(modelBackscatter(12, 290, 45)).toBeCloseTo(modelBackscatter(12, 70, 45), 12);
});
