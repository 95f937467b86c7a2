import type { PassSummary } from '../../src/contract/values.ts';
import { changeSettings, nowOf, type Seen, type SeenStore, windowOf } from './seen.ts';

const TICK_MS = 15_000;

/** The windows offered by name, hours. */
export const offeredWindowHours = [3, 6, 12, 24, 48, 72] as const;

/** Moves the system's clock on while the page lives. Returns its stop. */
export function runSystemClock(seen: SeenStore, readClockMs: () => number): () => void {
  const timer = setInterval(() => seen.change({ systemMs: readClockMs() }), TICK_MS);
  return () => clearInterval(timer);
}

/** Sets the watch clock to a moment; null follows the system's clock again. */
export function setClock(seen: SeenStore, clockMs: number | null): void {
  changeSettings(seen, { setClockMs: clockMs === null ? null : Math.round(clockMs) });
}

/** Sets how far back the window reaches, hours, held between a quarter of an hour and a year. */
export function setWindowHours(seen: SeenStore, hours: number): void {
  if (Number.isFinite(hours)) changeSettings(seen, { windowHours: Math.min(24 * 366, Math.max(0.25, hours)) });
}

/** The pass that ended last, or null where there is none. */
export function newestPass(passes: readonly PassSummary[]): PassSummary | null {
  return passes.reduce<PassSummary | null>(
    (newest, pass) => (!newest || pass.endMs > newest.endMs ? pass : newest),
    null,
  );
}

/** Whether any of a pass lies in a span of time. */
export function isInWindow(
  pass: Pick<PassSummary, 'startMs' | 'endMs'>,
  window: { fromMs: number; toMs: number },
): boolean {
  return pass.endMs >= window.fromMs && pass.startMs <= window.toMs;
}

/** Where to stand to see a pass whole: the first whole minute at or after its end. */
export function standingAt(pass: Pick<PassSummary, 'endMs'>): number {
  return Math.ceil(pass.endMs / 60_000) * 60_000;
}

/**
 * The pass that standing at is offered: the one last gone to or loaded where it lies outside the window, else the newest
 * where no pass lies in the window, else none.
 */
export function passToStandAt(
  seen: Pick<Seen, 'passes' | 'settings' | 'systemMs' | 'wantedPassId'>,
): { pass: PassSummary; isWanted: boolean } | null {
  const window = windowOf(seen);
  const wanted = seen.passes.find((pass) => pass.passId === seen.wantedPassId);
  if (wanted && !isInWindow(wanted, window)) return { pass: wanted, isWanted: true };
  const newest = newestPass(seen.passes);
  if (!newest || seen.passes.some((pass) => isInWindow(pass, window))) return null;
  return { pass: newest, isWanted: false };
}

/** The moment of the pass before (-1) or after (+1) now, by the ends of passes; null where there is none. */
export function stepToPass(seen: Pick<Seen, 'passes' | 'settings' | 'systemMs'>, step: -1 | 1): number | null {
  const nowMs = nowOf(seen);
  const moments = [...new Set(seen.passes.map(standingAt))].sort((a, b) => a - b);
  const found = step < 0 ? moments.findLast((moment) => moment < nowMs) : moments.find((moment) => moment > nowMs);
  return found ?? null;
}
