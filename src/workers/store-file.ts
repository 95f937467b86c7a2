import { setImmediate as nextTurn } from 'node:timers/promises';
import type { FileFate } from '../contract/values.ts';
import { readFileSwaths } from '../decode/read-file.ts';
import { hashBytes } from '../files/hash-bytes.ts';
import { describePlace, Problem, toProblem } from '../problems/problem.ts';
import type { Archive } from '../store/archive.ts';
import { keepPass } from '../store/keep-pass.ts';
import { findWholeFile } from '../store/passes.ts';
import type { Swath } from '../swath/swath.ts';

/** What the caller of storeFile hears and says while it runs. */
export interface StoringHooks {
  /** Called after each pass with the share of the file that is done, 0 to 1. */
  onShareDone: (share: number) => void;
  /** Asked before each pass; true ends the file there. */
  isStopped: () => boolean;
}

/** Decodes a file and stores its passes one by one, each whole or not at all. Never throws: the fate tells everything. */
export async function storeFile(
  archive: Archive,
  file: { name: string; bytes: Uint8Array; isDemonstration: boolean },
  hooks: StoringHooks,
): Promise<FileFate> {
  const passIds: number[] = [];
  const problems: Problem[] = [];
  let anyNew = false;
  try {
    const hash = hashBytes(file.bytes);
    const known = findWholeFile(archive, hash);
    if (known) return tellFate(file.name, 'already there', known, []);
    const read = readFileSwaths(file.bytes, file.name);
    problems.push(...read.problems);
    const source = {
      hash,
      name: file.name,
      bytes: file.bytes.byteLength,
      parts: read.swaths.length,
      isDemonstration: file.isDemonstration,
      loadedAtMs: Date.now(),
    };
    for (const [index, swath] of read.swaths.entries()) {
      // The stop order is a message, and messages are heard between turns only.
      await nextTurn();
      if (hooks.isStopped()) throw new Problem('stopped', 'Loading was stopped before this file was through.');
      const kept = keepPass(archive, source, index + 1, noteProblems(swath, read.problems));
      passIds.push(kept.passId);
      anyNew ||= kept.isNew;
      hooks.onShareDone((index + 1) / read.swaths.length);
    }
    if (read.swaths.length === 0 && problems.length === 0) {
      problems.push(new Problem('no-cells', 'This file holds no cells.'));
    }
  } catch (thrown) {
    problems.push(toProblem(thrown));
  }
  return tellFate(file.name, chooseFate(passIds, problems, anyNew), passIds, problems);
}

/** The same swath with a note for each part of its file that could not be read, so that whoever looks at it later knows. */
function noteProblems(swath: Swath, problems: readonly Problem[]): Swath {
  const notes = problems.slice(0, 5).map((problem) => {
    const place = describePlace({ ...problem.place, file: undefined } as object);
    return `Part of this file could not be read${place && ` (${place})`}: ${problem.message}`;
  });
  if (problems.length > notes.length) notes.push(`So it was with ${problems.length - notes.length} more parts.`);
  return { ...swath, notes: [...swath.notes, ...notes] };
}

function chooseFate(passIds: readonly number[], problems: readonly Problem[], anyNew: boolean): FileFate['fate'] {
  if (passIds.length === 0) return 'refused';
  if (problems.length > 0) return 'partly read';
  return anyNew ? 'loaded' : 'already there';
}

/** The fate of a file as it is told, its problems in the words that cross to the screen. */
export function tellFate(
  file: string,
  fate: FileFate['fate'],
  passIds: number[],
  problems: readonly Problem[],
): FileFate {
  const told = problems.map(({ code, message, place }) => {
    return { code, message, where: describePlace({ ...place, file }) };
  });
  return { file, fate, passIds, problems: told };
}
