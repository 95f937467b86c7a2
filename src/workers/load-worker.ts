import { parentPort, workerData } from 'node:worker_threads';
import { openArchive } from '../store/archive.ts';
import type { LoadAsk, LoadNews, LoadWorkerData } from './load-messages.ts';
import { runLoad } from './run-load.ts';

/** The thread that loads: it owns the one connection that writes passes, and does its tasks in the order they came. */
function startWork(port: NonNullable<typeof parentPort>, { archivePath }: LoadWorkerData): void {
  const archive = openArchive(archivePath);
  const stopped = new Set<number>();
  let isClosing = false;
  let work = Promise.resolve();
  const tell = (news: LoadNews) => port.postMessage(news);
  port.on('message', (ask: LoadAsk) => {
    if (ask.kind === 'load') {
      const isStopped = () => isClosing || stopped.has(ask.task.taskId);
      work = work.then(() => runLoad(archive, ask.task, isStopped, tell));
    } else if (ask.kind === 'stop') {
      stopped.add(ask.taskId);
    } else {
      isClosing = true;
      work.finally(() => {
        archive.close();
        port.close();
      });
    }
  });
}

if (parentPort) startWork(parentPort, workerData);
