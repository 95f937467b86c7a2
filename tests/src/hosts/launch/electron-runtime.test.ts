import { chmodSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { findElectronPackage, findElectronProgram } from '../../../../src/hosts/launch/electron-runtime.ts';
import { fetchElectron } from '../../../../src/hosts/launch/fetch-electron.ts';
import { runElectron } from '../../../../src/hosts/launch/run-electron.ts';

let folder: string;
let packageFolder: string;
let cacheFolder: string;

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'crosstrack-electron-'));
  packageFolder = join(folder, 'electron');
  cacheFolder = join(folder, 'cache');
  mkdirSync(join(packageFolder, 'dist'), { recursive: true });
  writeFileSync(join(packageFolder, 'package.json'), '{"version":"45.3.4"}');
});

afterEach(() => rmSync(folder, { recursive: true, force: true }));

function putProgram(path: string, script = 'exit 0'): string {
  writeFileSync(path, `#!/bin/sh\n${script}\n`);
  chmodSync(path, 0o755);
  return path;
}

test('finds the installed package without loading it', () => {
  const found = findElectronPackage() ?? '';
  expect(JSON.parse(readFileSync(join(found, 'package.json'), 'utf8')).name).toBe('electron');
});

test('takes the runtime for present only when it is whole', () => {
  expect(findElectronProgram(packageFolder, {})).toBeUndefined();
  writeFileSync(join(packageFolder, 'path.txt'), 'electron');
  expect(findElectronProgram(packageFolder, {})).toBeUndefined();
  const program = putProgram(join(packageFolder, 'dist', 'electron'));
  expect(findElectronProgram(packageFolder, {})).toBeUndefined();
  writeFileSync(join(packageFolder, 'dist', 'version'), '45.3.4');
  expect(findElectronProgram(packageFolder, {})).toBe(program);
});

test('takes the runtime that the user names, if it is there', () => {
  const other = join(folder, 'other');
  mkdirSync(other);
  expect(findElectronProgram(packageFolder, { ELECTRON_OVERRIDE_DIST_PATH: other })).toBeUndefined();
  const program = putProgram(join(other, 'electron'));
  expect(findElectronProgram(packageFolder, { ELECTRON_OVERRIDE_DIST_PATH: other })).toBe(program);
});

/** Tries to fetch by a script of ours in place of the package's own. */
function tryFetch(script: string, wanted: { isAsked?: boolean; patienceMs?: number; variables?: object } = {}) {
  writeFileSync(join(packageFolder, 'install.js'), script);
  const said: string[] = [];
  const { isAsked = false, patienceMs = 5_000, variables = {} } = wanted;
  const outcome = fetchElectron({
    packageFolder,
    cacheFolder,
    isAsked,
    patienceMs,
    signal: new AbortController().signal,
    say: (line) => said.push(line),
    variables: { PATH: process.env.PATH, ...variables },
  });
  return outcome.then((failure) => ({ failure, said }));
}

test.each(['CI', 'CROSSTRACK_NO_FETCH'])('fetches nothing where %s is set', async (name) => {
  const { failure, said } = await tryFetch('', { variables: { [name]: '1' } });
  expect([failure, said]).toEqual(['nothing is fetched in tests', []]);
});

test('fetches nothing in a test run', async () => {
  expect((await tryFetch('', { variables: { NODE_ENV: 'test' } })).failure).toBe('nothing is fetched in tests');
});

test('is content when the script ends well', async () => {
  const { failure, said } = await tryFetch('');
  expect([failure, said]).toEqual([undefined, ['Fetching the Electron runtime, once …']]);
});

test('tells why the script failed and does not try the same version again unasked', async () => {
  const failing = "console.error('TypeError: fetch failed'); process.exit(1)";
  expect((await tryFetch(failing)).failure).toBe('TypeError: fetch failed');
  expect(await tryFetch('')).toEqual({ failure: 'an earlier try to fetch it failed', said: [] });
  expect((await tryFetch('', { isAsked: true })).failure).toBeUndefined();
});

test('tries again on its own when the package has another version', async () => {
  await tryFetch('process.exit(1)');
  writeFileSync(join(packageFolder, 'package.json'), '{"version":"46.0.0"}');
  expect((await tryFetch('')).failure).toBeUndefined();
});

test('gives up a try that makes no progress', async () => {
  const { failure } = await tryFetch('setInterval(() => {}, 1000)', { patienceMs: 1_000 });
  expect(failure).toBe('no progress for 1 s');
});

test('waits for a slow try as long as bytes come', async () => {
  const slow = `
    const { appendFileSync } = require('node:fs');
    const { join } = require('node:path');
    let left = 8;
    setInterval(() => {
      appendFileSync(join(require('node:os').tmpdir(), 'part.zip'), 'bytes');
      if (--left === 0) process.exit(0);
    }, 300);`;
  expect((await tryFetch(slow, { patienceMs: 1_500 })).failure).toBeUndefined();
});

test('runs Electron to its end, and tells when it cannot start', async () => {
  const { signal } = new AbortController();
  const well = putProgram(join(folder, 'well'), '[ "$1" = /project ] && exit 0; exit 9');
  const broken = putProgram(join(folder, 'broken'), 'exit 7');
  expect(await runElectron({ program: well, args: ['/project'], signal })).toBeUndefined();
  expect(await runElectron({ program: broken, args: ['/project'], signal })).toBe('it ended at once (code 7)');
  expect(await runElectron({ program: join(folder, 'gone'), args: [], signal })).toMatch(/ENOENT/);
});

test('ends Electron when it is told to stop', async () => {
  const stop = new AbortController();
  const program = putProgram(join(folder, 'lasting'), 'exec sleep 60');
  const ran = runElectron({ program, args: [], signal: stop.signal });
  setImmediate(() => stop.abort());
  expect(await ran).toBeUndefined();
});
