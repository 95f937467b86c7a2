import type { GeoBox, PassSummary } from '../../src/contract/values.ts';
import type { Backend } from '../backend/backend.ts';
import { boxRound, boxWidthDeg, wholeEarth } from './boxes.ts';
import { changeSettings, type SeenStore } from './seen.ts';

/** Reads the list of passes and the archive's state again. What was hidden or chosen of passes now gone is let go. */
export async function readPasses(seen: SeenStore, backend: Backend): Promise<void> {
  const [{ passes }, status] = await Promise.all([backend.ask('listPasses', {}), backend.ask('readStatus', {})]);
  seen.change({ passes, status });
  const ids = new Set(passes.map((pass) => pass.passId));
  const { settings, selected } = seen.get();
  const hiddenPassIds = settings.hiddenPassIds.filter((id) => ids.has(id));
  if (hiddenPassIds.length < settings.hiddenPassIds.length) changeSettings(seen, { hiddenPassIds });
  if (selected && !ids.has(selected.passId)) seen.change({ selected: null, card: { state: 'none' } });
}

/** Hides a pass from the chart, or shows it again. Its winds stay counted. */
export function setPassShown(seen: SeenStore, passId: number, isShown: boolean): void {
  const others = seen.get().settings.hiddenPassIds.filter((id) => id !== passId);
  changeSettings(seen, { hiddenPassIds: isShown ? others : [...others, passId] });
}

/** Removes a pass from the archive for good. */
export async function removePass(seen: SeenStore, backend: Backend, passId: number): Promise<void> {
  await backend.ask('removePass', { passId });
  await readPasses(seen, backend);
}

/** The box round all that a pass looked at, or null where it goes so far round the earth that a box says nothing. */
export async function findPassBox(backend: Backend, pass: PassSummary): Promise<GeoBox | null> {
  const window = { fromMs: pass.startMs, toMs: pass.endMs };
  const { blocks } = await backend.ask('findBlocks', { box: wholeEarth, window });
  const ids = blocks.filter((block) => block.passId === pass.passId).map((block) => block.blockId);
  const positions: [number, number][] = [];
  for (const block of await backend.readBlocks(ids)) {
    for (let cell = 0; cell < block.cells; cell += 7) {
      if (block.state[cell] !== 0) positions.push([block.lonE5[cell] / 1e5, block.latE5[cell] / 1e5]);
    }
  }
  const box = boxRound(positions);
  return box && boxWidthDeg(box) < 150 && box.north - box.south < 100 ? box : null;
}
