import { mkdirSync, mkdtempSync, rmSync, utimesSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { findStaleness } from '../../../../src/hosts/launch/build-if-stale.ts';

let folder: string;

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'crosstrack-stale-'));
});
afterEach(() => rmSync(folder, { recursive: true }));

/** Puts a file of an age, in seconds since 1970. */
function put(file: string, changedS: number): void {
  const path = join(folder, file);
  mkdirSync(dirname(path), { recursive: true });
  writeFileSync(path, '');
  utimesSync(path, changedS, changedS);
  for (let up = dirname(path); up !== folder; up = dirname(up)) utimesSync(up, 1, 1);
}

function putBuild(changedS: number): void {
  for (const file of ['main/main.js', 'main/load-worker.js', 'renderer/index.html']) put(`dist/${file}`, changedS);
}

test('builds where there is none, or only part of one', () => {
  put('src/wind/units.ts', 100);
  expect(findStaleness(folder)).toBe('there is none yet');
  putBuild(200);
  rmSync(join(folder, 'dist/main/load-worker.js'));
  expect(findStaleness(folder)).toBe('there is none yet');
});

test('leaves a build that is newer than every source', () => {
  put('src/wind/units.ts', 100);
  put('renderer/main.ts', 199);
  putBuild(200);
  expect(findStaleness(folder)).toBeUndefined();
});

test.each([
  'src/wind/units.ts',
  'renderer/panels/cell/cell.css',
  'assets/coastline/land-50m.json',
  'package-lock.json',
])('builds anew after a change to %s', (file) => {
  put('src/problems/problem.ts', 100);
  putBuild(200);
  put(file, 300);
  expect(findStaleness(folder)).toBe('the sources are newer');
});

test('does not mind a change to what it is not made from', () => {
  put('src/problems/problem.ts', 100);
  putBuild(200);
  put('tests/bench/run.ts', 300);
  put('README.md', 300);
  expect(findStaleness(folder)).toBeUndefined();
});
