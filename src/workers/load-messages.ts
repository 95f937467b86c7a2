import type { NewsLine } from '../contract/news.ts';

/** One thing to load: files or folders that lie on this machine, or bytes that were handed over. */
export type LoadSource = { path: string } | { name: string; bytes: ArrayBuffer };

/** A piece of loading work. */
export interface LoadTask {
  taskId: number;
  sources: LoadSource[];
  /** Whether its passes belong to the demonstration. */
  isDemonstration: boolean;
}

/** What the worker is told. */
export type LoadAsk = { kind: 'load'; task: LoadTask } | { kind: 'stop'; taskId: number } | { kind: 'close' };

/** What the worker tells: lines of the news stream, as they are. */
export type LoadNews = Extract<NewsLine, { kind: 'load progress' | 'file fate' | 'load ended' | 'passes changed' }>;

/** What the worker is started with. */
export interface LoadWorkerData {
  archivePath: string;
}
