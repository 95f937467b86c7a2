import { expect, test } from 'vitest';
import { formatShare, type WatchFacts, writeWatchLine } from '../../../src/brief/watch-line.ts';

const now = Date.UTC(2031, 0, 18, 4, 0);

function facts(change: Partial<WatchFacts> = {}): WatchFacts {
  return {
    winds: 900,
    galeWinds: 100,
    hiddenGaleWinds: 0,
    strongest: {
      passId: 1,
      row: 3,
      column: 9,
      lon: 78.6,
      lat: -52.5,
      timeMs: now - 161 * 60_000,
      speedMs: 24.9,
      directionFrom: 268,
      isHidden: false,
    },
    oldestMs: now - 200 * 60_000,
    newestMs: now - 61 * 60_000,
    areaName: null,
    seaKm2: 1e6,
    unseenShare: 0.31,
    noWindShare: 0,
    hiddenPasses: 0,
    window: { fromMs: now - 12 * 3_600_000, toMs: now },
    nowMs: now,
    speedUnit: 'knots',
    ...change,
  };
}

const read = (change?: Partial<WatchFacts>) =>
  writeWatchLine(facts(change))
    .map((run) => run.text)
    .join('');

test('says the danger, how strong, whence, where, when, how long ago, what nobody looked at and what is hidden', () => {
  expect(read()).toBe(
    'In this view storm was seen: strongest 48 kt from the west at 52°30′S 078°36′E, at 01:19 UTC, 2 h 41 min ago. ' +
      'Seen between 3 h 20 min ago and 1 h 1 min ago. 31 % of its sea nobody looked at in the last 12 hours. ' +
      'No wind of gale or more is hidden.',
  );
});

test('names the watch area, and the unit the user chose', () => {
  expect(read({ areaName: 'North bank', speedUnit: 'metresPerSecond' })).toContain(
    'In ‘North bank’ storm was seen: strongest 24.9 m/s from',
  );
});

test('says that no gale was seen, never that there is none', () => {
  const line = read({
    strongest: { ...(facts().strongest as NonNullable<WatchFacts['strongest']>), speedMs: 12 },
    galeWinds: 0,
  });
  expect(line).toContain('No gale was seen in this view: strongest 23 kt');
});

test('says of water nobody looked at that its wind is not known, and does not call it calm', () => {
  const line = read({ strongest: null, winds: 0, oldestMs: null, newestMs: null, unseenShare: 1 });
  expect(line).toBe(
    'Nobody looked at this view in the last 12 hours: its wind is not known. No wind of gale or more is hidden.',
  );
});

test('keeps looked-but-no-wind apart', () => {
  expect(read({ noWindShare: 0.04 })).toContain(
    '31 % of its sea nobody looked at in the last 12 hours, and 4 % gave no wind.',
  );
});

test('names the strongest wind even when the switches hide it, and counts the hidden gales as danger', () => {
  const strongest = { ...(facts().strongest as NonNullable<WatchFacts['strongest']>), isHidden: true };
  const runs = writeWatchLine(facts({ strongest, hiddenGaleWinds: 7 }));
  expect(runs.some((run) => run.text === 'It is hidden by your switches. ' && run.weight === 'danger')).toBe(true);
  expect(runs.find((run) => run.goesTo?.kind === 'hidden winds')?.text).toBe('7 winds of gale or more are hidden');
});

test('warns above 25 m/s that radar tends to read low', () => {
  const strongest = { ...(facts().strongest as NonNullable<WatchFacts['strongest']>), speedMs: 25.1 };
  expect(read({ strongest })).toContain('Above 25 m/s radar tends to read low.');
  expect(read()).not.toContain('tends to read low');
});

test('gives the dates of a window that does not end now', () => {
  expect(read({ nowMs: now + 30 * 3_600_000 })).toContain('from 2031-01-17 16:00 to 2031-01-18 04:00 UTC');
});

test('never rounds a share to nothing or to all', () => {
  expect([0, 0.001, 0.31, 0.999, 1].map(formatShare)).toEqual([
    '0 %',
    'less than 1 %',
    '31 %',
    'more than 99 %',
    '100 %',
  ]);
});
