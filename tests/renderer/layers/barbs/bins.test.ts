import { expect, test } from 'vitest';
import {
  binKey,
  FINEST_LEVEL,
  findFirstLevels,
  levelFor,
  NO_LEVEL,
  sortByKey,
} from '../../../../renderer/layers/barbs/bins.ts';

/** A fixed spread of positions and speeds. */
function strew(count: number, seed: number) {
  let state = seed;
  const random = () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
  const cells = Uint32Array.from({ length: count }, (_, i) => i);
  const places = Array.from({ length: count }, () => [random(), random()]);
  const speeds = Array.from({ length: count }, () => Math.round(random() * 40));
  const keys = Uint32Array.from(places, ([x, y]) => binKey(x, y));
  sortByKey(cells, keys);
  return { cells, keys, speeds, places };
}

test('names a bin of every level by the first bits of the key: south, then east, and so on inward', () => {
  const bits = (x: number, y: number) => binKey(x, y).toString(2).padStart(FINEST_LEVEL, '0').slice(0, 4);
  expect(bits(0.1, 0.1)).toBe('0000');
  expect(bits(0.9, 0.1)).toBe('0101');
  expect(bits(0.1, 0.9)).toBe('1010');
  expect(bits(0.6, 0.3)).toBe('0110');
});

test('sorts by key and keeps the order of equals', () => {
  const cells = Uint32Array.from([7, 3, 5, 1, 2]);
  const keys = Uint32Array.from([9, 2 ** 26 - 1, 0, 9, 8192]);
  sortByKey(cells, keys);
  expect([...keys]).toEqual([0, 9, 9, 8192, 2 ** 26 - 1]);
  expect([...cells]).toEqual([5, 7, 1, 2, 3]);
});

test('draws at every level exactly the strongest of each bin, found the slow way', () => {
  const { cells, keys, speeds } = strew(3000, 11);
  const isStronger = (a: number, b: number) => speeds[a] > speeds[b] || (speeds[a] === speeds[b] && a < b);
  const firstLevels = findFirstLevels(cells, keys, isStronger);
  for (const level of [0, 1, 5, 8, 13, FINEST_LEVEL]) {
    const strongest = new Map<number, number>();
    for (const [i, cell] of cells.entries()) {
      const bin = keys[i] >>> (FINEST_LEVEL - level);
      const rival = strongest.get(bin);
      if (rival === undefined || isStronger(cell, rival)) strongest.set(bin, cell);
    }
    const drawn = [...cells].filter((_, i) => firstLevels[i] <= level);
    expect(drawn.sort()).toEqual([...strongest.values()].sort());
  }
});

test('draws the strongest of all at every level, and every cell where nothing is thinned', () => {
  const { cells, keys, speeds } = strew(500, 5);
  const firstLevels = findFirstLevels(cells, keys, (a, b) => speeds[a] > speeds[b]);
  const strongest = Math.max(...speeds);
  expect(speeds[cells[firstLevels.indexOf(0)]]).toBe(strongest);
  expect(firstLevels.every((level) => level <= NO_LEVEL)).toBe(true);
});

test('chooses bins of 324 to 648 square pixels, and none once the finest are wider apart', () => {
  for (let zoom = 0.5; zoom < 8; zoom += 0.25) {
    const worldPx = 512 * 2 ** zoom;
    const binPx2 = worldPx ** 2 / 2 ** levelFor(worldPx);
    expect(binPx2).toBeGreaterThanOrEqual(324);
    expect(binPx2).toBeLessThan(648);
  }
  expect(levelFor(512 * 2 ** 10)).toBe(NO_LEVEL);
});
