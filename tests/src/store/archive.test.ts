import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { openArchive } from '../../../src/store/archive.ts';
import { APPLICATION_ID, migrations } from '../../../src/store/schema.ts';

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'crosstrack-archive-'));
});
afterEach(() => rmSync(folder, { recursive: true }));

const inFolder = (name: string) => join(folder, name);

function readSchema(path: string): unknown[] {
  const archive = openArchive(path);
  const schema = archive.database.prepare('SELECT name, sql FROM sqlite_schema ORDER BY name').all();
  archive.close();
  return schema;
}

/** A database as the program left it when it knew only so many schema versions. */
function makeOldArchive(path: string, version: number): void {
  const database = new Database(path);
  for (const migration of migrations.slice(0, version)) database.exec(migration);
  database.pragma(`application_id = ${APPLICATION_ID}`);
  database.pragma(`user_version = ${version}`);
  database.close();
}

test('makes an archive and its folders where there is none', () => {
  openArchive(inFolder('deep/down/archive.db')).close();
  // The version and the application stand in the header as big-endian words: SQLite file format, section 1.3.
  const header = readFileSync(inFolder('deep/down/archive.db'));
  expect(header.readUInt32BE(60)).toBe(migrations.length);
  expect(header.toString('latin1', 68, 72)).toBe('XTrk');
});

test('writes ahead, keeps references true and waits for other writers', () => {
  const { database, close } = openArchive(inFolder('archive.db'));
  const pragma = (name: string) => database.pragma(name, { simple: true });
  expect([pragma('journal_mode'), pragma('foreign_keys'), pragma('busy_timeout')]).toEqual(['wal', 1, 10_000]);
  close();
});

test.each([...migrations.keys()])('brings an archive of version %i up to the schema of a new one', (version) => {
  makeOldArchive(inFolder('old.db'), version);
  expect(readSchema(inFolder('old.db'))).toEqual(readSchema(inFolder('new.db')));
});

test('refuses an archive of a newer program and leaves it as it is', () => {
  makeOldArchive(inFolder('newer.db'), migrations.length);
  const database = new Database(inFolder('newer.db'));
  database.pragma(`user_version = ${migrations.length + 1}`);
  database.close();
  const before = readFileSync(inFolder('newer.db'));
  expect(() => openArchive(inFolder('newer.db'))).toThrow(
    expect.objectContaining({ code: 'archive-too-new', place: { file: inFolder('newer.db') } }),
  );
  expect(readFileSync(inFolder('newer.db')).equals(before)).toBe(true);
});

test.each([
  ['a text', 'this is no database, but somebody may still want it'],
  ['a cut header', 'SQLite for'],
])('refuses %s and leaves it as it is', (_what, text) => {
  writeFileSync(inFolder('other'), text);
  expect(() => openArchive(inFolder('other'))).toThrow(expect.objectContaining({ code: 'archive-damaged' }));
  expect(readFileSync(inFolder('other'), 'utf8')).toBe(text);
});

test('refuses a database whose pages are damaged', () => {
  openArchive(inFolder('archive.db')).close();
  const bytes = readFileSync(inFolder('archive.db'));
  bytes.fill(0xff, 100, 4096);
  writeFileSync(inFolder('archive.db'), bytes);
  expect(() => openArchive(inFolder('archive.db'))).toThrow(expect.objectContaining({ code: 'archive-damaged' }));
});

test('refuses a database of another program and leaves it as it is', () => {
  const database = new Database(inFolder('other.db'));
  database.exec('CREATE TABLE notes (text TEXT)');
  database.close();
  const before = readFileSync(inFolder('other.db'));
  expect(() => openArchive(inFolder('other.db'))).toThrow(expect.objectContaining({ code: 'archive-damaged' }));
  expect(readFileSync(inFolder('other.db')).equals(before)).toBe(true);
});

test('refuses a folder as an archive', () => {
  expect(() => openArchive(folder)).toThrow(expect.objectContaining({ code: 'not-readable' }));
});

test('says that an archive is in use, not that it is damaged, while another holds it', () => {
  const path = inFolder('archive.db');
  const holder = new Database(path);
  holder.exec('BEGIN EXCLUSIVE');
  expect(() => openArchive(path, 1)).toThrow(
    expect.objectContaining({ code: 'not-readable', message: expect.stringContaining('locked') }),
  );
  holder.close();
});
