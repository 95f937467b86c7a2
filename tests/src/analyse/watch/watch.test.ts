import { expect, test } from 'vitest';
import { countWatch } from '../../../../src/analyse/watch/watch.ts';
import type { SeenBlock } from '../../../../src/swath/seen-block.ts';

/** One row of cells: speeds in m/s, '-' looked but no wind, '.' never looked. Times run on by a minute. */
function drawRow(passId: number, cells: (number | '-' | '.')[], firstTimeS = 0): SeenBlock {
  const n = cells.length;
  return {
    passId,
    firstRow: 4,
    columns: n,
    cells: n,
    lonE5: Int32Array.from(cells, (_, i) => i * 100_000),
    latE5: new Int32Array(n),
    timeS: Uint32Array.from(cells, (_, i) => firstTimeS + i * 60),
    flags: new Uint32Array(n),
    speedMs: Float32Array.from(cells, (cell) => (typeof cell === 'number' ? cell : Number.NaN)),
    directionFrom: new Float32Array(n).fill(270),
    halfSidesM: new Int16Array(n * 4),
    state: Uint8Array.from(cells, (cell) => (cell === '.' ? 0 : cell === '-' ? 1 : 2)),
  };
}

const everywhere = () => true;
const nothing = () => false;

test('counts winds, gales by whole knots, and the ages of all that was looked at', () => {
  const figures = countWatch([drawRow(1, ['.', '-', 5, 17.2, 17.3, '.'])], everywhere, nothing);
  expect(figures).toMatchObject({ winds: 3, galeWinds: 1, hiddenGaleWinds: 0, oldestMs: 60_000, newestMs: 240_000 });
});

test('names the strongest wind by pass, row and column counted from 1, even when it is hidden', () => {
  const { strongest, hiddenGaleWinds } = countWatch(
    [drawRow(1, [20, 5]), drawRow(2, [3, 21])],
    everywhere,
    (b) => b.passId === 2,
  );
  expect(strongest).toMatchObject({ passId: 2, row: 5, column: 2, lon: 1, isHidden: true });
  expect(hiddenGaleWinds).toBe(1);
});

test('takes the newest of equally strong winds', () => {
  expect(countWatch([drawRow(1, [20], 500), drawRow(2, [20], 100)], everywhere, nothing).strongest?.passId).toBe(1);
});

test('speaks only of the water asked about, and of nothing when there is none', () => {
  const figures = countWatch([drawRow(1, [20, 30])], (_, cell) => cell === 0, nothing);
  expect(figures.strongest?.speedMs).toBe(20);
  expect(countWatch([], everywhere, nothing)).toMatchObject({ winds: 0, strongest: null, oldestMs: null });
});
