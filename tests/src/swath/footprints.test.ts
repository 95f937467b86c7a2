import { expect, test } from 'vitest';
import { destination } from '../../../src/geometry/sphere.ts';
import { measureFootprints } from '../../../src/swath/footprints.ts';
import { createSwath, type Swath, WIND } from '../../../src/swath/swath.ts';

/** Rows of cells 25 km apart about the equator; '.' is never looked; a '|' is the nadir gap of 700 km. */
function drawSwath(rows: string[], lon = 0): Swath {
  const columns = rows[0].replaceAll('|', '').length;
  const swath = createSwath(rows.length, columns);
  swath.cellSizeM = 25_000;
  rows.forEach((line, row) => {
    let eastKm = 0;
    let column = 0;
    for (const sign of line) {
      if (sign === '|') {
        eastKm += 700;
        continue;
      }
      const cell = row * columns + column++;
      const [cellLon] = destination(lon, 0, 90, eastKm);
      eastKm += 25;
      if (sign === '.') continue;
      swath.state[cell] = WIND;
      swath.lon[cell] = cellLon;
      swath.lat[cell] = (row * 25) / 111.195;
    }
  });
  return swath;
}

function sides(swath: Swath, cell: number): number[] {
  return [...measureFootprints(swath).halfSidesM.subarray(cell * 4, cell * 4 + 4)].map((m) => Math.round(m / 100) / 10);
}

test('gives each cell half the step to its neighbours: 12.5 km each way', () => {
  expect(sides(drawSwath(['www', 'www', 'www']), 4)).toEqual([0, 12.5, 12.5, 0]);
});

test('does not reach into the nadir gap', () => {
  expect(sides(drawSwath(['ww|ww', 'ww|ww']), 1)).toEqual([0, 12.5, 12.5, 0]);
});

test('is the same across the date line', () => {
  expect(sides(drawSwath(['www', 'www'], 179.9), 1)).toEqual([0, 12.5, 12.5, 0]);
});

test('makes a lonely cell a square of its cell size', () => {
  expect(sides(drawSwath(['.w.', '...']), 1).map(Math.abs)).toEqual([0, 12.5, 12.5, 0]);
});

test('gives no footprint to what was never looked at', () => {
  expect(sides(drawSwath(['w.w', 'www']), 1)).toEqual([0, 0, 0, 0]);
});
