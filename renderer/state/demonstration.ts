import type { Backend } from '../backend/backend.ts';
import { readPasses } from './passes.ts';
import { changeSettings, type SeenStore, type Status } from './seen.ts';

/** Stands at the demonstration's own time and water. */
export function standAtDemonstration(seen: SeenStore, demonstration: NonNullable<Status['demonstration']>): void {
  const { nowMs, lon, lat, zoom } = demonstration;
  changeSettings(seen, { setClockMs: nowMs, camera: { lon, lat, zoom, bearing: 0 } });
}

/** Stands at the demonstration whenever it comes to be loaded while the window is open, and tells so. Returns its stop. */
export function standAtDemonstrationOnceLoaded(seen: SeenStore, onStand: () => void): () => void {
  let wasLoaded = Boolean(seen.get().status?.demonstration);
  return seen.listen(['status'], ({ status }) => {
    const demonstration = status?.demonstration ?? null;
    if (demonstration && !wasLoaded) {
      standAtDemonstration(seen, demonstration);
      onStand();
    }
    wasLoaded = Boolean(demonstration);
  });
}

/** Removes the demonstration's passes; a clock that stood at its time follows the system's again. */
export async function clearDemonstration(seen: SeenStore, backend: Backend): Promise<void> {
  const stoodAt = seen.get().status?.demonstration?.nowMs;
  await backend.ask('clearDemonstration', {});
  if (seen.get().settings.setClockMs === stoodAt) changeSettings(seen, { setClockMs: null });
  await readPasses(seen, backend);
}
