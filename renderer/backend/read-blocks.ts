import { type DrawBlock, viewBlocks } from '../../src/contract/packed-swath.ts';
import { MOST_BLOCKS_PER_REQUEST, routes } from '../../src/contract/routes.ts';
import type { Door } from './door.ts';
import { noAnswer, toToldProblem } from './told-problem.ts';

/** The drawn cells of blocks, as views into what was received; ids the archive no longer has are left out. */
export async function readBlocks(door: Door, blockIds: readonly number[], signal?: AbortSignal): Promise<DrawBlock[]> {
  const blocks: DrawBlock[] = [];
  for (let first = 0; first < blockIds.length; first += MOST_BLOCKS_PER_REQUEST) {
    const ids = blockIds.slice(first, first + MOST_BLOCKS_PER_REQUEST);
    for (const block of viewBlocks(await readPayload(door, ids, signal))) blocks.push(block);
  }
  return blocks;
}

async function readPayload(door: Door, ids: readonly number[], signal: AbortSignal | undefined): Promise<ArrayBuffer> {
  const response = await fetch(`${door.origin}${routes.blocks}?ids=${ids.join(',')}`, {
    headers: door.headers,
    ...(signal && { signal }),
  }).catch((thrown: unknown) => {
    signal?.throwIfAborted();
    throw noAnswer(thrown);
  });
  if (!response.ok) throw toToldProblem(await response.json().catch(() => null), response.status);
  return response.arrayBuffer();
}
