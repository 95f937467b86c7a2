import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterEach, expect, test } from 'vitest';
import { checkLayers, readLayerTable } from '../../.config/check-layers.ts';

const table = readLayerTable();
const planted: string[] = [];

function findingsOf(files: Record<string, string>): string[] {
  const root = mkdtempSync(join(tmpdir(), 'crosstrack-rules-'));
  planted.push(root);
  for (const [file, text] of Object.entries(files)) {
    mkdirSync(dirname(join(root, file)), { recursive: true });
    writeFileSync(join(root, file), text);
  }
  return checkLayers(root, table).findings;
}

afterEach(() => {
  for (const root of planted.splice(0)) rmSync(root, { recursive: true });
});

test('this project keeps its own rules, and the checker read it', () => {
  const report = checkLayers(fileURLToPath(new URL('../..', import.meta.url)), table);
  expect(report.findings).toEqual([]);
  expect(report.filesRead).toBeGreaterThan(35);
  expect(report.importsRead).toBeGreaterThan(report.filesRead);
});

test.each([
  ['a value', "import { openStore } from '../store/open-store.ts';"],
  ['a type alone', "import type { Store } from '../store/open-store.ts';"],
  ['a type named in place', "export type Kept = import('../store/open-store.ts').Store;"],
  ['a re-export', "export { openStore } from '../store/open-store.ts';"],
  ['everything at once', "export * from '../store/open-store.ts';"],
  ['a later import', "export const later = () => import('../store/open-store.ts');"],
  ['an address beside the file', "export const address = new URL('../store/open-store.ts', import.meta.url);"],
])('sees a layer reach where the table forbids, by %s', (_how, line) => {
  const findings = findingsOf({
    'src/geometry/sphere.ts': `export const radiusKm = 6371;\n${line}\n`,
    'src/store/open-store.ts': 'export interface Store {}\nexport const openStore = (): Store => ({});\n',
  });
  expect(findings).toEqual(['src/geometry/sphere.ts:2 geometry may not import store (src/store/open-store.ts)']);
});

test('lets a layer import what the table lists, itself and what everyone may', () => {
  const findings = findingsOf({
    'src/swath/swath.ts':
      "import { a } from '../geometry/sphere.ts';\nimport { b } from '../wind/units.ts';\nimport { c } from './cells.ts';\nexport const all = [a, b, c];\n",
    'src/swath/cells.ts': 'export const c = 1;\n',
    'src/geometry/sphere.ts': 'export const a = 1;\n',
    'src/wind/units.ts': 'export const b = 1;\n',
  });
  expect(findings).toEqual([]);
});

test('is not taken in by an import in a comment, a string or a template', () => {
  const findings = findingsOf({
    'src/wind/units.ts':
      "// import '../store/open-store.ts'\n/* import 'zod' */\nexport const told = \"import x from 'zod'\";\nexport const drawn = `import('zod')`;\n",
  });
  expect(findings).toEqual([]);
});

test('sees an import after a regular expression that holds a quote', () => {
  const findings = findingsOf({ 'src/wind/units.ts': "export const quote = /['\"`]/;\nexport * from 'zod';\n" });
  expect(findings).toEqual(['src/wind/units.ts:2 wind may not import the package zod']);
});

test('sees a package the table does not list, and a scoped one by its whole name', () => {
  const findings = findingsOf({
    'src/decode/read-swaths.ts': "import 'left-pad';\nimport '@turf/turf/area';\n",
    'src/geometry/sphere.ts': "import '@turf/turf/area';\n",
  });
  expect(findings).toEqual([
    'src/decode/read-swaths.ts:1 decode may not import the package left-pad',
    'src/decode/read-swaths.ts:2 decode may not import the package @turf/turf',
  ]);
});

test('keeps Node out of the pure layers and of the renderer', () => {
  const findings = findingsOf({
    'src/analyse/coverage/find-gaps.ts': "import { readFileSync } from 'node:fs';\nexport const read = readFileSync;\n",
    'renderer/state/selection.ts': "import { join } from 'path';\nexport const put = join;\n",
  });
  expect(findings).toEqual([
    'renderer/state/selection.ts:1 renderer/state runs browser and may not use path',
    'src/analyse/coverage/find-gaps.ts:1 analyse runs anywhere and may not use node:fs',
  ]);
});

test('lets only the electron host load electron', () => {
  const findings = findingsOf({
    'src/hosts/electron/boot.ts': "import { app } from 'electron';\nexport const name = app.name;\n",
    'src/hosts/loopback/serve.ts': "import type { App } from 'electron';\nexport type Kept = App;\n",
  });
  expect(findings).toEqual(['src/hosts/loopback/serve.ts:1 hosts/loopback may not import the package electron']);
});

test('sees a ring of files, however long, once', () => {
  const findings = findingsOf({
    'src/wind/a.ts': "import type { B } from './b.ts';\nexport type A = B;\n",
    'src/wind/b.ts': "import type { C } from './c.ts';\nexport type B = C;\n",
    'src/wind/c.ts': "import type { A } from './a.ts';\nexport type C = A | 1;\n",
  });
  expect(findings).toEqual([
    'src/wind/a.ts -> src/wind/b.ts -> src/wind/c.ts -> src/wind/a.ts import one another in a ring',
  ]);
});

test('keeps sister features apart and lets both use what they share', () => {
  const findings = findingsOf({
    'src/analyse/coverage/find-gaps.ts':
      "import { mark } from '../shared/mark.ts';\nimport { rank } from '../route/rank.ts';\nexport const both = [mark, rank];\n",
    'src/analyse/route/rank.ts': 'export const rank = 1;\n',
    'src/analyse/shared/mark.ts': 'export const mark = 1;\n',
  });
  expect(findings).toEqual(['src/analyse/coverage/find-gaps.ts:2 imports its sister src/analyse/route/rank.ts']);
});

test('sees an import that cannot be read before it runs', () => {
  const findings = findingsOf({ 'src/store/load.ts': 'export const load = (name: string) => import(name);\n' });
  expect(findings).toEqual(['src/store/load.ts:1 imports something computed, which no rule can read']);
});

test('sees an import of a file that is not there', () => {
  const findings = findingsOf({ 'src/wind/units.ts': "export * from './gone.ts';\n" });
  expect(findings).toEqual(['src/wind/units.ts:1 imports src/wind/gone.ts, which is not there']);
});

test('sees names that say nothing, names in the wrong case, stray folders and layers nobody listed', () => {
  const findings = findingsOf({
    'src/wind/utils.ts': '',
    'src/wind/knotScale.ts': '',
    'src/physics/drag.ts': '',
    'scripts/run.ts': '',
    'renderer/index.html': '',
  });
  expect(findings.sort()).toEqual([
    'scripts/run.ts the top of the tree has no place for scripts',
    'src/physics/drag.ts is in no layer of the table',
    'src/wind/knotScale.ts knotScale.ts is not kebab-case',
    'src/wind/utils.ts the name utils says nothing of what it gives',
  ]);
});
