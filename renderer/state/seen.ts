import type { OperationAnswer } from '../../src/contract/operations.ts';
import type { DrawBlock } from '../../src/contract/packed-swath.ts';
import type {
  CellCard,
  GeoBox,
  PassSummary,
  Settings,
  TimeWindow,
  WatchArea,
  WatchReport,
} from '../../src/contract/values.ts';
import { showEverything } from '../../src/wind/switches.ts';
import type { Load } from './loads.ts';
import { createStore, type Store } from './store.ts';

export type Status = OperationAnswer<'readStatus'>;

/** A cell of a pass and where it lies. Row and column are counted from 1. */
export interface CellPlace {
  passId: number;
  row: number;
  column: number;
  lon: number;
  lat: number;
}

/** Something read from the host: on its way, there, or failed with the reason in words. */
export type Reading<Value> =
  | { state: 'none' }
  | { state: 'reading' }
  | { state: 'read'; value: Value }
  | { state: 'failed'; reason: string };

/** All that the user sees now. Panels and chart draw it; only the functions beside this file change it. */
export interface Seen {
  /** What is kept from one sitting to the next. */
  settings: Settings;
  /** The system's clock, moved on now and then. */
  systemMs: number;
  status: Status | null;
  passes: PassSummary[];
  areas: WatchArea[];
  /** The box of the view, or null before the chart stands. */
  box: GeoBox | null;
  /** Every block that touches the view and the window. */
  blocks: DrawBlock[];
  /** Whether the chart has all its winds: blank water means nothing until then. */
  blocksReading: Reading<null>;
  selected: CellPlace | null;
  card: Reading<CellCard>;
  /** The last answered watch. */
  watch: WatchReport | null;
  /** Whether that answer still fits what the window shows. */
  watchReading: Reading<null>;
  loads: Load[];
  /** The pass last gone to or loaded: where it lies outside the window, standing at it is offered. */
  wantedPassId: number | null;
  /** What failed last, as a sentence, until it is dismissed. */
  trouble: string | null;
  /** Whether the host is heard. */
  isLinked: boolean;
}

export type SeenStore = Store<Seen>;

/** What a first sitting begins with: the system's clock, twelve hours back, everything shown. */
export function firstSettings(): Settings {
  return {
    camera: null,
    setClockMs: null,
    windowHours: 12,
    switches: showEverything(),
    hiddenPassIds: [],
    speedUnit: 'knots',
    light: 'day',
    watchAreaId: null,
  };
}

/** A store with nothing read yet. */
export function createSeen(systemMs: number): SeenStore {
  return createStore<Seen>({
    settings: firstSettings(),
    systemMs,
    status: null,
    passes: [],
    areas: [],
    box: null,
    blocks: [],
    blocksReading: { state: 'none' },
    selected: null,
    card: { state: 'none' },
    watch: null,
    watchReading: { state: 'none' },
    loads: [],
    wantedPassId: null,
    trouble: null,
    isLinked: true,
  });
}

/** Changes some of the settings and keeps the rest. */
export function changeSettings(seen: SeenStore, parts: Partial<Settings>): void {
  seen.change({ settings: { ...seen.get().settings, ...parts } });
}

/** The moment that ages and the window are counted from: the set clock, else the system's. */
export function nowOf(seen: Pick<Seen, 'settings' | 'systemMs'>): number {
  return seen.settings.setClockMs ?? seen.systemMs;
}

/** The span of time on the chart: from so many hours back up to now. */
export function windowOf(seen: Pick<Seen, 'settings' | 'systemMs'>): TimeWindow {
  const nowMs = nowOf(seen);
  return { fromMs: nowMs - Math.round(seen.settings.windowHours * 3_600_000), toMs: nowMs };
}
