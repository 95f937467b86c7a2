import { expect, test } from 'vitest';
import { measureCoverage } from '../../../../src/analyse/coverage/coverage.ts';
import { layEqualAreaGrid } from '../../../../src/geometry/equal-area-grid.ts';
import { distanceKm, EARTH_RADIUS_KM } from '../../../../src/geometry/sphere.ts';
import type { SeenBlock } from '../../../../src/swath/seen-block.ts';

const STEP_KM = 25;
const DEGREE_KM = (EARTH_RADIUS_KM * Math.PI) / 180;

/** Every place of a 25-km lattice about a centre for which `stateAt` gives a state: one pass, or several. */
function latticeBlock(
  passId: number,
  lon0: number,
  lat0: number,
  size: number,
  stateAt: (eastKm: number, northKm: number) => number,
): SeenBlock {
  const block = emptyBlock(passId, size * size);
  for (let i = 0; i < size * size; i++) {
    const eastKm = ((i % size) - (size - 1) / 2) * STEP_KM;
    const northKm = (Math.floor(i / size) - (size - 1) / 2) * STEP_KM;
    const lat = lat0 + northKm / DEGREE_KM;
    const lon = lon0 + eastKm / DEGREE_KM / Math.cos((lat * Math.PI) / 180);
    block.lonE5[i] = Math.round((((lon + 540) % 360) - 180) * 1e5);
    block.latE5[i] = Math.round(lat * 1e5);
    block.halfSidesM.set([0, STEP_KM * 500, STEP_KM * 500, 0], i * 4);
    block.state[i] = stateAt(eastKm, northKm);
  }
  return block;
}

function emptyBlock(passId: number, cells: number): SeenBlock {
  return {
    passId,
    firstRow: 0,
    columns: cells,
    cells,
    lonE5: new Int32Array(cells),
    latE5: new Int32Array(cells),
    timeS: new Uint32Array(cells),
    flags: new Uint32Array(cells),
    speedMs: new Float32Array(cells),
    directionFrom: new Float32Array(cells),
    halfSidesM: new Int16Array(cells * 4),
    state: new Uint8Array(cells),
  };
}

const all = () => true;
const allSea = (points: number) => new Uint8Array(points).fill(1);

test('sees a disc of footprints with the area of its closed form, pi r squared, across the date line', () => {
  const grid = layEqualAreaGrid({ west: 170, south: -10, east: -170, north: 10 }, 200_000);
  const disc = latticeBlock(1, 180, 0, 61, (east, north) => (Math.hypot(east, north) <= 600 ? 2 : 0));
  const coverage = measureCoverage(grid, allSea(grid.columns * grid.rows), [disc], all);
  const seenKm2 = (1 - coverage.unseenShare) * coverage.seaKm2;
  expect(seenKm2 / (Math.PI * 600 ** 2)).toBeGreaterThan(0.97);
  expect(seenKm2 / (Math.PI * 600 ** 2)).toBeLessThan(1.03);
});

test('does the same at 75 S, where a degree of longitude is a quarter of one of latitude', () => {
  const grid = layEqualAreaGrid({ west: -60, south: -85, east: 60, north: -60 }, 200_000);
  const disc = latticeBlock(1, 10, -75, 41, (east, north) => (Math.hypot(east, north) <= 400 ? 2 : 0));
  const coverage = measureCoverage(grid, allSea(grid.columns * grid.rows), [disc], all);
  const inDisc = disc.state.reduce((sum, state) => sum + (state ? 1 : 0), 0) * STEP_KM ** 2;
  expect(((1 - coverage.unseenShare) * coverage.seaKm2) / inDisc).toBeCloseTo(1, 1);
});

test('counts points only by the footprint they lie in: every seen point is within half a diagonal of a cell', () => {
  const grid = layEqualAreaGrid({ west: -2, south: -2, east: 2, north: 2 }, 10_000);
  const isSea = allSea(grid.columns * grid.rows);
  const one = latticeBlock(1, 0.3, -0.4, 1, () => 2);
  const coverage = measureCoverage(grid, isSea, [one], all);
  let expected = 0;
  for (let point = 0; point < isSea.length; point++) {
    const lon = grid.columnLon[point % grid.columns];
    const lat = grid.rowLat[Math.floor(point / grid.columns)];
    if (distanceKm(0.3, lat, lon, lat) <= 12.75 && distanceKm(lon, -0.4, lon, lat) <= 12.75) expected++;
  }
  expect(Math.round((1 - coverage.unseenShare) * isSea.length)).toBe(expected);
});

test('keeps looked-but-no-wind apart from unseen, and a wind by any pass above both', () => {
  const grid = layEqualAreaGrid({ west: -2, south: -2, east: 2, north: 2 }, 40_000);
  const isSea = allSea(grid.columns * grid.rows);
  const noWind = latticeBlock(1, 0, 0, 40, () => 1);
  const halfWind = latticeBlock(2, 0, 0, 40, (east) => (east > 0 ? 2 : 0));
  const coverage = measureCoverage(grid, isSea, [noWind, halfWind], all);
  expect(coverage.unseenShare).toBe(0);
  expect(coverage.noWindShare).toBeCloseTo(0.5, 1);
  expect(coverage.seenShareOfPass.get(1)).toBe(1);
  expect(coverage.seenShareOfPass.get(2)).toBeCloseTo(0.5, 1);
});

test('says nothing of water that holds no sea', () => {
  const grid = layEqualAreaGrid({ west: -2, south: -2, east: 2, north: 2 }, 100);
  expect(measureCoverage(grid, new Uint8Array(grid.columns * grid.rows), [], all).unseenShare).toBeNaN();
});

test('sees a cell that lies on the pole whole, from every longitude', () => {
  const grid = layEqualAreaGrid({ west: -180, south: 89, east: 180, north: 90 }, 500_000);
  const cap = emptyBlock(1, 1);
  cap.latE5[0] = 9_000_000;
  cap.halfSidesM.set([0, 25_000, 25_000, 0]);
  cap.state[0] = 2;
  const coverage = measureCoverage(grid, allSea(grid.columns * grid.rows), [cap], all);
  const seenKm2 = (1 - coverage.unseenShare) * coverage.seaKm2;
  expect(seenKm2 / (50 * 1.02) ** 2).toBeCloseTo(1, 1);
});
