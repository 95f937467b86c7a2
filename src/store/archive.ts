import { closeSync, existsSync, mkdirSync, openSync, readSync } from 'node:fs';
import { dirname } from 'node:path';
import Database from 'better-sqlite3';
import { Problem } from '../problems/problem.ts';
import { APPLICATION_ID, migrations } from './schema.ts';

/** An open archive. Only the files of store/ look inside; everyone else hands it to them. */
export interface Archive {
  readonly path: string;
  readonly database: Database.Database;
  /** Ends the connection; the archive is whole on disk afterwards. */
  close(): void;
}

/** The first 16 bytes of every database file (SQLite file format, section 1.3). */
const MAGIC = 'SQLite format 3\0';

/**
 * Opens the archive at a path, making it and its folder when there is none and bringing an older one up to date.
 * An archive of a newer program, a file that is no database and a database of something else are refused and left as they are.
 * `patienceMs` is how long each step waits for another connection's transaction before it gives up.
 */
export function openArchive(path: string, patienceMs = 10_000): Archive {
  refuseOtherFiles(path);
  const database = openDatabase(path);
  try {
    database.pragma(`busy_timeout = ${patienceMs}`);
    refuseOtherDatabases(database, path);
    database.pragma('journal_mode = WAL');
    database.pragma('synchronous = NORMAL');
    database.pragma('foreign_keys = ON');
    migrate(database);
  } catch (thrown) {
    database.close();
    throw asArchiveProblem(thrown, path);
  }
  return { path, database, close: () => database.close() };
}

function refuseOtherFiles(path: string): void {
  if (!existsSync(path)) return;
  let head: string;
  try {
    const file = openSync(path, 'r');
    const bytes = Buffer.alloc(MAGIC.length);
    const length = readSync(file, bytes, 0, bytes.length, 0);
    closeSync(file);
    head = bytes.toString('latin1', 0, length);
  } catch (thrown) {
    throw asArchiveProblem(thrown, path);
  }
  if (head !== '' && head !== MAGIC) {
    throw new Problem('archive-damaged', 'This file is no archive: it is not a database.', { file: path });
  }
}

function openDatabase(path: string): Database.Database {
  try {
    mkdirSync(dirname(path), { recursive: true });
    return new Database(path);
  } catch (thrown) {
    throw asArchiveProblem(thrown, path);
  }
}

/** What the database or the file system said: damage is told apart from a place that cannot be written or is in use. */
function asArchiveProblem(thrown: unknown, path: string): Problem {
  if (thrown instanceof Problem) return thrown;
  const { code = '', message } = thrown as Error & { code?: string };
  if (code.startsWith('SQLITE_CORRUPT') || code === 'SQLITE_NOTADB') {
    return new Problem('archive-damaged', `The archive is damaged: ${message}.`, { file: path });
  }
  return new Problem('not-readable', `The archive cannot be opened: ${message}.`, { file: path });
}

function refuseOtherDatabases(database: Database.Database, path: string): void {
  const version = readVersion(database);
  const isOurs = database.pragma('application_id', { simple: true }) === APPLICATION_ID;
  const tables = database.prepare('SELECT count(*) FROM sqlite_schema').pluck().get() as number;
  if (!isOurs && tables > 0) {
    throw new Problem('archive-damaged', 'This file is a database of another program, no archive.', { file: path });
  }
  if (version > migrations.length) {
    throw new Problem(
      'archive-too-new',
      `This archive has version ${version}; this program knows versions up to ${migrations.length}. It was left as it is.`,
      { file: path },
    );
  }
}

/** Each step is one transaction with its version number, so an interrupted step never happened. */
function migrate(database: Database.Database): void {
  const step = database.transaction(() => {
    // Read again inside: another connection may have made this step while we waited for the lock.
    const version = readVersion(database);
    if (version >= migrations.length) return;
    database.exec(migrations[version]);
    database.pragma(`application_id = ${APPLICATION_ID}`);
    database.pragma(`user_version = ${version + 1}`);
  });
  while (readVersion(database) < migrations.length) step.immediate();
}

function readVersion(database: Database.Database): number {
  return database.pragma('user_version', { simple: true }) as number;
}
