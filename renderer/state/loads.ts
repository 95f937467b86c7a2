import type { NewsLine } from '../../src/contract/news.ts';
import type { FileFate } from '../../src/contract/values.ts';

/** One thing being loaded: a file given in this window, or a task that the host began by itself. */
export interface Load {
  /** Our own number, counted up. */
  loadId: number;
  /** The host's task, once it has begun. */
  taskId: number | null;
  /** The file now in hand, as the user gave it. */
  file: string;
  stage: 'waiting' | 'sending' | 'reading' | 'ended' | 'stopped' | 'failed';
  /** 0 to 1 within the stage. */
  share: number;
  filesDone: number;
  filesTotal: number;
  fates: FileFate[];
  /** Why it failed, in words. */
  reason: string | null;
}

/** A load that has not begun. */
export function waitingLoad(loadId: number, file: string): Load {
  return {
    loadId,
    taskId: null,
    file,
    stage: 'waiting',
    share: 0,
    filesDone: 0,
    filesTotal: 1,
    fates: [],
    reason: null,
  };
}

/** Loads with one of them changed. */
export function changeLoad(loads: readonly Load[], loadId: number, parts: Partial<Load>): Load[] {
  return loads.map((load) => (load.loadId === loadId ? { ...load, ...parts } : load));
}

/** Loads after a line of news: lines of a task nobody here began make a load of their own. */
export function hearNews(loads: readonly Load[], line: NewsLine, nextLoadId: number): Load[] {
  if (line.kind !== 'load progress' && line.kind !== 'file fate' && line.kind !== 'load ended') return [...loads];
  const known = loads.find((load) => load.taskId === line.taskId);
  if (!known && line.kind === 'load ended') return [...loads];
  const load = known ?? { ...waitingLoad(nextLoadId, ''), taskId: line.taskId, stage: 'reading' as const };
  const changed = { ...load, ...partsOf(load, line) };
  return known ? loads.map((other) => (other === known ? changed : other)) : [...loads, changed];
}

/**
 * Loads after the host named the task of a file given here. News of the task may have come first and begun a load of its
 * own: that one is taken in.
 */
export function adoptTask(loads: readonly Load[], loadId: number, taskId: number): Load[] {
  const early = loads.find((load) => load.taskId === taskId && load.loadId !== loadId);
  const parts: Partial<Load> = early
    ? { taskId, stage: early.stage, share: early.share, fates: early.fates }
    : { taskId, stage: 'reading', share: 0 };
  return changeLoad(
    loads.filter((load) => load !== early),
    loadId,
    parts,
  );
}

/** Whether a load still runs or waits. */
export function isUnderWay(load: Load): boolean {
  return load.stage === 'waiting' || load.stage === 'sending' || load.stage === 'reading';
}

function partsOf(load: Load, line: NewsLine): Partial<Load> {
  if (line.kind === 'load progress') {
    const share = line.bytesTotal > 0 ? line.bytesDone / line.bytesTotal : 0;
    return { file: line.file, share, filesDone: line.filesDone, filesTotal: line.filesTotal };
  }
  if (line.kind === 'file fate') return { fates: [...load.fates, line.fate], file: load.file || line.fate.file };
  if (line.kind === 'load ended') return { stage: line.wasStopped ? 'stopped' : 'ended', share: 1 };
  return {};
}
