import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { createLand } from '../../../src/geometry/land.ts';
import type { Coastline } from '../../../src/operations/coastline.ts';
import { createWatchReader } from '../../../src/operations/read-watch.ts';
import { type Archive, openArchive } from '../../../src/store/archive.ts';
import { keepPass } from '../../../src/store/keep-pass.ts';
import { keepWatchArea } from '../../../src/store/watch-areas.ts';
import { createSwath, LOOKED_NO_WIND, WIND } from '../../../src/swath/swath.ts';
import { flagBit } from '../../../src/wind/flags.ts';
import { showEverything } from '../../../src/wind/switches.ts';

const hour = 3_600_000;
const now = Date.UTC(2031, 0, 18, 12);
const noLand: Coastline = { coarse: () => createLand([]), fine: () => createLand([]) };

let folder: string;
let archive: Archive;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'crosstrack-watch-'));
  archive = openArchive(join(folder, 'archive.sqlite'));
});
afterEach(() => {
  archive.close();
  rmSync(folder, { recursive: true });
});

/** Rows of cells a quarter of a degree apart from a corner: a digit is a speed in tens of m/s / 2, 'o' no wind, '.' never looked. */
function keepDrawn(name: string, rows: string[], west: number, south: number, timeMs: number): number {
  const swath = createSwath(rows.length, rows[0].length);
  swath.cellSizeM = 27_800;
  rows.forEach((line, row) => {
    [...line].forEach((sign, column) => {
      const cell = row * swath.columns + column;
      if (sign === '.') return;
      swath.state[cell] = sign === 'o' ? LOOKED_NO_WIND : WIND;
      swath.lon[cell] = ((west + column * 0.25 + 540) % 360) - 180;
      swath.lat[cell] = south + row * 0.25;
      swath.timeMs[cell] = timeMs;
      if (sign === 'o') return;
      swath.speedMs[cell] = Number(sign) * 5;
      swath.directionFrom[cell] = 270;
      if (sign === '5') swath.flags[cell] = flagBit.rain;
    });
  });
  const file = { hash: name, name, bytes: 1, parts: 1, isDemonstration: false, loadedAtMs: now };
  return keepPass(archive, file, 1, swath).passId;
}

function ask(change: object = {}) {
  return createWatchReader(
    archive,
    noLand,
  )({
    water: { kind: 'view', box: { west: -1, south: -1, east: 1, north: 1 } },
    window: { fromMs: now - 12 * hour, toMs: now },
    nowMs: now,
    speedUnit: 'knots',
    switches: showEverything(),
    hiddenPassIds: [],
    ...change,
  });
}

const full = ['11111111', '11111111', '11111111', '11141111', '11111111', '11111111', '11111111', '11111111'];

test('sees a view that one pass covers whole, and names its strongest wind', () => {
  const passId = keepDrawn('a', full, -0.875, -0.875, now - hour);
  const watch = ask();
  expect(watch).toMatchObject({ winds: 64, galeWinds: 1, hiddenGaleWinds: 0, noWindShare: 0 });
  expect(watch.unseenShare).toBeLessThan(0.01);
  expect(watch.strongest).toMatchObject({ passId, row: 4, column: 4, speedMs: 20 });
});

test('counts the half nobody looked at, and the strip without a wind apart from it', () => {
  keepDrawn(
    'a',
    full.map(() => '11oo....'),
    -0.875,
    -0.875,
    now - hour,
  );
  const watch = ask();
  expect(watch.unseenShare).toBeCloseTo(0.5, 1);
  expect(watch.noWindShare).toBeCloseTo(0.25, 1);
});

test('forgets what lies outside the time window', () => {
  keepDrawn('old', full, -0.875, -0.875, now - 13 * hour);
  expect(ask()).toMatchObject({ winds: 0, strongest: null, unseenShare: 1, newestMs: null });
});

test('counts gales that a rain switch, a class switch or a hidden pass keeps off the chart', () => {
  const passId = keepDrawn('a', ['1451', '1111'], -0.4, -0.1, now - hour);
  const withoutRain = showEverything();
  withoutRain.doubtShown.rain = false;
  const withoutGale = showEverything();
  withoutGale.beaufortShown[8] = false;
  expect(ask({ switches: withoutRain }).hiddenGaleWinds).toBe(1);
  expect(ask({ switches: withoutGale }).hiddenGaleWinds).toBe(1);
  expect(ask({ hiddenPassIds: [passId] })).toMatchObject({
    hiddenGaleWinds: 2,
    galeWinds: 2,
    strongest: { isHidden: true },
  });
});

test('still counts water as looked at when its pass is hidden: hiding a wind does not unsee it', () => {
  const passId = keepDrawn('a', full, -0.875, -0.875, now - hour);
  expect(ask({ hiddenPassIds: [passId] }).unseenShare).toBeLessThan(0.01);
});

test('speaks of a kept area across the date line, and of a cell that only reaches into it', () => {
  keepDrawn('a', ['1111', '1114'], 179.5, 9.5, now - hour);
  const ring: [number, number][] = [
    [179, 9],
    [-179.85, 9],
    [-179.85, 11],
    [179, 11],
  ];
  const { areaId } = keepWatchArea(archive, { name: 'Line', ring });
  const watch = ask({ water: { kind: 'area', areaId } });
  expect(watch.strongest?.speedMs).toBe(20);
  expect(watch.runs.map((run) => run.text).join('')).toContain('In ‘Line’ gale was seen');
});

test('lists the share each pass saw, newest first', () => {
  const older = keepDrawn('a', full, -0.875, -0.875, now - 3 * hour);
  const newer = keepDrawn(
    'b',
    full.map(() => '1111....'),
    -0.875,
    -0.875,
    now - hour,
  );
  const { passes } = ask();
  expect(passes.map((pass) => pass.passId)).toEqual([newer, older]);
  expect(passes[0].seenShare).toBeCloseTo(0.5, 1);
});

test('refuses an area that is not kept', () => {
  expect(() => ask({ water: { kind: 'area', areaId: 99 } })).toThrow(/Watch area 99/);
});
