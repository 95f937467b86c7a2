import { Worker } from 'node:worker_threads';
import { Problem } from '../problems/problem.ts';
import type { LoadAsk, LoadNews, LoadSource, LoadWorkerData } from './load-messages.ts';
import { tellFate } from './store-file.ts';

/** The near end of the loading thread. */
export interface Loader {
  /** Begins a task and gives its id; buffers among the sources are moved and may not be touched again. */
  load(sources: LoadSource[], isDemonstration: boolean): number;
  /** Stops a task before its next pass. A task that has ended, or never was, is left alone. */
  stop(taskId: number): void;
  /** Stops everything and ends the thread. */
  close(): Promise<void>;
}

/**
 * A loader whose thread starts with its first task. Should the thread die, the file it was at is told as refused, its
 * tasks as ended, and the next task starts a new thread.
 */
export function startLoader(workerUrl: URL, archivePath: string, hear: (news: LoadNews) => void): Loader {
  let worker: Worker | null = null;
  let lastTaskId = 0;
  /** The file that each unfinished task is at. */
  const openTasks = new Map<number, string>();

  function onNews(news: LoadNews): void {
    if (news.kind === 'load progress') openTasks.set(news.taskId, news.file);
    if (news.kind === 'load ended') openTasks.delete(news.taskId);
    hear(news);
  }

  function onDeath(reason: Error): void {
    worker = null;
    for (const [taskId, file] of openTasks) {
      const problem = new Problem('internal', `Loading ended unexpectedly: ${reason.message}`);
      hear({ kind: 'file fate', taskId, fate: tellFate(file, 'refused', [], [problem]) });
      hear({ kind: 'load ended', taskId, wasStopped: true });
    }
    openTasks.clear();
  }

  function findWorker(): Worker {
    if (worker) return worker;
    worker = new Worker(workerUrl, { workerData: { archivePath } satisfies LoadWorkerData });
    worker.on('message', onNews);
    worker.on('error', onDeath);
    return worker;
  }

  return {
    load(sources, isDemonstration) {
      const taskId = ++lastTaskId;
      const [first] = sources;
      openTasks.set(taskId, 'bytes' in first ? first.name : first.path);
      const moved = sources.flatMap((source) => ('bytes' in source ? [source.bytes] : []));
      const ask: LoadAsk = { kind: 'load', task: { taskId, sources, isDemonstration } };
      findWorker().postMessage(ask, moved);
      return taskId;
    },
    stop(taskId) {
      worker?.postMessage({ kind: 'stop', taskId } satisfies LoadAsk);
    },
    async close() {
      if (!worker) return;
      const ended = new Promise((resolve) => worker?.once('exit', resolve));
      worker.postMessage({ kind: 'close' } satisfies LoadAsk);
      await ended;
    },
  };
}
