import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { runCommand } from '../../../../src/hosts/command/run-command.ts';
import type { Terminal } from '../../../../src/hosts/command/terminal.ts';
import { standingCautions } from '../../../../src/wind/cautions.ts';
import { buildBufrFile, buildCfFile } from '../../operations/build-files.ts';

let folder: string;
let archive: string[];
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'crosstrack-command-'));
  archive = ['--archive', join(folder, 'archive.db')];
  writeFileSync(join(folder, 'wind.nc'), buildCfFile());
  writeFileSync(join(folder, 'wind.bufr'), buildBufrFile());
  writeFileSync(join(folder, 'notes.txt'), 'no swath');
});
afterEach(() => rmSync(folder, { recursive: true }));

const inFolder = (name: string) => join(folder, name);

/** Runs a command at a terminal that keeps what is written. */
const run = (...words: string[]) => runAt(() => {}, ...words);

/** The same, for a user who sees each piece of output and may interrupt. */
async function runAt(see: (text: string, interrupt: () => void) => void, ...words: string[]) {
  const written = { out: '', told: '' };
  let interrupt = () => {};
  const terminal: Terminal = {
    stdout: {
      write: (text) => {
        written.out += text;
        see(text, interrupt);
      },
    },
    stderr: { write: (text) => (written.told += text) },
    once: (_event, listener) => {
      interrupt = listener;
    },
    removeListener: () => {},
  };
  const code = await runCommand(words, terminal);
  return { code, ...written };
}

test('inspects files as one JSON array and ends with 0 when every file gave cells', async () => {
  const { code, out, told } = await run('inspect', inFolder('wind.nc'), inFolder('wind.bufr'), '--json');
  expect([code, told]).toEqual([0, '']);
  expect(JSON.parse(out)).toMatchObject([
    { file: inFolder('wind.nc'), format: 'netCDF classic (CDF-1)', passes: [{ winds: 5 }], problems: [] },
    { file: inFolder('wind.bufr'), format: 'BUFR edition 4', passes: [{ winds: 7 }], problems: [] },
  ]);
});

test('prints an empty array and ends with 2 when no file was named', async () => {
  expect(await run('inspect', '--json')).toMatchObject({ code: 2, out: '[]\n' });
});

test('still prints the whole array, and ends with 1, when a file gave no cells', async () => {
  const { code, out } = await run('inspect', '--json', inFolder('notes.txt'), inFolder('wind.nc'), inFolder('missing'));
  expect(code).toBe(1);
  const files = JSON.parse(out) as { passes: unknown[]; problems: { code: string }[] }[];
  expect(files.map(({ passes, problems }) => [passes.length, problems.map((problem) => problem.code)])).toEqual([
    [0, ['unknown-format']],
    [1, []],
    [0, ['not-found']],
  ]);
});

test('inspects in plain words with every standing caution', async () => {
  const { code, out } = await run('inspect', inFolder('wind.nc'));
  expect(code).toBe(0);
  // 35 m/s is 68.03 kt: 35 * 3600 / 1852.
  expect(out).toContain('Strongest wind 68 kt (35.00 m/s) at 50°14′N 179°39′W, 2031-01-17T00:00:04Z');
  expect(out).toContain('6 cells looked at, 5 with a wind, 2 of gale force or more');
  for (const caution of standingCautions) expect(out).toContain(caution);
});

test('loads a folder, tells each fate, and says so the second time', async () => {
  const first = await run('load', folder, ...archive);
  expect(first.code, 'the text file is no swath').toBe(1);
  expect(first.out).toContain('wind.nc: loaded as pass 2');
  expect(first.out).toContain('notes.txt: refused\n  This file is in no format known here');
  expect(first.told).toMatch(/\d+ % {2}file \d of \d: wind\.nc/);
  const second = await run('load', inFolder('wind.nc'), ...archive);
  expect([second.code, second.out]).toEqual([0, 'wind.nc: already there as pass 2\n']);
});

test('stops loading in order when the user interrupts, and ends with 1', async () => {
  for (let index = 0; index < 40; index++) {
    // A byte behind the data makes each file another one.
    writeFileSync(inFolder(`${index}.nc`), Buffer.concat([buildCfFile(), Buffer.of(index)]));
  }
  const interruptAtFirst = (text: string, interrupt: () => void) => text.includes('loaded') && interrupt();
  const { code, out, told } = await runAt(interruptAtFirst, 'load', folder, ...archive);
  expect(code).toBe(1);
  expect(told).toContain('Loading was stopped');
  const loaded = out.match(/: loaded/g)?.length ?? 0;
  expect(loaded).toBeLessThan(40);
  expect(JSON.parse((await run('passes', ...archive, '--json')).out)).toHaveLength(loaded);
});

test('lists passes with times, counts and the strongest wind, and removes them by number', async () => {
  await run('load', inFolder('wind.nc'), ...archive);
  const listed = await run('passes', ...archive);
  expect(listed.out).toContain('1  2031-01-17 00:00 to 00:00 UTC');
  expect(listed.out).toContain('5 winds, 2 of gale force or more, strongest 68 kt at 50°14′N 179°39′W  wind.nc');
  const removed = await run('remove', '1', '9', ...archive);
  expect([removed.code, removed.out, removed.told]).toEqual([
    1,
    'Pass 1 was removed.\n',
    'Pass 9 is not in the archive.\n',
  ]);
  expect((await run('passes', ...archive, '--json')).out).toBe('[]\n');
});

test.each([
  ['no command', []],
  ['a command there is none of', ['draw']],
  ['an inherited name', ['toString']],
  ['nothing to inspect', ['inspect']],
  ['an option there is none of', ['inspect', '--loud', 'x']],
  ['an option without its value', ['passes', '--archive']],
  ['nothing to load', ['load']],
  ['names where none are taken', ['passes', 'x']],
  ['a pass that is no number', ['remove', 'x']],
])('ends with 2 and explains itself on %s', async (_what, words) => {
  const { code, out, told } = await run(...words);
  expect([code, out]).toEqual([2, '']);
  expect(told).not.toBe('');
});

test('ends with 1 and says why when the archive cannot be opened', async () => {
  const { code, told } = await run('passes', '--archive', inFolder('notes.txt'));
  expect(code).toBe(1);
  expect(told).toContain('it is not a database');
});

test('explains every command', async () => {
  const { code, out } = await run('help');
  expect(code).toBe(0);
  for (const name of ['inspect', 'load', 'passes', 'remove', '--archive', 'CROSSTRACK_ARCHIVE']) {
    expect(out).toContain(name);
  }
});

test('runs as a program of its own from any folder, with paths of that folder', () => {
  const program = fileURLToPath(new URL('../../../../src/hosts/command/crosstrack.mjs', import.meta.url));
  const words = [program, 'inspect', 'wind.nc', '--json'];
  const { status, stdout, stderr } = spawnSync(process.execPath, words, { cwd: folder, encoding: 'utf8' });
  expect([status, stderr]).toEqual([0, '']);
  expect(JSON.parse(stdout)).toMatchObject([{ file: 'wind.nc', passes: [{ winds: 5 }] }]);
});
