import { type Cells, WIND } from '../shared/cells.ts';
import { WIND_HIDDEN, WIND_SHOWN } from '../shared/shown.ts';
import { binKey, findFirstLevels, sortByKey } from './bins.ts';

/** The winds among cells in Morton order with their keys: made once for a set of blocks. */
export interface SortedWinds {
  cells: Uint32Array;
  keys: Uint32Array;
}

/** Winds with the lowest level at which each is drawn; made once for a set of switches. */
export interface ThinnedWinds {
  cells: Uint32Array;
  firstLevels: Uint8Array;
}

/** Sorts the winds of joined blocks by their place on the earth. */
export function sortWinds(cells: Cells): SortedWinds {
  const winds = new Uint32Array(cells.count);
  const keys = new Uint32Array(cells.count);
  let count = 0;
  cells.blocks.forEach(({ state }, b) => {
    for (let i = 0; i < state.length; i++) {
      if (state[i] !== WIND) continue;
      const cell = cells.firstCell[b] + i;
      winds[count] = cell;
      keys[count++] = binKey(cells.x[cell], cells.y[cell]);
    }
  });
  const sorted = { cells: winds.subarray(0, count), keys: keys.subarray(0, count) };
  sortByKey(sorted.cells, sorted.keys);
  return sorted;
}

/**
 * Thins the winds shown, and apart from them those the switches hide, so that what is switched off never takes a bin
 * from what is shown.
 */
export function thinWinds(
  cells: Cells,
  sorted: SortedWinds,
  kinds: Uint8Array,
): { shown: ThinnedWinds; hidden: ThinnedWinds } {
  return { shown: thinKind(cells, sorted, kinds, WIND_SHOWN), hidden: thinKind(cells, sorted, kinds, WIND_HIDDEN) };
}

function thinKind(cells: Cells, sorted: SortedWinds, kinds: Uint8Array, kind: number): ThinnedWinds {
  const kept = new Uint32Array(sorted.cells.length);
  const keys = new Uint32Array(sorted.cells.length);
  let count = 0;
  for (let i = 0; i < sorted.cells.length; i++) {
    if (kinds[sorted.cells[i]] !== kind) continue;
    kept[count] = sorted.cells[i];
    keys[count++] = sorted.keys[i];
  }
  const winds = kept.subarray(0, count);
  return { cells: winds, firstLevels: findFirstLevels(winds, keys, (cell, than) => isStronger(cells, cell, than)) };
}

/** The one order of strength: faster first, of equals the newer, then the first by block and place. */
export function isStronger(cells: Cells, cell: number, than: number): boolean {
  const faster = cells.speedMs[cell] - cells.speedMs[than];
  if (faster !== 0) return faster > 0;
  const newer = cells.timeS[cell] - cells.timeS[than];
  if (newer !== 0) return newer > 0;
  const block = cells.blocks[cells.blockAt[cell]].blockId;
  const otherBlock = cells.blocks[cells.blockAt[than]].blockId;
  return block === otherBlock ? cell < than : block < otherBlock;
}
