import type { FileFate } from '../../../src/contract/values.ts';
import type { Load } from '../../state/loads.ts';

/** The words of loading. */
export const loadingWords = {
  open: 'Open files',
  loads: 'Files being loaded',
  drop: 'Let go to load these files',
  stop: 'Stop',
  clear: 'Clear this list',
  goTo: 'Go to it',
} as const;

/** What became of a file, in words. */
const fateWords: Record<FileFate['fate'], string> = {
  loaded: 'loaded',
  'already there': 'already there',
  'partly read': 'partly read',
  refused: 'refused',
};

/** How far a load is: 'sending, 40 %', 'reading file 2 of 3'. */
export function describeStage(load: Load): string {
  const percent = `${Math.floor(load.share * 100)} %`;
  switch (load.stage) {
    case 'waiting':
      return 'waiting';
    case 'sending':
      return `sending, ${percent}`;
    case 'reading':
      return load.filesTotal > 1 ? `reading file ${load.filesDone + 1} of ${load.filesTotal}, ${percent}` : 'reading';
    case 'stopped':
      return 'stopped';
    case 'failed':
      return `not loaded: ${load.reason}`;
    case 'ended':
      return load.fates.length === 0 ? 'ended' : '';
  }
}

/** A fate in words: 'storm.bufr: loaded, 2 passes'. */
export function describeFate(fate: FileFate): string {
  const count = fate.passIds.length;
  const passes = fate.fate === 'loaded' && count > 1 ? `, ${count} passes` : '';
  return `${fate.file}: ${fateWords[fate.fate]}${passes}`;
}

/** The reasons of a fate, each with its place where there is one. */
export function listReasons(fate: FileFate): string[] {
  return fate.problems.map(({ message, where }) => (where && where !== fate.file ? `${message} (${where})` : message));
}
