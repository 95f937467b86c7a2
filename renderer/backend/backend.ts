import type { OperationAnswer, OperationInput, OperationName } from '../../src/contract/operations.ts';
import type { DrawBlock } from '../../src/contract/packed-swath.ts';
import { type AskOptions, ask } from './ask.ts';
import { findDoor } from './door.ts';
import { giveFile } from './give-file.ts';
import { listenToNews, type NewsListener } from './news.ts';
import { readBlocks } from './read-blocks.ts';

/** The one way out of the renderer. It is the same whichever host serves the page. */
export interface Backend {
  ask<Name extends OperationName>(
    name: Name,
    input: OperationInput<Name>,
    options?: AskOptions,
  ): Promise<OperationAnswer<Name>>;
  readBlocks(blockIds: readonly number[], signal?: AbortSignal): Promise<DrawBlock[]>;
  giveFile(file: File, onProgress: (share: number) => void, signal: AbortSignal): Promise<number>;
  listenToNews(listener: NewsListener): () => void;
}

/** The backend of the page at an address. */
export function connectBackend(location: { origin: string; hash: string }): Backend {
  const door = findDoor(location);
  return {
    ask: (name, input, options) => ask(door, name, input, options),
    readBlocks: (blockIds, signal) => readBlocks(door, blockIds, signal),
    giveFile: (file, onProgress, signal) => giveFile(door, file, onProgress, signal),
    listenToNews: (listener) => listenToNews(door, listener),
  };
}
