import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { inspectFiles } from '../../../src/operations/inspect-files.ts';
import { buildBufrFile, buildCfFile } from './build-files.ts';

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'crosstrack-inspect-'));
});
afterEach(() => rmSync(folder, { recursive: true }));

function inspect(name: string, bytes: Uint8Array | string) {
  const path = join(folder, name);
  writeFileSync(path, bytes);
  return inspectFiles([path])[0];
}

test('counts what a netCDF swath holds', () => {
  const { format, passes, problems } = inspect('a.nc', buildCfFile());
  expect([format, problems]).toEqual(['netCDF classic (CDF-1)', []]);
  // By hand: 17.2 + 17.3 + 10.7 + 2.5 + 35; east 17.2 + 17.3 - 35; north 10.7 - 2.5. 17.2 m/s is 33.43 kt, no gale.
  expect(passes).toMatchObject([
    {
      start: '2031-01-17T00:00:00Z',
      end: '2031-01-17T00:00:04Z',
      rows: 2,
      columns: 3,
      cells: 6,
      winds: 5,
      sumSpeedMs: 82.7,
      sumEastwardMs: -0.5,
      sumNorthwardMs: 8.2,
      maxSpeedMs: 35,
      maxLon: -179.65,
      maxLat: 50.225,
      maxTime: '2031-01-17T00:00:04Z',
      windsAtLeast17p2Ms: 3,
      windsOfGale: 2,
      flagCounts: { landInCell: 1, above30Ms: 1, atMost3Ms: 1 },
      directionStated: true,
      beams: 0,
      solutionsMax: 0,
      windsNotFirstSolution: 0,
    },
  ]);
});

test('counts looks, solutions and choices of a BUFR swath', () => {
  const { format, passes } = inspect('a.bufr', buildBufrFile());
  expect(format).toBe('BUFR edition 4');
  // By hand: 5 + 10 + 10 + 5 and 5 + 10 + 5, all from 200 degrees, so moving by -sin 200 and -cos 200 of 50 m/s.
  expect(passes).toMatchObject([
    { cells: 8, winds: 7, sumSpeedMs: 50, beams: 3, solutionsMax: 2, windsNotFirstSolution: 3, directionStated: true },
  ]);
  expect(passes[0].sumEastwardMs).toBeCloseTo(17.101, 3);
  expect(passes[0].sumNorthwardMs).toBeCloseTo(46.9846, 3);
});

test('prints speeds as the file has them, not as 32 bits hold them', () => {
  const { passes } = inspect('a.nc', buildCfFile());
  expect(JSON.stringify(passes)).not.toMatch(/\d\.\d{6,}/);
});

test('gives an element for each file, read or not, in the order asked', () => {
  const there = join(folder, 'there.nc');
  writeFileSync(there, buildCfFile());
  const missing = join(folder, 'missing.nc');
  const files = inspectFiles([missing, there, folder]);
  expect(files.map(({ file, passes }) => [file, passes.length])).toEqual([
    [missing, 0],
    [there, 1],
    [folder, 0],
  ]);
  expect(files[0].problems).toMatchObject([{ code: 'not-found', where: missing }]);
  expect(files[2].problems).toMatchObject([{ code: 'not-readable', where: folder }]);
});

test('tells of a cut file what is wrong and where', () => {
  const { passes, problems } = inspect('cut.bufr', buildBufrFile().subarray(0, 200));
  expect([passes, problems.length]).toEqual([[], 1]);
  expect(problems[0].where).toContain('cut.bufr, message 1');
});
