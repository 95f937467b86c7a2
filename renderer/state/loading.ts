import type { NewsLine } from '../../src/contract/news.ts';
import type { Backend } from '../backend/backend.ts';
import { isInWindow } from './clock.ts';
import { adoptTask, changeLoad, hearNews, isUnderWay, type Load, waitingLoad } from './loads.ts';
import { isCalledOff, reasonOf } from './reasons.ts';
import { type SeenStore, windowOf } from './seen.ts';

/** Files on their way into the archive. */
export interface Loading {
  /** Gives files to the host, one after the other. */
  giveFiles(files: readonly File[]): void;
  /** Stops one load wherever it stands. */
  stop(load: Load): void;
  /** Forgets the loads that have ended. */
  forgetEnded(): void;
  hear(line: NewsLine): void;
}

/** Loads files through a backend and tells of them in `seen.loads`. */
export function createLoading(seen: SeenStore, backend: Backend): Loading {
  const waiting: { loadId: number; file: File }[] = [];
  const calledOff = new Map<number, AbortController>();
  let nextLoadId = 1;
  let isSending = false;

  const change = (loadId: number, parts: Partial<Load>) =>
    seen.change({ loads: changeLoad(seen.get().loads, loadId, parts) });

  async function sendAll(): Promise<void> {
    if (isSending) return;
    isSending = true;
    for (let next = waiting.shift(); next; next = waiting.shift()) await send(next.loadId, next.file);
    isSending = false;
  }

  async function send(loadId: number, file: File): Promise<void> {
    const stopping = new AbortController();
    calledOff.set(loadId, stopping);
    change(loadId, { stage: 'sending' });
    try {
      const taskId = await backend.giveFile(file, (share) => change(loadId, { share }), stopping.signal);
      seen.change({ loads: adoptTask(seen.get().loads, loadId, taskId) });
    } catch (thrown) {
      if (isCalledOff(thrown, stopping.signal)) change(loadId, { stage: 'stopped' });
      else change(loadId, { stage: 'failed', reason: reasonOf(thrown) });
    } finally {
      calledOff.delete(loadId);
    }
  }

  return {
    giveFiles(files) {
      const given = files.map((file) => ({ loadId: nextLoadId++, file }));
      waiting.push(...given);
      const loads = given.map(({ loadId, file }) => waitingLoad(loadId, file.name));
      seen.change({ loads: [...seen.get().loads, ...loads] });
      void sendAll();
    },
    stop(load) {
      const place = waiting.findIndex((entry) => entry.loadId === load.loadId);
      if (place >= 0) waiting.splice(place, 1);
      if (load.stage === 'waiting') change(load.loadId, { stage: 'stopped' });
      calledOff.get(load.loadId)?.abort();
      if (load.taskId === null) return;
      backend.ask('stopTask', { taskId: load.taskId }).catch((thrown: unknown) => {
        change(load.loadId, { reason: reasonOf(thrown) });
      });
    },
    forgetEnded: () => seen.change({ loads: seen.get().loads.filter(isUnderWay) }),
    hear(line) {
      const loads = hearNews(seen.get().loads, line, nextLoadId);
      if (loads.length > seen.get().loads.length) nextLoadId++;
      seen.change({ loads });
      if (line.kind === 'file fate') wantLoaded(seen, line.fate.passIds);
    },
  };
}

/**
 * Wants a pass just loaded to be seen, where other passes lie in the window; where none does, standing at the newest of
 * all is offered instead.
 */
function wantLoaded(seen: SeenStore, passIds: readonly number[]): void {
  const window = windowOf(seen.get());
  const passId = passIds.at(-1);
  if (passId !== undefined && seen.get().passes.some((pass) => isInWindow(pass, window))) {
    seen.change({ wantedPassId: passId });
  }
}
