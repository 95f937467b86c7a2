import type { WatchArea } from '../../src/contract/values.ts';
import type { Backend } from '../backend/backend.ts';
import { changeSettings, type SeenStore } from './seen.ts';

/** Reads the kept watch areas again; a chosen one that is gone gives way to the view. */
export async function readAreas(seen: SeenStore, backend: Backend): Promise<void> {
  const { areas } = await backend.ask('listWatchAreas', {});
  seen.change({ areas });
  const { watchAreaId } = seen.get().settings;
  if (watchAreaId !== null && !areas.some((area) => area.areaId === watchAreaId)) chooseArea(seen, null);
}

/** Keeps a drawn area under a name and chooses it. */
export async function keepArea(
  seen: SeenStore,
  backend: Backend,
  name: string,
  ring: readonly (readonly [number, number])[],
): Promise<void> {
  const area = await backend.ask('keepWatchArea', { name, ring: ring.map(([lon, lat]) => [lon, lat]) });
  await readAreas(seen, backend);
  chooseArea(seen, area.areaId);
}

/** Makes the watch speak of an area, or of the view (null). */
export function chooseArea(seen: SeenStore, areaId: number | null): void {
  changeSettings(seen, { watchAreaId: areaId });
}

/** Removes a kept area. */
export async function removeArea(seen: SeenStore, backend: Backend, areaId: number): Promise<void> {
  await backend.ask('removeWatchArea', { areaId });
  await readAreas(seen, backend);
}

/** The chosen watch area, or null where the watch speaks of the view. */
export function chosenArea(seen: { areas: WatchArea[]; settings: { watchAreaId: number | null } }): WatchArea | null {
  return seen.areas.find((area) => area.areaId === seen.settings.watchAreaId) ?? null;
}
