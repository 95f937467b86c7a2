import { expect, test } from 'vitest';
import { passToStandAt, setClock, setWindowHours, standingAt, stepToPass } from '../../../renderer/state/clock.ts';
import { createSeen, nowOf, windowOf } from '../../../renderer/state/seen.ts';
import type { PassSummary } from '../../../src/contract/values.ts';

const at = (clock: string) => Date.parse(`2031-01-17T${clock}Z`);
const passBetween = (start: string, end: string) => ({ startMs: at(start), endMs: at(end) }) as PassSummary;

function seenAt(clock: string, passes: PassSummary[]) {
  const seen = createSeen(at(clock));
  seen.change({ passes });
  return seen;
}

test('counts ages and the window from the system clock until another is set', () => {
  const seen = seenAt('12:00:00', []);
  expect(nowOf(seen.get())).toBe(at('12:00:00'));
  setClock(seen, at('04:00:00'));
  setWindowHours(seen, 3);
  expect(windowOf(seen.get())).toEqual({ fromMs: at('01:00:00'), toMs: at('04:00:00') });
});

test('offers the newest pass only when none lies in the window', () => {
  const old = passBetween('01:00:00', '01:20:00');
  const older = passBetween('00:00:00', '00:20:00');
  expect(passToStandAt(seenAt('20:00:00', [older, old]).get())).toEqual({ pass: old, isWanted: false });
  expect(passToStandAt(seenAt('02:00:00', [older, old]).get())).toBeNull();
  expect(passToStandAt(seenAt('20:00:00', []).get())).toBeNull();
});

test('offers a pass that was gone to and lies outside the window, though others lie in it', () => {
  const near = { ...passBetween('01:00:00', '01:20:00'), passId: 1 };
  const far = { ...passBetween('00:00:00', '00:20:00'), passId: 2, endMs: at('00:20:00') - 86_400_000 };
  const seen = seenAt('02:00:00', [near, far]);
  seen.change({ wantedPassId: 2 });
  expect(passToStandAt(seen.get())).toEqual({ pass: far, isWanted: true });
  seen.change({ wantedPassId: 1 });
  expect(passToStandAt(seen.get())).toBeNull();
});

test('sees a pass that reaches into the window by its end alone', () => {
  const seen = seenAt('13:10:00', [passBetween('01:00:00', '01:20:00')]);
  expect(passToStandAt(seen.get())).toBeNull();
});

test('stands at the first whole minute that has the whole pass behind it', () => {
  expect(standingAt(passBetween('01:00:00', '01:19:33'))).toBe(at('01:20:00'));
  expect(standingAt(passBetween('01:00:00', '01:20:00'))).toBe(at('01:20:00'));
});

test('steps from pass to pass and finds none past the ends', () => {
  const seen = seenAt('02:00:00', [passBetween('01:00:00', '01:19:33'), passBetween('02:50:00', '03:00:00')]);
  expect(stepToPass(seen.get(), -1)).toBe(at('01:20:00'));
  expect(stepToPass(seen.get(), 1)).toBe(at('03:00:00'));
  setClock(seen, at('03:00:00'));
  expect(stepToPass(seen.get(), 1)).toBeNull();
});

test('holds the window between a quarter of an hour and a year, and lets nonsense be', () => {
  const seen = seenAt('02:00:00', []);
  setWindowHours(seen, 0);
  expect(seen.get().settings.windowHours).toBe(0.25);
  setWindowHours(seen, Number.NaN);
  expect(seen.get().settings.windowHours).toBe(0.25);
  setWindowHours(seen, 1e9);
  expect(seen.get().settings.windowHours).toBe(24 * 366);
});
