import { expect, test } from 'vitest';
import type { Backend } from '../../../renderer/backend/backend.ts';
import { keepBlocksFresh } from '../../../renderer/state/blocks.ts';
import { setClock } from '../../../renderer/state/clock.ts';
import { createSeen } from '../../../renderer/state/seen.ts';
import { blockBytes, type DrawBlock, layOutBlock } from '../../../src/contract/packed-swath.ts';

const HOUR_MS = 3_600_000;
const box = { west: 170, south: -60, east: -170, north: -40 };

function block(blockId: number): DrawBlock {
  return layOutBlock(new ArrayBuffer(blockBytes(1)), 0, { blockId, passId: 1, firstRow: 0, rows: 1, columns: 1 });
}

/** A backend that holds some blocks and writes down which were read. */
function holding(found: { ids: number[] }) {
  const read: number[][] = [];
  let asked = 0;
  const backend = {
    ask: async () => {
      asked++;
      return { blocks: found.ids.map((blockId) => ({ blockId, passId: 1, cells: 1 })) };
    },
    readBlocks: async (ids: number[]) => {
      read.push(ids);
      return ids.map(block);
    },
  } as unknown as Backend;
  return { backend, read, timesAsked: () => asked };
}

const settled = () => new Promise((resolve) => setTimeout(resolve, 5));

test('reads each block once, and only those it does not have', async () => {
  const found = { ids: [1, 2] };
  const { backend, read } = holding(found);
  const seen = createSeen(100 * HOUR_MS);
  keepBlocksFresh(seen, backend);
  seen.change({ box });
  await settled();
  found.ids = [1, 2, 3];
  seen.change({ passes: [] });
  await settled();
  expect(read).toEqual([[1, 2], [3]]);
  expect(seen.get().blocks.map((one) => one.blockId)).toEqual([1, 2, 3]);
});

test('asks nothing again for a short pan or a clock that moves on by a minute', async () => {
  const { backend, timesAsked } = holding({ ids: [1] });
  const seen = createSeen(100 * HOUR_MS + 5 * 60_000);
  keepBlocksFresh(seen, backend);
  seen.change({ box });
  await settled();
  seen.change({ box: { west: 174, south: -58, east: -166, north: -38 }, systemMs: 100 * HOUR_MS + 6 * 60_000 });
  await settled();
  expect(timesAsked()).toBe(1);
  setClock(seen, 50 * HOUR_MS);
  await settled();
  expect(timesAsked()).toBe(2);
});

test('says that winds are being read until all of them are there, for blank water means nothing until then', async () => {
  const { backend } = holding({ ids: [1] });
  const seen = createSeen(100 * HOUR_MS);
  keepBlocksFresh(seen, backend);
  seen.change({ box });
  await Promise.resolve();
  await Promise.resolve();
  expect(seen.get().blocksReading.state).toBe('reading');
  await settled();
  expect(seen.get().blocksReading.state).toBe('read');
});
