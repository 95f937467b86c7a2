import type { Backend } from '../backend/backend.ts';
import { reasonOf } from './reasons.ts';
import type { CellPlace, SeenStore } from './seen.ts';

/**
 * Chooses a cell and reads its card, which also says where the cell truly lies; null lets go of the chosen one. A later
 * choice wins over a slower answer.
 */
export async function chooseCell(seen: SeenStore, backend: Backend, place: CellPlace | null): Promise<void> {
  seen.change({ selected: place, card: { state: place ? 'reading' : 'none' } });
  if (!place) return;
  const { passId, row, column } = place;
  try {
    const card = await backend.ask('readCell', { passId, row, column });
    if (seen.get().selected !== place) return;
    seen.change({ selected: { ...place, lon: card.lon, lat: card.lat }, card: { state: 'read', value: card } });
  } catch (thrown) {
    if (seen.get().selected === place) seen.change({ card: { state: 'failed', reason: reasonOf(thrown) } });
  }
}
