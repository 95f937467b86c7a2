import { type DrawBlock, viewBlocks } from '../contract/packed-swath.ts';
import type { Archive } from '../store/archive.ts';
import { readBlocks } from '../store/blocks.ts';

/** Blocks kept in memory between two questions, bytes; past it all are let go. */
const MOST_BYTES = 256 * 1024 * 1024;

/**
 * Reads blocks by id, keeping those already read: a block never changes and its id is never given again. The blocks of one
 * pass stand together, in the order of its rows.
 */
export function createBlockCache(archive: Archive): (found: readonly { blockId: number }[]) => DrawBlock[] {
  const cache = new Map<number, DrawBlock>();
  let bytes = 0;
  return (found) => {
    if (bytes > MOST_BYTES) {
      cache.clear();
      bytes = 0;
    }
    const payload = readBlocks(
      archive,
      found.map(({ blockId }) => blockId).filter((blockId) => !cache.has(blockId)),
    );
    bytes += payload.byteLength;
    for (const block of viewBlocks(payload)) cache.set(block.blockId, block);
    return found
      .flatMap(({ blockId }) => cache.get(blockId) ?? [])
      .sort((one, other) => one.passId - other.passId || one.firstRow - other.firstRow);
  };
}
