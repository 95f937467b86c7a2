import { expect, test } from 'vitest';
import { keepPass } from '../../../src/store/keep-pass.ts';
import { countPasses, listPasses, readPass, removeDemonstration, removePass } from '../../../src/store/passes.ts';
import { createBackground, createBeams, createSolutions } from '../../../src/swath/swath.ts';
import { atArchive, fileOf } from './at-archive.ts';
import { drawnTimeMs, drawSwath } from './draw-swath.ts';

const bench = atArchive();

/** How many rows stand in each table that holds anything of passes. */
function countRows(): Record<string, unknown> {
  const tables = ['files', 'passes', 'blocks', 'blockBoxes', 'blockDetails', 'blockSolutions', 'blockBeams'];
  const count = (table: string) => bench.archive.database.prepare(`SELECT count(*) FROM ${table}`).pluck().get();
  return Object.fromEntries([...tables, 'blockBackgrounds'].map((table) => [table, count(table)]));
}

function keepEverything(content: string, west = 10): number {
  const swath = drawSwath(['12'], { west });
  swath.solutions = createSolutions(2, 2);
  swath.beams = createBeams(2, 3);
  swath.background = createBackground(2);
  return keepPass(bench.archive, fileOf(content), 1, swath).passId;
}

test('lists passes newest first', () => {
  for (const [content, hours] of [
    ['middle', 1],
    ['newest', 2],
    ['oldest', 0],
  ] as const) {
    keepPass(bench.archive, fileOf(content), 1, drawSwath(['1'], { timeMs: drawnTimeMs + hours * 3_600_000 }));
  }
  expect(listPasses(bench.archive).map((pass) => pass.fileHash)).toEqual(['newest', 'middle', 'oldest']);
});

test('removes everything of one pass, also across the date line, and nothing of another', () => {
  keepEverything('kept');
  const before = countRows();
  removePass(bench.archive, keepEverything('removed', 179.9));
  expect(countRows()).toEqual(before);
});

test('lets a removed file be loaded again, under a number never used before', () => {
  const passId = keepEverything('again');
  removePass(bench.archive, passId);
  bench.reopen();
  expect(keepEverything('again')).toBeGreaterThan(passId);
});

test('keeps the file of a pass while another pass of it is left', () => {
  const file = fileOf('two', { parts: 2 });
  const first = keepPass(bench.archive, file, 1, drawSwath(['12']));
  const second = keepPass(bench.archive, file, 2, drawSwath(['34']));
  removePass(bench.archive, first.passId);
  expect(readPass(bench.archive, second.passId).file).toBe('two.bufr');
});

test('says so when there is no such pass', () => {
  const notStored = expect.objectContaining({ code: 'not-stored' });
  expect(() => removePass(bench.archive, 7)).toThrow(notStored);
  expect(() => readPass(bench.archive, 7)).toThrow(notStored);
});

test('clears the demonstration and nothing else', () => {
  keepPass(bench.archive, fileOf('invented', { isDemonstration: true }), 1, drawSwath(['1']));
  keepPass(bench.archive, fileOf('seen'), 1, drawSwath(['1']));
  expect(countPasses(bench.archive)).toEqual({ passes: 2, demonstration: 1 });
  expect(removeDemonstration(bench.archive)).toBe(1);
  expect(listPasses(bench.archive).map((pass) => pass.fileHash)).toEqual(['seen']);
  expect(countPasses(bench.archive)).toEqual({ passes: 1, demonstration: 0 });
});
