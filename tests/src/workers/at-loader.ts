import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { FileFate } from '../../../src/contract/values.ts';
import type { LoadNews, LoadSource } from '../../../src/workers/load-messages.ts';
import { type Loader, startLoader } from '../../../src/workers/start-loader.ts';

/** The loader's own entry, as it runs from the source tree. */
export const workerUrl = new URL('../../../src/workers/load-worker.ts', import.meta.url);

/** A loader over an archive of its own that keeps all news. */
export interface LoaderBench {
  loader: Loader;
  folder: string;
  archivePath: string;
  news: LoadNews[];
  /** Loads and waits for the end; gives the fates. */
  loadAll(sources: LoadSource[]): Promise<FileFate[]>;
  /** Waits for the first news that fits, from now on. */
  next(fits: (news: LoadNews) => boolean): Promise<LoadNews>;
  end(): Promise<void>;
}

export function openLoaderBench(url = workerUrl): LoaderBench {
  const folder = mkdtempSync(join(tmpdir(), 'crosstrack-load-'));
  const archivePath = join(folder, 'archive', 'archive.db');
  const news: LoadNews[] = [];
  const waiting = new Set<(line: LoadNews) => void>();
  const loader = startLoader(url, archivePath, (line) => {
    news.push(line);
    for (const hear of waiting) hear(line);
  });
  const next = (fits: (line: LoadNews) => boolean) =>
    new Promise<LoadNews>((resolve) => {
      const hear = (line: LoadNews) => {
        if (!fits(line)) return;
        waiting.delete(hear);
        resolve(line);
      };
      waiting.add(hear);
    });
  return {
    loader,
    folder,
    archivePath,
    news,
    next,
    async loadAll(sources) {
      const ended = next(({ kind }) => kind === 'load ended');
      const taskId = loader.load(sources, false);
      await ended;
      return news.flatMap((line) => (line.kind === 'file fate' && line.taskId === taskId ? [line.fate] : []));
    },
    async end() {
      await loader.close();
      rmSync(folder, { recursive: true });
    },
  };
}
