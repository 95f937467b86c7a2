import { expect, test } from 'vitest';
import { viewBlocks } from '../../../src/contract/packed-swath.ts';
import type { GeoBox } from '../../../src/contract/values.ts';
import { findBlocks, readBlocks } from '../../../src/store/blocks.ts';
import { keepPass, ROWS_PER_BLOCK } from '../../../src/store/keep-pass.ts';
import { flagBit } from '../../../src/wind/flags.ts';
import { atArchive, fileOf } from './at-archive.ts';
import { drawnTimeMs, drawSwath, type Place } from './draw-swath.ts';

const bench = atArchive();
const always = { fromMs: 0, toMs: 2 * drawnTimeMs };
const everywhere = { west: -180, south: -90, east: 180, north: 90 };

function keepDrawn(rows: string[], place: Place = {}): number {
  const content = `${rows.join()} ${JSON.stringify(place)}`;
  return keepPass(bench.archive, fileOf(content), 1, drawSwath(rows, place)).passId;
}

const isFound = (box: GeoBox, window = always) => findBlocks(bench.archive, box, window).length > 0;

test('finds a swath that crosses the date line from either side of it, and once from both', () => {
  keepDrawn(['1111'], { west: 179.5, south: 0 }); // 179.5 to -179.75
  expect(isFound({ west: 179, south: -1, east: 179.6, north: 1 })).toBe(true);
  expect(isFound({ west: -180, south: -1, east: -179.8, north: 1 })).toBe(true);
  expect(findBlocks(bench.archive, { west: 170, south: -1, east: -170, north: 1 }, always)).toHaveLength(1);
});

test('does not find that swath on the far side of the earth', () => {
  keepDrawn(['1111'], { west: 179.5, south: 0 });
  expect(isFound({ west: -170, south: -90, east: 170, north: 90 })).toBe(false);
});

test('finds a box that crosses the date line only where it reaches', () => {
  keepDrawn(['1'], { west: 10, south: 0 });
  expect(isFound({ west: 20, south: -1, east: 5, north: 1 })).toBe(false);
  expect(isFound({ west: 9, south: -1, east: 5, north: 1 })).toBe(true);
});

test('finds a cell by its footprint, not only by its centre', () => {
  // A lone cell of 25 km reaches 12.5 km, 0.112 degrees on a sphere of 6371 km, north of its centre at the equator.
  keepDrawn(['1'], { west: 10, south: 0 });
  expect(isFound({ west: 9, south: 0.1, east: 11, north: 1 })).toBe(true);
  expect(isFound({ west: 9, south: 0.13, east: 11, north: 1 })).toBe(false);
});

test('finds cells about a pole at every longitude', () => {
  keepDrawn(['11'], { west: 10, south: 89.95 });
  expect(isFound({ west: -100, south: 89, east: -99, north: 90 })).toBe(true);
});

test('finds by time, both ends of the window included', () => {
  keepDrawn(['1', '1']); // looked at drawnTimeMs and 4 s later
  const during = (fromMs: number, toMs: number) => isFound(everywhere, { fromMs, toMs });
  expect(during(drawnTimeMs + 4000, drawnTimeMs + 9000)).toBe(true);
  expect(during(drawnTimeMs - 9000, drawnTimeMs)).toBe(true);
  expect(during(drawnTimeMs + 4001, drawnTimeMs + 9000)).toBe(false);
  expect(during(drawnTimeMs - 9000, drawnTimeMs - 1)).toBe(false);
});

test('never finds rows in which nothing was looked at', () => {
  const rows = ['1', ...Array.from({ length: 2 * ROWS_PER_BLOCK - 1 }, () => '.')];
  const passId = keepDrawn(rows);
  expect(findBlocks(bench.archive, everywhere, always)).toEqual([{ blockId: 1, passId, cells: ROWS_PER_BLOCK }]);
});

test('gives blocks in the order asked, with their ids, and leaves unknown ones out', () => {
  const first = keepDrawn(['12']);
  const second = keepDrawn(['34']);
  const payload = readBlocks(bench.archive, [2, 99, 1]);
  expect(viewBlocks(payload).map(({ blockId, passId }) => [blockId, passId])).toEqual([
    [2, second],
    [1, first],
  ]);
});

test('gives an empty payload for no blocks', () => {
  expect(readBlocks(bench.archive, []).byteLength).toBe(0);
});

test('draws cells as they were kept', () => {
  const swath = drawSwath(['2o.'], { west: 179.75, south: -33.5 });
  swath.flags[0] = flagBit.landInCell;
  keepPass(bench.archive, fileOf('drawn'), 1, swath);
  const [block] = viewBlocks(readBlocks(bench.archive, [1]));
  expect(block).toMatchObject({ firstRow: 0, rows: 1, columns: 3, cells: 3 });
  expect([...block.state]).toEqual([2, 1, 0]);
  expect([...block.lonE5]).toEqual([17_975_000, -18_000_000, 0]);
  expect([...block.latE5]).toEqual([-3_350_000, -3_350_000, 0]);
  expect([...block.timeS]).toEqual([drawnTimeMs / 1000, drawnTimeMs / 1000, 0]);
  expect([...block.speedMs]).toEqual([10, Number.NaN, Number.NaN]);
  expect([...block.directionFrom]).toEqual([200, Number.NaN, Number.NaN]);
  expect([...block.flags]).toEqual([flagBit.landInCell, 0, 0]);
});

test('cuts a pass into blocks that continue one another', () => {
  const passId = keepDrawn(Array.from({ length: 2 * ROWS_PER_BLOCK + 5 }, () => '1'));
  const found = findBlocks(bench.archive, everywhere, always);
  const blocks = viewBlocks(
    readBlocks(
      bench.archive,
      found.map(({ blockId }) => blockId),
    ),
  );
  expect(blocks.map((block) => [block.passId, block.firstRow, block.rows])).toEqual([
    [passId, 0, ROWS_PER_BLOCK],
    [passId, ROWS_PER_BLOCK, ROWS_PER_BLOCK],
    [passId, 2 * ROWS_PER_BLOCK, 5],
  ]);
});

test('reads nothing but the drawing to draw', () => {
  keepDrawn(['12']);
  const { database } = bench.archive;
  for (const table of ['blockDetails', 'blockSolutions', 'blockBeams', 'blockBackgrounds']) {
    database.exec(`DROP TABLE ${table}`);
  }
  const found = findBlocks(bench.archive, everywhere, always);
  expect(viewBlocks(readBlocks(bench.archive, [found[0].blockId]))).toHaveLength(1);
});
