import type { OperationInput } from '../../src/contract/operations.ts';
import type { PassSummary, WatchArea } from '../../src/contract/values.ts';
import type { Backend } from '../backend/backend.ts';
import { isCalledOff, reasonOf } from './reasons.ts';
import { nowOf, type Seen, type SeenStore, windowOf } from './seen.ts';

/** A pan asks many times a second; the watch is asked for when it rests this long. */
const REST_MS = 220;

type Question = OperationInput<'readWatch'>;

/** Keeps `seen.watch` true to the water, window, clock, switches and passes shown. Returns its stop. */
export function keepWatchFresh(seen: SeenStore, backend: Backend): () => void {
  let asked: { text: string; passes: PassSummary[]; areas: WatchArea[] } | null = null;
  let timer: ReturnType<typeof setTimeout> | undefined;
  let reading = new AbortController();

  function refresh(): void {
    const { passes, areas } = seen.get();
    const question = watchQuestion(seen.get());
    if (!question) return;
    const text = JSON.stringify(question);
    if (asked?.text === text && asked.passes === passes && asked.areas === areas) return;
    asked = { text, passes, areas };
    reading.abort();
    reading = new AbortController();
    const { signal } = reading;
    seen.change({ watchReading: { state: 'reading' } });
    clearTimeout(timer);
    timer = setTimeout(() => void read(question, signal), REST_MS);
  }

  async function read(question: Question, signal: AbortSignal): Promise<void> {
    try {
      const watch = await backend.ask('readWatch', question, { signal });
      if (!signal.aborted) seen.change({ watch, watchReading: { state: 'read', value: null } });
    } catch (thrown) {
      if (isCalledOff(thrown, signal)) return;
      asked = null;
      seen.change({ watchReading: { state: 'failed', reason: reasonOf(thrown) } });
    }
  }

  const stopListening = seen.listen(['settings', 'systemMs', 'passes', 'areas', 'box'], refresh);
  return () => {
    stopListening();
    clearTimeout(timer);
    reading.abort();
  };
}

/** What the watch line is asked: of the chosen area, or of the view where none is chosen; null before the chart stands. */
export function watchQuestion(seen: Pick<Seen, 'settings' | 'systemMs' | 'areas' | 'box'>): Question | null {
  const { settings, areas, box } = seen;
  const area = areas.find((candidate) => candidate.areaId === settings.watchAreaId);
  if (!area && !box) return null;
  return {
    water: area ? { kind: 'area', areaId: area.areaId } : { kind: 'view', box: box as NonNullable<typeof box> },
    window: windowOf(seen),
    nowMs: nowOf(seen),
    speedUnit: settings.speedUnit,
    switches: settings.switches,
    hiddenPassIds: settings.hiddenPassIds,
  };
}
