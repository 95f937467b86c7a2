import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { loadDemonstrationIfUnused, openOwnDesk } from '../../../../src/hosts/shared/open-own-desk.ts';
import type { Desk } from '../../../../src/operations/desk.ts';
import { showEverything } from '../../../../src/wind/switches.ts';
import { buildCfFile } from '../../operations/build-files.ts';

let projectFolder: string;
let desk: Desk;

beforeEach(() => {
  projectFolder = mkdtempSync(join(tmpdir(), 'crosstrack-installation-'));
  const demoFolder = join(projectFolder, 'assets', 'demo');
  mkdirSync(demoFolder, { recursive: true });
  writeFileSync(join(projectFolder, 'package.json'), '{"version":"1.2.3"}');
  const watch = { title: 'A storm', nowMs: 0, view: { lon: 179, lat: 50, zoom: 4 } };
  writeFileSync(join(demoFolder, 'watch.json'), JSON.stringify(watch));
  writeFileSync(join(demoFolder, 'pass.nc'), buildCfFile());
  desk = openOwnDesk({ projectFolder, archivePath: join(projectFolder, 'archive.db') });
});

afterEach(async () => {
  await desk.close();
  rmSync(projectFolder, { recursive: true });
});

/** Does something that begins a task, and waits for the task's end. */
async function untilLoaded(begin: () => Promise<unknown>): Promise<void> {
  const ended = new Promise<void>((resolve) => {
    desk.hearNews((line) => line.kind === 'load ended' && resolve());
  });
  await begin();
  await ended;
}

const countPasses = async () => (await desk.perform('listPasses', {})).passes.length;

test('knows its own version and its demonstration', async () => {
  expect(await desk.perform('readStatus', {})).toMatchObject({ appVersion: '1.2.3', hasDemonstration: true });
});

test('gives an archive that nobody has used the demonstration', async () => {
  await untilLoaded(() => loadDemonstrationIfUnused(desk));
  expect(await desk.perform('readStatus', {})).toMatchObject({ passCount: 1, demonstration: { title: 'A storm' } });
});

test('leaves an archive alone that holds a pass of the user', async () => {
  await untilLoaded(() => desk.give('own.nc', buildCfFile().buffer));
  await loadDemonstrationIfUnused(desk);
  expect(await desk.perform('readStatus', {})).toMatchObject({ passCount: 1, demonstration: null });
});

test('leaves an archive alone that the user has emptied', async () => {
  const settings = {
    camera: null,
    setClockMs: null,
    windowHours: 12,
    switches: showEverything(),
    hiddenPassIds: [],
    speedUnit: 'knots',
    light: 'day',
    watchAreaId: null,
  };
  await desk.perform('keepSettings', { settings });
  await loadDemonstrationIfUnused(desk);
  expect(await countPasses()).toBe(0);
});
