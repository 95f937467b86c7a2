import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { type NewsLine, newsLine } from '../../src/contract/news.ts';
import { type OperationAnswer, type OperationName, operations } from '../../src/contract/operations.ts';
import { viewBlocks } from '../../src/contract/packed-swath.ts';
import { MOST_BLOCKS_PER_REQUEST, routes } from '../../src/contract/routes.ts';
import { type Settings, toldProblem } from '../../src/contract/values.ts';
import { type Desk, openDesk } from '../../src/operations/desk.ts';
import { showEverything } from '../../src/wind/switches.ts';
import { buildBufrFile, buildCfFile } from '../src/operations/build-files.ts';
import { type Carried, carriers } from './carriers.ts';

const projectFile = (path: string) => fileURLToPath(new URL(`../../${path}`, import.meta.url));
const window = { fromMs: Date.UTC(2031, 0, 16), toMs: Date.UTC(2031, 0, 18) };
const everywhere = { west: -180, south: -90, east: 180, north: 90 };

describe.each(carriers)('through $name', ({ open }) => {
  let folder: string;
  let desk: Desk;
  let carried: Carried;

  beforeEach(async () => {
    folder = mkdtempSync(join(tmpdir(), 'crosstrack-contract-'));
    mkdirSync(join(folder, 'page'));
    writeFileSync(join(folder, 'page', 'index.html'), '<!doctype html>');
    writeFileSync(join(folder, 'secret.txt'), 'not for the page');
    desk = openDesk({
      archivePath: join(folder, 'archive.db'),
      demoFolder: join(folder, 'demo'),
      coastlineFolder: projectFile('assets/coastline'),
      workerUrl: new URL('../../src/workers/load-worker.ts', import.meta.url),
      appVersion: '1.2.3',
    });
    carried = await open(desk, join(folder, 'page'));
  });

  afterEach(async () => {
    await carried.close();
    await desk.close();
    rmSync(folder, { recursive: true });
  });

  const post = (path: string, body: BodyInit) => carried.fetch(path, { method: 'POST', body });

  /** Asks and holds the answer to the contract's own check. */
  async function ask<Name extends OperationName>(name: Name, input: unknown): Promise<OperationAnswer<Name>> {
    const response = await post(routes.ask + name, JSON.stringify(input));
    expect(response.status).toBe(200);
    const { answer } = (await response.json()) as { answer: unknown };
    return operations[name].answer.parse(answer) as OperationAnswer<Name>;
  }

  async function readProblem(response: Response) {
    const { problem } = (await response.json()) as { problem: unknown };
    return { status: response.status, ...toldProblem.parse(problem) };
  }

  /** Loads the two built files and gives all news until both have ended. */
  async function loadBoth(): Promise<NewsLine[]> {
    const stream = await carried.fetch(routes.news);
    const lines = readLines(stream);
    const heard: NewsLine[] = [(await lines.next()).value as NewsLine];
    await post(`${routes.give}?name=wind.nc`, buildCfFile());
    await post(`${routes.give}?name=wind.bufr`, buildBufrFile());
    for await (const line of lines) {
      heard.push(line);
      if (heard.filter(({ kind }) => kind === 'load ended').length === 2) break;
    }
    return heard;
  }

  test('says who answers', async () => {
    expect(await ask('readStatus', {})).toEqual({
      contractVersion: 1,
      appVersion: '1.2.3',
      archivePath: join(folder, 'archive.db'),
      passCount: 0,
      demonstration: null,
      hasDemonstration: false,
    });
  });

  test('shows that the news lives, then tells of loading as it goes', async () => {
    const heard = await loadBoth();
    expect(heard[0]).toEqual({ kind: 'alive' });
    const fates = heard.flatMap((line) => (line.kind === 'file fate' ? [line.fate] : []));
    expect(fates.map(({ file, fate }) => [file, fate])).toEqual([
      ['wind.nc', 'loaded'],
      ['wind.bufr', 'loaded'],
    ]);
    expect(heard.map(({ kind }) => kind)).toContain('passes changed');
  });

  test('lists, finds, draws and describes what was loaded, and removes it', async () => {
    await loadBoth();
    const { passes } = await ask('listPasses', {});
    expect(passes.map((pass) => [pass.file, pass.winds])).toEqual([
      ['wind.bufr', 7],
      ['wind.nc', 5],
    ]);
    const { blocks } = await ask('findBlocks', { box: everywhere, window });
    const response = await carried.fetch(`${routes.blocks}?ids=${blocks.map(({ blockId }) => blockId)}`);
    const drawn = viewBlocks(await response.arrayBuffer());
    expect(drawn.map(({ blockId, passId, cells }) => ({ blockId, passId, cells }))).toEqual(blocks);
    const { passId } = passes[1];
    const card = await ask('readCell', { passId, row: 2, column: 3 });
    expect(card).toMatchObject({ file: 'wind.nc', state: 'wind', speedMs: 35, flagWords: ['above 30 m/s'] });
    expect(await ask('removePass', { passId })).toEqual({});
    expect((await ask('listPasses', {})).passes).toHaveLength(1);
  });

  test('answers the watch', async () => {
    await loadBoth();
    const water = { kind: 'view', box: { west: 179, south: 49, east: -179, north: 51 } };
    const input = {
      water,
      window,
      nowMs: window.toMs,
      switches: showEverything(),
      hiddenPassIds: [],
      speedUnit: 'knots',
    };
    expect(await ask('readWatch', input)).toMatchObject({ winds: 5, galeWinds: 2, strongest: { speedMs: 35 } });
  });

  test('keeps settings and watch areas', async () => {
    const settings: Settings = {
      camera: { lon: 179, lat: 50, zoom: 4, bearing: 0 },
      setClockMs: window.toMs,
      windowHours: 12,
      switches: showEverything(),
      hiddenPassIds: [3],
      speedUnit: 'metresPerSecond',
      light: 'dusk',
      watchAreaId: null,
    };
    expect(await ask('readSettings', {})).toEqual({ settings: null });
    await ask('keepSettings', { settings });
    expect(await ask('readSettings', {})).toEqual({ settings });
    const ring = [
      [179, 50],
      [181, 50],
      [180, 52],
    ];
    const area = await ask('keepWatchArea', { name: 'The strait', ring });
    expect(await ask('listWatchAreas', {})).toEqual({ areas: [area] });
    await ask('removeWatchArea', { areaId: area.areaId });
    expect(await ask('listWatchAreas', {})).toEqual({ areas: [] });
  });

  test('refuses a watch area whose edges cross, and says where', async () => {
    const ring = [
      [178, -2],
      [-178, 2],
      [-178, -2],
      [178, 2],
    ];
    const input = JSON.stringify({ name: 'Bow tie', ring });
    const problem = await readProblem(await post(`${routes.ask}keepWatchArea`, input));
    expect(problem).toMatchObject({ code: 'bad-input', where: 'at 00°00′N 180°00′W' });
  });

  test('leaves a task that has ended alone', async () => {
    expect(await ask('stopTask', { taskId: 99 })).toEqual({});
  });

  test.each([
    [
      'a window that ends before it begins',
      'findBlocks',
      { box: everywhere, window: { fromMs: 2, toMs: 1 } },
      'window',
    ],
    ['a place beyond the pole', 'findBlocks', { box: { ...everywhere, north: 91 }, window }, 'box.north'],
    ['a row counted from 0', 'readCell', { passId: 1, row: 0, column: 1 }, 'row'],
    ['no question at all', 'readCell', null, 'input'],
    ['no path', 'loadPaths', { paths: [] }, 'paths'],
  ])('refuses %s and says where the fault is', async (_what, name, input, where) => {
    const problem = await readProblem(await post(routes.ask + name, JSON.stringify(input)));
    expect(problem).toMatchObject({ status: 400, code: 'bad-input', where });
  });

  test('refuses a question that is no JSON', async () => {
    const problem = await readProblem(await post(`${routes.ask}listPasses`, '{'));
    expect(problem).toMatchObject({ status: 400, code: 'bad-input' });
  });

  test.each(['noSuchThing', '', 'toString', '__proto__', 'listPasses/'])('knows no operation %j', async (name) => {
    const problem = await readProblem(await post(routes.ask + name, '{}'));
    expect(problem).toMatchObject({ status: 404, code: 'not-found' });
  });

  test('says what is not in the archive', async () => {
    const problem = await readProblem(await post(`${routes.ask}removePass`, '{"passId": 7}'));
    expect(problem).toMatchObject({ status: 404, code: 'not-stored' });
  });

  test.each([
    ['GET', `${routes.ask}listPasses`],
    ['POST', routes.blocks],
    ['POST', routes.news],
    ['GET', routes.give],
    ['POST', '/index.html'],
  ])('does not take %s for %s', async (method, path) => {
    const response = await carried.fetch(path, { method });
    expect(await readProblem(response)).toMatchObject({ status: 405, code: 'refused' });
  });

  test.each(['', '1,', 'a', '-1', '1;2', '1e3'])('refuses block ids like %j', async (ids) => {
    const problem = await readProblem(await carried.fetch(`${routes.blocks}?ids=${ids}`));
    expect(problem).toMatchObject({ status: 400, code: 'bad-input', where: 'ids' });
  });

  test('refuses more blocks than may be asked for at once', async () => {
    const ids = (count: number) => Array.from({ length: count }, (_, index) => index + 1).join();
    const most = await carried.fetch(`${routes.blocks}?ids=${ids(MOST_BLOCKS_PER_REQUEST)}`);
    expect([most.status, (await most.arrayBuffer()).byteLength]).toEqual([200, 0]);
    const more = await carried.fetch(`${routes.blocks}?ids=${ids(MOST_BLOCKS_PER_REQUEST + 1)}`);
    expect(await readProblem(more)).toMatchObject({ status: 400, code: 'bad-input' });
  });

  test('refuses a given file without a name', async () => {
    expect(await readProblem(await post(routes.give, 'x'))).toMatchObject({ status: 400, where: 'name' });
  });

  test('serves the page and nothing outside its folder', async () => {
    const page = await carried.fetch('/');
    expect([page.status, page.headers.get('content-type')]).toEqual([200, 'text/html; charset=utf-8']);
    for (const path of ['/../secret.txt', '/%2e%2e/secret.txt', '/..%2fsecret.txt', '/..%5csecret.txt', '/no.html']) {
      expect((await readProblem(await carried.fetch(path))).status, path).toBe(404);
    }
  });

  test('says plainly that there is no demonstration here', async () => {
    const problem = await readProblem(await post(`${routes.ask}loadDemonstration`, '{}'));
    expect(problem).toMatchObject({ status: 404, code: 'not-found' });
  });
});

async function* readLines(response: Response): AsyncGenerator<NewsLine> {
  let rest = '';
  for await (const text of response.body?.pipeThrough(new TextDecoderStream()) ?? []) {
    const lines = (rest + text).split('\n');
    rest = lines.pop() ?? '';
    for (const line of lines) yield newsLine.parse(JSON.parse(line));
  }
}
