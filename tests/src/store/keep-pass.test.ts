import { expect, test } from 'vitest';
import { readCell } from '../../../src/store/cell.ts';
import { keepPass, ROWS_PER_BLOCK } from '../../../src/store/keep-pass.ts';
import { findWholeFile, listPasses } from '../../../src/store/passes.ts';
import { createBackground, createBeams, createSolutions, type Swath } from '../../../src/swath/swath.ts';
import { flagBit } from '../../../src/wind/flags.ts';
import { atArchive, fileOf } from './at-archive.ts';
import { drawnTimeMs, drawSwath } from './draw-swath.ts';

const bench = atArchive();

/** Three rows more than a block, so that the last row lies in a second one. */
const tall = Array.from({ length: ROWS_PER_BLOCK + 3 }, () => '1o.2');
const lastRow = tall.length - 1;

/** A swath in which the fourth cell of the last row holds everything a cell can hold. */
function drawFullSwath(): { swath: Swath; cell: number } {
  const swath = drawSwath(tall);
  const cells = tall.length * 4;
  const cell = cells - 1;
  swath.flags[cell] = flagBit.rain | flagBit.qualityUnknown;
  swath.rawFlags[cell] = 0xfffffe;
  swath.chosenSolution[cell] = 2;
  swath.solutions = createSolutions(cells, 3);
  swath.solutions.speedMs.set([9.5, 10, Number.NaN], cell * 3);
  swath.solutions.directionFrom.set([20, 200, Number.NaN], cell * 3);
  swath.solutions.probability.set([0.25, 0.75, Number.NaN], cell * 3);
  swath.solutions.fitDistance.set([-1.5, 0.5, Number.NaN], cell * 3);
  swath.beams = createBeams(cells, 2);
  swath.beams.incidenceDeg.set([40.5, 30.25], cell * 2);
  swath.beams.azimuthDeg.set([45, 90], cell * 2);
  swath.beams.backscatterDb.set([-12.5, -9], cell * 2);
  swath.beams.noisePercent.set([4, Number.NaN], cell * 2);
  swath.background = createBackground(cells);
  swath.background.speedMs[cell] = 8.5;
  swath.background.directionFrom[cell] = 190;
  swath.iceProbability = new Float32Array(cells).fill(Number.NaN);
  swath.iceProbability[cell] = 0.125;
  return { swath, cell };
}

test('gives back every value of a cell after the archive was closed and opened again', () => {
  const { swath, cell } = drawFullSwath();
  const { passId } = keepPass(bench.archive, fileOf('full'), 1, swath);
  bench.reopen();
  expect(readCell(bench.archive, passId, lastRow, 3)).toEqual({
    state: 2,
    lon: swath.lon[cell],
    lat: swath.lat[cell],
    timeMs: swath.timeMs[cell],
    speedMs: 10,
    directionFrom: 200,
    flags: flagBit.rain | flagBit.qualityUnknown,
    rawFlags: 0xfffffe,
    chosenSolution: 2,
    solutions: [
      { speedMs: 9.5, directionFrom: 20, probability: 0.25, fitDistance: -1.5 },
      { speedMs: 10, directionFrom: 200, probability: 0.75, fitDistance: 0.5 },
      { speedMs: Number.NaN, directionFrom: Number.NaN, probability: Number.NaN, fitDistance: Number.NaN },
    ],
    beams: [
      { incidenceDeg: 40.5, azimuthDeg: 45, backscatterDb: -12.5, noisePercent: 4 },
      { incidenceDeg: 30.25, azimuthDeg: 90, backscatterDb: -9, noisePercent: Number.NaN },
    ],
    background: { speedMs: 8.5, directionFrom: 190 },
    iceProbability: 0.125,
  });
});

test('keeps the three states of a cell apart', () => {
  const { passId } = keepPass(bench.archive, fileOf('states'), 1, drawSwath(['1o.']));
  expect([0, 1, 2].map((column) => readCell(bench.archive, passId, 0, column).state)).toEqual([2, 1, 0]);
});

