import { mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, relative } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { findFiles } from '../../../src/files/find-files.ts';
import { readBytes } from '../../../src/files/read-bytes.ts';

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'crosstrack-files-'));
});
afterEach(() => rmSync(folder, { recursive: true }));

function write(name: string, text = name): string {
  const path = join(folder, name);
  mkdirSync(join(path, '..'), { recursive: true });
  writeFileSync(path, text);
  return path;
}

const namesOf = (paths: string[]) => findFiles(paths).files.map(({ path }) => relative(folder, path));

test('takes a folder for all files below it, sorted, without those whose names begin with a dot', () => {
  for (const name of ['b.nc', 'a.bufr', 'sub/c.nc', '.hidden', '.git/config']) write(name);
  expect(namesOf([folder])).toEqual(['a.bufr', 'b.nc', join('sub', 'c.nc')]);
});

test('keeps the order in which paths were given', () => {
  expect(namesOf([write('z'), write('a')])).toEqual(['z', 'a']);
});

test('does not follow a link that leads back up', () => {
  write('a');
  symlinkSync(folder, join(folder, 'up'));
  expect(namesOf([folder])).toEqual(['a']);
});

test('tells what is missing and finds the rest', () => {
  const missing = join(folder, 'missing.nc');
  const found = findFiles([missing, write('there.nc', '12345')]);
  expect(found.files).toMatchObject([{ name: 'there.nc', bytes: 5 }]);
  expect(found.problems).toMatchObject([{ code: 'not-found', place: { file: missing } }]);
});

test('reads a file whole', () => {
  const [file] = findFiles([write('a', 'wind')]).files;
  expect([...readBytes(file, 100)]).toEqual([0x77, 0x69, 0x6e, 0x64]);
});

test('refuses a file larger than asked for, and one that went away meanwhile', () => {
  const [file] = findFiles([write('a', 'wind')]).files;
  expect(() => readBytes(file, 3)).toThrow(expect.objectContaining({ code: 'refused' }));
  rmSync(file.path);
  expect(() => readBytes(file, 100)).toThrow(expect.objectContaining({ code: 'not-found' }));
});

test('tells what is neither a file nor a folder, and a name no file can have', () => {
  const { problems } = findFiles(['/dev/null', join(folder, 'x'.repeat(5000))]);
  expect(problems.map(({ code }) => code)).toEqual(['not-readable', 'not-readable']);
});
