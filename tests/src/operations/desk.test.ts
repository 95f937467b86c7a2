import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterEach, beforeEach, expect, test } from 'vitest';
import type { NewsLine } from '../../../src/contract/news.ts';
import { type Desk, openDesk } from '../../../src/operations/desk.ts';
import { openArchive } from '../../../src/store/archive.ts';
import { keepSetting } from '../../../src/store/settings.ts';
import { buildBufrFile, buildCfFile } from './build-files.ts';

let folder: string;
let desk: Desk;

function openTestDesk(): Desk {
  return openDesk({
    archivePath: join(folder, 'archive.db'),
    demoFolder: join(folder, 'demo'),
    coastlineFolder: fileURLToPath(new URL('../../../assets/coastline', import.meta.url)),
    workerUrl: new URL('../../../src/workers/load-worker.ts', import.meta.url),
    appVersion: '0',
  });
}

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'crosstrack-desk-'));
  mkdirSync(join(folder, 'demo'));
  desk = openTestDesk();
});
afterEach(async () => {
  await desk.close();
  rmSync(folder, { recursive: true });
});

/** Runs something that begins a task and waits for its end. */
function untilEnded(begin: () => Promise<unknown>): Promise<NewsLine[]> {
  return new Promise((resolve, reject) => {
    const heard: NewsLine[] = [];
    const stop = desk.hearNews((line) => {
      heard.push(line);
      if (line.kind !== 'load ended') return;
      stop();
      resolve(heard);
    });
    begin().catch(reject);
  });
}

function layDemonstration(): void {
  writeFileSync(join(folder, 'demo', 'pass.nc'), buildCfFile());
  writeFileSync(join(folder, 'demo', 'README.md'), 'no swath');
  const view = { lon: 179, lat: 50, zoom: 3.5 };
  writeFileSync(
    join(folder, 'demo', 'watch.json'),
    JSON.stringify({ title: 'Invented', nowMs: 1_926_000_000_000, view }),
  );
}

test('has the demonstration in the archive, with its own clock and view, until it is cleared', async () => {
  layDemonstration();
  expect(await desk.perform('readStatus', {})).toMatchObject({ hasDemonstration: true, demonstration: null });
  await untilEnded(() => desk.perform('loadDemonstration', {}));
  expect(await desk.perform('readStatus', {})).toMatchObject({
    passCount: 1,
    demonstration: { title: 'Invented', nowMs: 1_926_000_000_000, lon: 179, lat: 50, zoom: 3.5 },
  });
  await untilEnded(() => desk.give('own.bufr', buildBufrFile().buffer));
  await desk.perform('clearDemonstration', {});
  expect(await desk.perform('readStatus', {})).toMatchObject({ passCount: 1, demonstration: null });
  const { passes } = await desk.perform('listPasses', {});
  expect(passes.map((pass) => [pass.file, pass.isDemonstration])).toEqual([['own.bufr', false]]);
});

test('has everything as it was after it was closed and opened again', async () => {
  await untilEnded(() => desk.give('own.bufr', buildBufrFile().buffer));
  const ask = async () => [
    await desk.perform('listPasses', {}),
    await desk.perform('readCell', { passId: 1, row: 1, column: 2 }),
    new Uint8Array(desk.readBlocks([1])),
  ];
  const before = await ask();
  await desk.close();
  desk = openTestDesk();
  expect(await ask()).toEqual(before);
});

test('describes a cell with its solutions, looks, nearest land and cautions', async () => {
  await untilEnded(() => desk.give('own.bufr', buildBufrFile().buffer));
  const card = await desk.perform('readCell', { passId: 1, row: 1, column: 2 });
  expect(card).toMatchObject({ state: 'wind', row: 1, column: 2, speedMs: 10, directionFrom: 200, chosenSolution: 2 });
  expect(card.solutions).toMatchObject([
    { directionFrom: 20, isChosen: false },
    { directionFrom: 200, isChosen: true },
  ]);
  expect(card.beams.map((beam) => [beam.incidenceDeg, beam.azimuthDeg])).toEqual([
    [45, null],
    [35, null],
    [45, null],
  ]);
  // At 40 N an island's east coast stands near 9.7 E, 0.55 degrees of 85 km to the west (atlas; value from memory).
  expect(card.nearestLand?.distanceKm).toBeGreaterThan(35);
  expect(card.nearestLand?.distanceKm).toBeLessThan(60);
  expect(card.cautions.join(' ')).toContain('Another solution points nearly the other way');
});

test('keeps looked-at water without a wind apart from water never looked at', async () => {
  await untilEnded(() => desk.give('own.bufr', buildBufrFile().buffer));
  expect(await desk.perform('readCell', { passId: 1, row: 2, column: 2 })).toMatchObject({
    state: 'looked but no wind',
    speedMs: null,
    directionFrom: null,
  });
});

test('takes settings it cannot understand for none', async () => {
  const archive = openArchive(join(folder, 'archive.db'));
  keepSetting(archive, 'screen', { light: 'green' });
  archive.close();
  expect(await desk.perform('readSettings', {})).toEqual({ settings: null });
});

test('tells every listener until it stops listening', () => {
  const heard: string[] = [];
  const stops = ['a', 'b'].map((name) => desk.hearNews(() => heard.push(name)));
  desk.say({ kind: 'areas changed' });
  stops[0]();
  desk.say({ kind: 'areas changed' });
  expect(heard).toEqual(['a', 'b', 'b']);
});
