import { expect, test } from 'vitest';
import { isLaidOutFor, layOutWinds, type Winds } from '../../../../renderer/layers/barbs/layout.ts';
import { sortWinds, thinWinds } from '../../../../renderer/layers/barbs/thinning.ts';
import { isInReach, joinBlocks, placeOf } from '../../../../renderer/layers/shared/cells.ts';
import { sortCells } from '../../../../renderer/layers/shared/shown.ts';
import { mercatorX, mercatorY } from '../../../../renderer/map/mercator.ts';
import { reachOf, type View } from '../../../../renderer/map/view.ts';
import { showEverything } from '../../../../src/wind/switches.ts';
import { type DrawnCell, drawBlock } from '../drawn-block.ts';

function viewAt(lon: number, lat: number, zoom: number): View {
  return { x: mercatorX(lon), y: mercatorY(lat), zoom, bearing: 0, widthPx: 900, heightPx: 600 };
}

function windsOf(cells: DrawnCell[], switches = showEverything()): Winds {
  const joined = joinBlocks([drawBlock(cells)]);
  const shown = { switches, hiddenPassIds: [], window: { fromMs: 0, toMs: 1e12 } };
  return { cells: joined, ...thinWinds(joined, sortWinds(joined), sortCells(joined, shown)) };
}

/** A storm across the date line on a lattice of a quarter of a degree, with some scatter in its winds. */
function storm(): DrawnCell[] {
  let state = 7;
  const random = () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
  const cells: DrawnCell[] = [];
  for (let lat = 44; lat <= 56; lat += 0.225) {
    for (let lon = 170; lon <= 190; lon += 0.3) {
      const [east, north] = [(lon - 180) * 0.64, lat - 50];
      const speedMs = 30 * Math.exp(-((east ** 2 + north ** 2) / 18)) + random() * 4;
      const directionFrom = ((Math.atan2(-north, east) * 180) / Math.PI + 360 + random() * 20) % 360;
      cells.push({ lon: lon >= 180 ? lon - 360 : lon, lat, speedMs, directionFrom });
    }
  }
  return cells;
}

function drawnIn(winds: Winds, view: View): number[] {
  const { drawn } = layOutWinds(winds, view, true);
  return drawn.filter((cell) => isInReach(winds.cells, cell, reachOf(view))).sort((a, b) => a - b);
}

test('always draws the strongest wind, at every zoom', () => {
  const winds = windsOf(storm());
  const strongest = winds.cells.speedMs.indexOf(Math.max(...winds.cells.speedMs));
  for (let zoom = 1; zoom <= 10; zoom += 0.5) {
    const { lon, lat } = placeOf(winds.cells, strongest);
    expect(layOutWinds(winds, viewAt(lon, lat, zoom), true).drawn).toContain(strongest);
  }
});

test('draws the same winds of the same water wherever the view is panned', () => {
  const winds = windsOf(storm());
  for (const zoom of [3.5, 4.6, 5.2]) {
    const here = viewAt(180, 50, zoom);
    for (const [east, north] of [
      [2, 0],
      [-1.3, 0.7],
      [0.4, -2],
    ]) {
      const there = viewAt(180 + east, 50 + north, zoom);
      const isInBoth = (cell: number) =>
        isInReach(winds.cells, cell, reachOf(here)) && isInReach(winds.cells, cell, reachOf(there));
      expect(drawnIn(winds, there).filter(isInBoth)).toEqual(drawnIn(winds, here).filter(isInBoth));
    }
  }
});

test('leaves a wind out only for one at least as strong, drawn no further than a bin and a barb away', () => {
  const winds = windsOf(storm());
  const view = viewAt(180, 50, 4.5);
  const { cells } = winds;
  const { drawn } = layOutWinds(winds, view, true);
  const px = 512 * 2 ** 4.5;
  for (let cell = 0; cell < cells.count; cell++) {
    const isCovered = drawn.some((other) => {
      let right = cells.x[other] - cells.x[cell];
      right -= Math.round(right);
      const awayPx = Math.hypot(right, cells.y[other] - cells.y[cell]) * px;
      return cells.speedMs[other] >= cells.speedMs[cell] && awayPx <= Math.hypot(36, 36) + 46;
    });
    expect(isCovered).toBe(true);
  }
});

test('draws every wind once cells stand further apart than barbs are long', () => {
  const winds = windsOf(storm());
  const view = viewAt(180, 50, 9);
  const inView = [...winds.shown.cells].filter((cell) => isInReach(winds.cells, cell, reachOf(view)));
  expect(inView.length).toBeGreaterThan(5);
  expect(drawnIn(winds, view)).toEqual(inView.sort((a, b) => a - b));
});

test('fills the place of a switched-off wind with the next, and keeps a dot for the hidden one', () => {
  const cells = [20, 9].map((speedMs, i) => ({ lon: 10 + i * 0.01, lat: 50, speedMs }));
  const switches = showEverything();
  switches.beaufortShown[8] = false;
  const all = layOutWinds(windsOf(cells), viewAt(10, 50, 4), true);
  const some = layOutWinds(windsOf(cells, switches), viewAt(10, 50, 4), true);
  expect(all.drawn).toEqual([0]);
  expect(some.drawn).toEqual([1]);
  expect(some.list.runs.reduce((count, run) => count + run.count, 0)).toBe(2);
});

test('of equal winds in a bin draws the newest', () => {
  const cells = [1000, 3000, 2000].map((timeS, i) => ({ lon: 10 + i * 0.001, lat: 50, speedMs: 20, timeS }));
  expect(layOutWinds(windsOf(cells), viewAt(10, 50, 4), true).drawn).toEqual([1]);
});

test('lays out nothing anew for a short pan, over the date line too, and does for a long one or another zoom', () => {
  const winds = windsOf(storm());
  const layout = layOutWinds(winds, viewAt(180, 50, 5), true);
  expect(isLaidOutFor(layout, winds, viewAt(-179, 50, 5), true)).toBe(true);
  expect(isLaidOutFor(layout, winds, viewAt(170, 50, 5), true)).toBe(false);
  expect(isLaidOutFor(layout, winds, viewAt(180, 50, 5.5), true)).toBe(false);
  expect(isLaidOutFor(layout, windsOf(storm()), viewAt(180, 50, 5), true)).toBe(false);
});
