import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterEach, expect, test } from 'vitest';
import { openArchive } from '../../../src/store/archive.ts';
import { listPasses } from '../../../src/store/passes.ts';
import { buildBufrFile, buildCfFile } from '../operations/build-files.ts';
import { type LoaderBench, openLoaderBench } from './at-loader.ts';

let bench: LoaderBench;
afterEach(() => bench.end());

function countStored(): number {
  const archive = openArchive(bench.archivePath);
  const { length } = listPasses(archive);
  archive.close();
  return length;
}

test('loads files and given bytes in its own thread and tells each fate', async () => {
  bench = openLoaderBench();
  const path = join(bench.folder, 'wind.nc');
  writeFileSync(path, buildCfFile());
  const given = buildBufrFile().buffer;
  const fates = await bench.loadAll([{ path }, { name: 'given.bufr', bytes: given }]);
  expect(fates).toEqual([
    { file: 'wind.nc', fate: 'loaded', passIds: [1], problems: [] },
    { file: 'given.bufr', fate: 'loaded', passIds: [2], problems: [] },
  ]);
  expect(given.byteLength, 'the bytes were moved, not copied').toBe(0);
  expect(countStored()).toBe(2);
});

test('says that a file is already there, under whatever name it comes', async () => {
  bench = openLoaderBench();
  await bench.loadAll([{ name: 'first.nc', bytes: buildCfFile().buffer }]);
  const fates = await bench.loadAll([{ name: 'second.nc', bytes: buildCfFile().buffer }]);
  expect(fates).toEqual([{ file: 'second.nc', fate: 'already there', passIds: [1], problems: [] }]);
});

test('refuses what it cannot read, says why and where, and goes on', async () => {
  bench = openLoaderBench();
  const missing = join(bench.folder, 'missing.nc');
  const fates = await bench.loadAll([
    { path: missing },
    { name: 'notes.txt', bytes: new TextEncoder().encode('no swath').buffer },
    { name: 'wind.nc', bytes: buildCfFile().buffer },
  ]);
  expect(fates).toMatchObject([
    { file: missing, fate: 'refused', problems: [{ code: 'not-found', where: missing }] },
    { file: 'notes.txt', fate: 'refused', problems: [{ code: 'unknown-format', where: 'notes.txt, byte 0' }] },
    { file: 'wind.nc', fate: 'loaded' },
  ]);
});

test('keeps what can be read of a damaged file and notes on the pass what could not', async () => {
  bench = openLoaderBench();
  const whole = buildBufrFile();
  const bytes = new Uint8Array(whole.length + 60);
  bytes.set(whole);
  bytes.set(whole.subarray(0, 60), whole.length);
  const [fate] = await bench.loadAll([{ name: 'cut.bufr', bytes: bytes.buffer }]);
  expect(fate).toMatchObject({
    fate: 'partly read',
    passIds: [1],
    problems: [{ where: expect.stringContaining('message 2') }],
  });
  const archive = openArchive(bench.archivePath);
  const [{ notes }] = listPasses(archive);
  archive.close();
  expect(notes.at(-1)).toContain('Part of this file could not be read (message 2');
});

test('tells progress in bytes up to the whole', async () => {
  bench = openLoaderBench();
  const files = [buildCfFile(), buildBufrFile()];
  const total = files[0].length + files[1].length;
  await bench.loadAll(files.map(({ buffer }, index) => ({ name: `${index}`, bytes: buffer })));
  const progress = bench.news.flatMap((line) => (line.kind === 'load progress' ? [line] : []));
  const bytesDone = progress.map((line) => line.bytesDone);
  expect(bytesDone).toEqual(bytesDone.toSorted((one, other) => one - other));
  expect(progress.at(-1)).toMatchObject({ bytesDone: total, bytesTotal: total, filesDone: 1, filesTotal: 2 });
});

test('stops between files; what was stored by then is whole and the rest is not begun', async () => {
  bench = openLoaderBench();
  const sources = Array.from({ length: 50 }, (_, index) => {
    const path = join(bench.folder, `${index}.nc`);
    // A byte behind the data makes each file another one.
    writeFileSync(path, Buffer.concat([buildCfFile(), Buffer.of(index)]));
    return { path };
  });
  const firstFate = bench.next(({ kind }) => kind === 'file fate');
  const ended = bench.next(({ kind }) => kind === 'load ended');
  const taskId = bench.loader.load(sources, false);
  await firstFate;
  bench.loader.stop(taskId);
  expect(await ended).toEqual({ kind: 'load ended', taskId, wasStopped: true });
  const loaded = bench.news.filter((line) => line.kind === 'file fate' && line.fate.fate === 'loaded');
  expect(loaded.length).toBeLessThan(sources.length);
  expect(countStored()).toBe(loaded.length);
});

test('tells the end of every task when its thread dies, and can begin anew', async () => {
  bench = openLoaderBench(new URL('no-such-worker.ts', import.meta.url));
  const fates = await bench.loadAll([{ name: 'wind.nc', bytes: buildCfFile().buffer }]);
  expect(fates).toMatchObject([{ file: 'wind.nc', fate: 'refused', problems: [{ code: 'internal' }] }]);
  expect(bench.news.at(-1)).toMatchObject({ kind: 'load ended', wasStopped: true });
  await bench.loadAll([{ name: 'again.nc', bytes: buildCfFile().buffer }]);
  expect(bench.news.filter(({ kind }) => kind === 'load ended')).toHaveLength(2);
});

test('does its tasks one after the other, in the order they came', async () => {
  bench = openLoaderBench();
  const second = bench.next((line) => line.kind === 'load ended' && line.taskId === 2);
  bench.loader.load([{ name: 'a.nc', bytes: buildCfFile().buffer }], true);
  bench.loader.load([{ name: 'b.bufr', bytes: buildBufrFile().buffer }], false);
  await second;
  const order = bench.news.flatMap((line) =>
    line.kind === 'load ended' || line.kind === 'file fate' ? [line.taskId] : [],
  );
  expect(order).toEqual([1, 1, 2, 2]);
  const archive = openArchive(bench.archivePath);
  expect(listPasses(archive).map((pass) => [pass.file, pass.isDemonstration])).toEqual([
    ['b.bufr', false],
    ['a.nc', true],
  ]);
  archive.close();
});
