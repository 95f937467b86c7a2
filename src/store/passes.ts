import type { PassSummary } from '../contract/values.ts';
import { Problem } from '../problems/problem.ts';
import type { Archive } from './archive.ts';

const summaryColumns = `
  passes.passId, files.name AS file, files.hash AS fileHash, partOfFile, startMs, endMs, band, viewing, platformCode,
  sourceAsRead, rows, columns, cellSizeM, cells, winds, galeWinds, maxSpeedMs, maxLon, maxLat, maxTimeMs, maxRow,
  maxColumn, flagReading, isDirectionStated, checksRain, notes, isDemonstration, loadedAtMs
  FROM passes JOIN files USING (fileId)`;

/** All passes, newest first. */
export function listPasses(archive: Archive): PassSummary[] {
  const rows = archive.database.prepare(`SELECT ${summaryColumns} ORDER BY endMs DESC, passId DESC`).all();
  return rows.map(toSummary);
}

/** One pass. Throws 'not-stored' when there is none of this id. */
export function readPass(archive: Archive, passId: number): PassSummary {
  const row = archive.database.prepare(`SELECT ${summaryColumns} WHERE passes.passId = ?`).get(passId);
  if (row === undefined) throw new Problem('not-stored', `Pass ${passId} is not in the archive.`);
  return toSummary(row);
}

/** The ids of the passes of a file with this content, when all of them are here; else null. */
export function findWholeFile(archive: Archive, hash: string): number[] | null {
  const passIds = archive.database
    .prepare('SELECT passId FROM passes JOIN files USING (fileId) WHERE hash = ? ORDER BY partOfFile')
    .pluck()
    .all(hash) as number[];
  const parts = archive.database.prepare('SELECT parts FROM files WHERE hash = ?').pluck().get(hash);
  return passIds.length > 0 && passIds.length === parts ? passIds : null;
}

/** How many passes there are, and how many of them belong to the demonstration. */
export function countPasses(archive: Archive): { passes: number; demonstration: number } {
  return archive.database
    .prepare(
      `SELECT count(*) AS passes, coalesce(sum(isDemonstration), 0) AS demonstration
       FROM passes JOIN files USING (fileId)`,
    )
    .get() as { passes: number; demonstration: number };
}

/** Removes a pass and everything stored of it. Throws 'not-stored' when there is none of this id. */
export function removePass(archive: Archive, passId: number): void {
  const remove = archive.database.transaction(() => {
    const { changes } = archive.database.prepare('DELETE FROM passes WHERE passId = ?').run(passId);
    if (changes === 0) throw new Problem('not-stored', `Pass ${passId} is not in the archive.`);
    archive.database.prepare('DELETE FROM files WHERE fileId NOT IN (SELECT fileId FROM passes)').run();
  });
  remove.immediate();
}

/** Removes every pass of the demonstration and nothing else; gives how many there were. */
export function removeDemonstration(archive: Archive): number {
  const remove = archive.database.transaction(() => {
    const { demonstration } = countPasses(archive);
    archive.database.prepare('DELETE FROM files WHERE isDemonstration = 1').run();
    return demonstration;
  });
  return remove.immediate();
}

function toSummary(row: unknown): PassSummary {
  const stored = row as Omit<PassSummary, 'isDirectionStated' | 'checksRain' | 'isDemonstration' | 'notes'> & {
    isDirectionStated: number;
    checksRain: number;
    isDemonstration: number;
    notes: string;
  };
  return {
    ...stored,
    isDirectionStated: stored.isDirectionStated === 1,
    checksRain: stored.checksRain === 1,
    isDemonstration: stored.isDemonstration === 1,
    notes: JSON.parse(stored.notes),
  };
}
