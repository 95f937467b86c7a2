import type { WatchArea } from '../contract/values.ts';
import { Problem } from '../problems/problem.ts';
import type { Archive } from './archive.ts';

/** All watch areas, by name. */
export function listWatchAreas(archive: Archive): WatchArea[] {
  return archive.database.prepare('SELECT * FROM watchAreas ORDER BY name, areaId').all().map(toArea);
}

/** One watch area. Throws 'not-stored' when there is none of this id. */
export function readWatchArea(archive: Archive, areaId: number): WatchArea {
  const row = archive.database.prepare('SELECT * FROM watchAreas WHERE areaId = ?').get(areaId);
  if (row === undefined) throw new Problem('not-stored', `Watch area ${areaId} is not in the archive.`);
  return toArea(row);
}

/** Keeps a new watch area and gives it with its id. */
export function keepWatchArea(archive: Archive, area: Omit<WatchArea, 'areaId'>): WatchArea {
  const areaId = archive.database
    .prepare('INSERT INTO watchAreas (name, ring) VALUES (?, ?) RETURNING areaId')
    .pluck()
    .get(area.name, JSON.stringify(area.ring)) as number;
  return { ...area, areaId };
}

/** Removes a watch area. Throws 'not-stored' when there is none of this id. */
export function removeWatchArea(archive: Archive, areaId: number): void {
  const { changes } = archive.database.prepare('DELETE FROM watchAreas WHERE areaId = ?').run(areaId);
  if (changes === 0) throw new Problem('not-stored', `Watch area ${areaId} is not in the archive.`);
}

function toArea(row: unknown): WatchArea {
  const { areaId, name, ring } = row as { areaId: number; name: string; ring: string };
  return { areaId, name, ring: JSON.parse(ring) };
}
