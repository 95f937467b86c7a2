import type { DrawBlock } from '../../src/contract/packed-swath.ts';
import type { GeoBox, PassSummary, TimeWindow } from '../../src/contract/values.ts';
import type { Backend } from '../backend/backend.ts';
import { growBox, isBoxInside } from './boxes.ts';
import { isCalledOff, reasonOf } from './reasons.ts';
import { type SeenStore, windowOf } from './seen.ts';

/** How much more than the view is read on each side, so that a short pan reads nothing. */
const PADDING_SHARE = 0.5;
/** The window is asked for in whole steps, so that a clock that moves on does not read everything again. */
const WINDOW_STEP_MS = 30 * 60_000;
/** Blocks out of view are kept until so many cells are held (about 130 MB). */
const MOST_CELLS_HELD = 4_000_000;

interface Asked {
  box: GeoBox;
  window: TimeWindow;
  passes: PassSummary[];
}

/** Keeps the blocks of the view and window in `seen.blocks`. Blocks never change, so each is read once. Returns its stop. */
export function keepBlocksFresh(seen: SeenStore, backend: Backend): () => void {
  const held = new Map<number, DrawBlock>();
  let asked: Asked | null = null;
  let reading = new AbortController();

  async function refresh(): Promise<void> {
    const { box, passes } = seen.get();
    if (!box) return;
    const window = windowOf(seen.get());
    if (asked && asked.passes === passes && isBoxInside(box, asked.box) && isInside(window, asked.window)) return;
    asked = { box: growBox(box, PADDING_SHARE), window: stepOut(window), passes };
    reading.abort();
    reading = new AbortController();
    const { signal } = reading;
    seen.change({ blocksReading: { state: 'reading' } });
    try {
      const found = await backend.ask('findBlocks', { box: asked.box, window: asked.window }, { signal });
      const ids = found.blocks.map((block) => block.blockId);
      const missing = ids.filter((id) => !held.has(id));
      for (const block of await backend.readBlocks(missing, signal)) held.set(block.blockId, block);
      if (signal.aborted) return;
      const blocks = ids.map((id) => held.get(id)).filter((block) => block !== undefined);
      letGo(held, new Set(ids));
      seen.change({ blocks, blocksReading: { state: 'read', value: null } });
    } catch (thrown) {
      if (isCalledOff(thrown, signal)) return;
      asked = null;
      seen.change({ blocksReading: { state: 'failed', reason: reasonOf(thrown) } });
    }
  }

  const stopListening = seen.listen(['settings', 'systemMs', 'passes', 'box'], () => void refresh());
  return () => {
    stopListening();
    reading.abort();
  };
}

function letGo(held: Map<number, DrawBlock>, inUse: ReadonlySet<number>): void {
  let cells = 0;
  for (const block of held.values()) cells += block.cells;
  for (const [id, block] of held) {
    if (cells <= MOST_CELLS_HELD) return;
    if (inUse.has(id)) continue;
    held.delete(id);
    cells -= block.cells;
  }
}

function stepOut(window: TimeWindow): TimeWindow {
  return {
    fromMs: Math.floor(window.fromMs / WINDOW_STEP_MS) * WINDOW_STEP_MS,
    toMs: Math.ceil(window.toMs / WINDOW_STEP_MS) * WINDOW_STEP_MS,
  };
}

function isInside(inner: TimeWindow, outer: TimeWindow): boolean {
  return inner.fromMs >= outer.fromMs && inner.toMs <= outer.toMs;
}
