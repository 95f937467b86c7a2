import { setImmediate as nextTurn } from 'node:timers/promises';
import { LARGEST_FILE_BYTES } from '../contract/routes.ts';
import { type FoundFile, findFiles } from '../files/find-files.ts';
import { readBytes } from '../files/read-bytes.ts';
import { toProblem } from '../problems/problem.ts';
import type { Archive } from '../store/archive.ts';
import type { LoadNews, LoadTask } from './load-messages.ts';
import { storeFile, tellFate } from './store-file.ts';

/** A file of the task: found on this machine, or given. */
type Waiting = FoundFile | { name: string; bytes: number; given: ArrayBuffer };

/**
 * Loads everything a task names, one file after the other, and tells progress, each file's fate and the end. A stop is
 * obeyed between passes and between files; what was stored by then stays, whole.
 */
export async function runLoad(
  archive: Archive,
  task: LoadTask,
  isStopped: () => boolean,
  tell: (news: LoadNews) => void,
): Promise<void> {
  const { taskId } = task;
  const files = listFiles(task, tell);
  const bytesTotal = files.reduce((sum, file) => sum + file.bytes, 0);
  let bytesBefore = 0;
  for (const [filesDone, file] of files.entries()) {
    const tellProgress = (share: number) => {
      const bytesDone = bytesBefore + Math.round(share * file.bytes);
      const filesTotal = files.length;
      tell({ kind: 'load progress', taskId, file: file.name, filesDone, filesTotal, bytesDone, bytesTotal });
    };
    await nextTurn();
    if (isStopped()) break;
    tellProgress(0);
    await loadFile(archive, task, file, tellProgress, isStopped, tell);
    bytesBefore += file.bytes;
  }
  tell({ kind: 'load ended', taskId, wasStopped: isStopped() });
}

/** All files of a task; the paths that lead to none are told at once. */
function listFiles(task: LoadTask, tell: (news: LoadNews) => void): Waiting[] {
  const waiting: Waiting[] = [];
  for (const source of task.sources) {
    if ('bytes' in source) {
      waiting.push({ name: source.name, bytes: source.bytes.byteLength, given: source.bytes });
      continue;
    }
    const { files, problems } = findFiles([source.path]);
    waiting.push(...files);
    for (const problem of problems) {
      const fate = tellFate(problem.place.file ?? source.path, 'refused', [], [problem]);
      tell({ kind: 'file fate', taskId: task.taskId, fate });
    }
  }
  return waiting;
}

async function loadFile(
  archive: Archive,
  { taskId, isDemonstration }: LoadTask,
  file: Waiting,
  tellProgress: (share: number) => void,
  isStopped: () => boolean,
  tell: (news: LoadNews) => void,
): Promise<void> {
  const { name } = file;
  try {
    const bytes = 'given' in file ? new Uint8Array(file.given) : readBytes(file, LARGEST_FILE_BYTES);
    const onShareDone = (share: number) => {
      tell({ kind: 'passes changed' });
      tellProgress(share);
    };
    const fate = await storeFile(archive, { name, bytes, isDemonstration }, { onShareDone, isStopped });
    tell({ kind: 'file fate', taskId, fate });
  } catch (thrown) {
    tell({ kind: 'file fate', taskId, fate: tellFate(name, 'refused', [], [toProblem(thrown)]) });
  }
}
