import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { openArchive } from '../../src/store/archive.ts';
import { keepPass, ROWS_PER_BLOCK } from '../../src/store/keep-pass.ts';
import { createSwath, type Swath, WIND } from '../../src/swath/swath.ts';

/** Two orbits of 12.5-km cells: 3,264 rows of 82, 267,648 cells. */
const ROWS = 3264;
const COLUMNS = 82;
const TRIES = 3;

/**
 * Times of storing the same cells, each time into a fresh file, in one transaction, with an R*Tree to find them by place:
 * position, speed, direction and flags, 16 bytes a cell, in blocks of rows against a row for each cell; and, against the
 * same rival, the archive's own way, which also keeps times, footprints, states and raw flags. The best of three tries.
 */
export async function benchStore(): Promise<{ name: string; oursMs: number; rivalMs: number; atLeast: number }[]> {
  const swath = inventSwath();
  let [blocksMs, passMs, rivalMs] = [Number.POSITIVE_INFINITY, Number.POSITIVE_INFINITY, Number.POSITIVE_INFINITY];
  for (let round = 0; round < TRIES; round++) {
    rivalMs = Math.min(rivalMs, timeInFreshFile(swath, storeCells));
    blocksMs = Math.min(blocksMs, timeInFreshFile(swath, storeBlocks));
    passMs = Math.min(passMs, timeInFreshFile(swath, storePass));
  }
  return [
    { name: 'store 267,648 cells: blocks of rows / a row for each cell', oursMs: blocksMs, rivalMs, atLeast: 10 },
    { name: 'store 267,648 cells: a whole pass in the archive / the same', oursMs: passMs, rivalMs, atLeast: 3 },
  ];
}

function timeInFreshFile(swath: Swath, store: (path: string, swath: Swath) => void): number {
  const folder = mkdtempSync(join(tmpdir(), 'crosstrack-bench-'));
  const startMs = performance.now();
  store(join(folder, 'cells.db'), swath);
  const tookMs = performance.now() - startMs;
  rmSync(folder, { recursive: true });
  return tookMs;
}

function openFresh(path: string, table: string): Database.Database {
  const database = new Database(path);
  database.pragma('journal_mode = WAL');
  database.pragma('synchronous = NORMAL');
  database.exec(table);
  database.exec('CREATE VIRTUAL TABLE boxes USING rtree (id, west, east, south, north)');
  return database;
}

function storeCells(path: string, { lon, lat, speedMs, directionFrom, flags }: Swath): void {
  const database = openFresh(
    path,
    'CREATE TABLE cells (id INTEGER PRIMARY KEY, lon REAL, lat REAL, speedMs REAL, directionFrom REAL, flags INTEGER)',
  );
  const insert = database.prepare('INSERT INTO cells VALUES (?, ?, ?, ?, ?, ?)');
  const insertBox = database.prepare('INSERT INTO boxes VALUES (?, ?, ?, ?, ?)');
  database.transaction(() => {
    for (let cell = 0; cell < lon.length; cell++) {
      insert.run(cell, lon[cell], lat[cell], speedMs[cell], directionFrom[cell], flags[cell]);
      insertBox.run(cell, lon[cell], lon[cell], lat[cell], lat[cell]);
    }
  })();
  database.close();
}

/** Position in 1e-5 degrees, 4 bytes each; speed in 0.01 m/s and direction in 0.1 degrees, 2 each; flags in 4. */
function storeBlocks(path: string, { lon, lat, speedMs, directionFrom, flags }: Swath): void {
  const database = openFresh(
    path,
    'CREATE TABLE blocks (id INTEGER PRIMARY KEY, lon BLOB, lat BLOB, speed BLOB, direction BLOB, flags BLOB)',
  );
  const insert = database.prepare('INSERT INTO blocks VALUES (?, ?, ?, ?, ?, ?)');
  const insertBox = database.prepare('INSERT INTO boxes VALUES (?, ?, ?, ?, ?)');
  const blockCells = ROWS_PER_BLOCK * COLUMNS;
  database.transaction(() => {
    for (let from = 0; from < lon.length; from += blockCells) {
      const to = from + blockCells;
      const columns = [
        packColumn(lon, from, to, 1e5, Int32Array),
        packColumn(lat, from, to, 1e5, Int32Array),
        packColumn(speedMs, from, to, 100, Uint16Array),
        packColumn(directionFrom, from, to, 10, Uint16Array),
        packColumn(flags, from, to, 1, Uint32Array),
      ];
      insert.run(from, ...columns);
      insertBox.run(from, ...findSpan(lon, from, to), ...findSpan(lat, from, to));
    }
  })();
  database.close();
}

/** Some entries of a column as whole multiples of a unit. */
function packColumn(
  column: Float64Array | Float32Array | Uint32Array,
  from: number,
  to: number,
  perUnit: number,
  Packed: Int32ArrayConstructor | Uint16ArrayConstructor | Uint32ArrayConstructor,
): Uint8Array {
  const packed = new Packed(to - from);
  for (let cell = from; cell < to; cell++) packed[cell - from] = Math.round(column[cell] * perUnit);
  return new Uint8Array(packed.buffer);
}

function findSpan(column: Float64Array, from: number, to: number): [least: number, most: number] {
  let least = Number.POSITIVE_INFINITY;
  let most = Number.NEGATIVE_INFINITY;
  for (let cell = from; cell < to; cell++) {
    least = Math.min(least, column[cell]);
    most = Math.max(most, column[cell]);
  }
  return [least, most];
}

function storePass(path: string, swath: Swath): void {
  const archive = openArchive(path);
  const file = { hash: 'bench', name: 'bench', bytes: 0, parts: 1, isDemonstration: false, loadedAtMs: 0 };
  keepPass(archive, file, 1, swath);
  archive.close();
}

/** A wind in every cell of a slanting track; which one does not matter to a database. */
function inventSwath(): Swath {
  const swath = createSwath(ROWS, COLUMNS);
  swath.cellSizeM = 12_500;
  for (let cell = 0; cell < ROWS * COLUMNS; cell++) {
    const row = Math.floor(cell / COLUMNS);
    const column = cell % COLUMNS;
    swath.state[cell] = WIND;
    swath.lon[cell] = -100 + row * 0.02 + column * 0.11;
    swath.lat[cell] = -80 + row * 0.048 - column * 0.02;
    swath.timeMs[cell] = Date.UTC(2031, 0, 17) + row * 1880;
    swath.speedMs[cell] = (cell * 0.0613) % 30;
    swath.directionFrom[cell] = (cell * 0.731) % 360;
    swath.flags[cell] = cell % 7 === 0 ? 2 ** (cell % 20) : 0;
  }
  return swath;
}
