import { expect, test } from 'vitest';
import { modelBackscatter } from '../../../../src/analyse/retrieval/cmod5n.ts';
import { findModelTable, tabulatedBackscatter } from '../../../../src/analyse/retrieval/model-table.ts';

test('comes within a ten-thousandth of the function between its entries, at any incidence from 0.4 m/s up', () => {
  let worst = 0;
  for (const incidenceDeg of [18, 27.4, 36.66, 52.4, 57.14, 63.7, 66]) {
    const table = findModelTable(incidenceDeg);
    for (let speedMs = 0.4; speedMs <= 50; speedMs += 0.037) {
      for (const relativeDeg of [0, 50, 90, 180]) {
        const exact = modelBackscatter(speedMs, relativeDeg, incidenceDeg);
        const tabulated = tabulatedBackscatter(table, speedMs, Math.cos((relativeDeg * Math.PI) / 180));
        worst = Math.max(worst, Math.abs(tabulated / exact - 1));
      }
    }
  }
  expect(worst).toBeLessThan(1e-4);
});

test('is made once for an incidence, to a hundredth of a degree', () => {
  expect(findModelTable(41.651)).toBe(findModelTable(41.65));
  expect(findModelTable(41.66)).not.toBe(findModelTable(41.65));
});
