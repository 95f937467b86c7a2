import type { Backend } from '../backend/backend.ts';
import { readPasses } from './passes.ts';
import { changeSettings, type SeenStore, type Status } from './seen.ts';

/** Asks the host to load the demonstration watch; the window stands at its time once it is there. */
export async function loadDemonstration(backend: Backend): Promise<void> {
  await backend.ask('loadDemonstration', {});
}

/** Stands at the demonstration's own time and water. */
export function standAtDemonstration(seen: SeenStore, demonstration: NonNullable<Status['demonstration']>): void {
  const { nowMs, lon, lat, zoom } = demonstration;
  changeSettings(seen, { setClockMs: nowMs, camera: { lon, lat, zoom, bearing: 0 } });
}

/** Removes the demonstration's passes; a clock that stood at its time follows the system's again. */
export async function clearDemonstration(seen: SeenStore, backend: Backend): Promise<void> {
  const stoodAt = seen.get().status?.demonstration?.nowMs;
  await backend.ask('clearDemonstration', {});
  if (seen.get().settings.setClockMs === stoodAt) changeSettings(seen, { setClockMs: null });
  await readPasses(seen, backend);
}
