import { basename } from 'node:path';
import type { NewsLine } from '../contract/news.ts';
import { type OperationAnswer, type OperationName, operations } from '../contract/operations.ts';
import { LARGEST_FILE_BYTES } from '../contract/routes.ts';
import { placeOfArchive } from '../files/archive-place.ts';
import { Problem } from '../problems/problem.ts';
import { openArchive } from '../store/archive.ts';
import { readBlocks } from '../store/blocks.ts';
import { startLoader } from '../workers/start-loader.ts';
import { checkInput } from './check-input.ts';
import { openCoastline } from './coastline.ts';
import { openNewsBoard } from './news-board.ts';
import { performers } from './performers.ts';
import { createWatchReader } from './read-watch.ts';

/** Where the desk finds what it works with. */
export interface DeskOptions {
  /** The archive the user chose; without one the default place of this platform (files/archive-place). */
  archivePath?: string | undefined;
  /** The folder of the demonstration; it need not exist. */
  demoFolder: string;
  /** The folder of the base map's land. */
  coastlineFolder: string;
  /** The entry of the loading thread where it is a bundle; without one the source's own. */
  workerUrl?: URL | undefined;
  appVersion: string;
}

/** Everything the program can do for one archive: what each host serves. */
export interface Desk {
  /** Performs an operation; the input is checked first, 'bad-input' where it fails or the name is unknown. */
  perform<Name extends OperationName>(name: Name, input: unknown): Promise<OperationAnswer<Name>>;
  /** The payload 'blocks' (contract/packed-swath), in the order asked; unknown ids are left out. */
  readBlocks(blockIds: readonly number[]): ArrayBuffer;
  /** Loads the bytes of a file; the buffer is moved away and may not be touched again. */
  give(fileName: string, bytes: ArrayBuffer): Promise<{ taskId: number }>;
  /** Hears all news until the given function is called. */
  hearNews(listener: (line: NewsLine) => void): () => void;
  /** Tells news from the host itself: its menu, its window. */
  say(line: NewsLine): void;
  /** Stops loading, ends the thread and closes the archive. */
  close(): Promise<void>;
}

const ownWorkerUrl = new URL('../workers/load-worker.ts', import.meta.url);

/** Opens the archive and sets up all that works on it. Throws what openArchive throws. */
export function openDesk(options: DeskOptions): Desk {
  const archivePath = placeOfArchive(options.archivePath);
  const archive = openArchive(archivePath);
  const news = openNewsBoard();
  const loader = startLoader(options.workerUrl ?? ownWorkerUrl, archivePath, news.say);
  const coastline = openCoastline(options.coastlineFolder);
  const readWatch = createWatchReader(archive, coastline);
  const parts = { archive, loader, news, options, coastline, readWatch };
  return {
    async perform(name, input) {
      return performers[name](parts, checkInput(name, input));
    },
    readBlocks: (blockIds) => readBlocks(archive, blockIds),
    async give(fileName, bytes) {
      if (bytes.byteLength > LARGEST_FILE_BYTES) throw new Problem('refused', 'This file is too large.');
      return { taskId: loader.load([{ name: basename(fileName), bytes }], false) };
    },
    hearNews: news.hear,
    say: news.say,
    async close() {
      await loader.close();
      archive.close();
    },
  };
}

/** Whether a name is that of an operation. */
export function isOperationName(name: string): name is OperationName {
  return Object.hasOwn(operations, name);
}