test('says that a cell holds no solutions, looks or background where the file had none', () => {
  const { passId } = keepPass(bench.archive, fileOf('bare'), 1, drawSwath(['1']));
  const cell = readCell(bench.archive, passId, 0, 0);
  expect(cell).toMatchObject({ solutions: [], beams: [], background: null, iceProbability: Number.NaN });
});

test('refuses rows and columns that the pass does not have', () => {
  const { passId } = keepPass(bench.archive, fileOf('small'), 1, drawSwath(['12', '34']));
  for (const [row, column] of [
    [2, 0],
    [0, 2],
  ]) {
    expect(() => readCell(bench.archive, passId, row, column)).toThrow(expect.objectContaining({ code: 'not-stored' }));
  }
});

test('keeps the same part of the same content once', () => {
  const first = keepPass(bench.archive, fileOf('same'), 1, drawSwath(['12']));
  bench.reopen();
  const second = keepPass(bench.archive, fileOf('same', { name: 'copy.bufr' }), 1, drawSwath(['12']));
  expect([first.isNew, second.isNew, second.passId === first.passId]).toEqual([true, false, true]);
  expect(listPasses(bench.archive)).toHaveLength(1);
});

test('knows a file as whole only when all its passes are there', () => {
  const file = fileOf('two', { parts: 2 });
  const first = keepPass(bench.archive, file, 1, drawSwath(['12']));
  expect(findWholeFile(bench.archive, 'two')).toBeNull();
  const second = keepPass(bench.archive, file, 2, drawSwath(['34']));
  expect(findWholeFile(bench.archive, 'two')).toEqual([first.passId, second.passId]);
});

test('stores nothing at all of a pass that fails halfway', () => {
  const swath = drawSwath(tall);
  // The background is written last; one without columns fails after the blocks went in.
  swath.background = {} as never;
  expect(() => keepPass(bench.archive, fileOf('broken'), 1, swath)).toThrow(TypeError);
  const count = (table: string) => bench.archive.database.prepare(`SELECT count(*) FROM ${table}`).pluck().get();
  expect(['files', 'passes', 'blocks', 'blockDetails', 'blockBoxes'].map(count)).toEqual([0, 0, 0, 0, 0]);
});

test('refuses a pass in which nothing was looked at', () => {
  expect(() => keepPass(bench.archive, fileOf('empty'), 1, drawSwath(['...']))).toThrow(
    expect.objectContaining({ code: 'no-cells' }),
  );
});

test('refuses a wind without a place, and says which', () => {
  const swath = drawSwath(['11', '11']);
  swath.lat[3] = Number.NaN;
  expect(() => keepPass(bench.archive, fileOf('lost'), 1, swath)).toThrow(
    expect.objectContaining({ code: 'damaged', place: { part: 'row 2, column 2' } }),
  );
});

test('sums a pass up for the list', () => {
  // 4 is 20 m/s, 38.9 kt, a gale; 3 is 15 m/s, 29.2 kt, near gale (Beaufort scale: WMO-No. 306, table 1100).
  const swath = drawSwath(['1o.', '34.']);
  swath.notes = ['a note'];
  swath.cellSizeM = Number.NaN;
  keepPass(bench.archive, fileOf('sum', { isDemonstration: true }), 1, swath);
  expect(listPasses(bench.archive)).toEqual([
    {
      passId: 1,
      file: 'sum.bufr',
      fileHash: 'sum',
      partOfFile: 1,
      startMs: drawnTimeMs,
      endMs: drawnTimeMs + 4000,
      band: 'C',
      viewing: null,
      platformCode: null,
      sourceAsRead: null,
      rows: 2,
      columns: 3,
      cellSizeM: null,
      cells: 4,
      winds: 3,
      galeWinds: 1,
      maxSpeedMs: 20,
      maxLon: 10.25,
      maxLat: 40.25,
      maxTimeMs: drawnTimeMs + 4000,
      maxRow: 2,
      maxColumn: 2,
      flagReading: 'as-table',
      isDirectionStated: true,
      checksRain: false,
      notes: ['a note'],
      isDemonstration: true,
      loadedAtMs: 1000,
    },
  ]);
});
