import { expect, test } from 'vitest';
import { keepWatchArea, listWatchAreas, readWatchArea, removeWatchArea } from '../../../src/store/watch-areas.ts';
import { atArchive } from './at-archive.ts';

const bench = atArchive();
const ring: [number, number][] = [
  [179, 50],
  [181, 50],
  [181, 52.5],
];

test('keeps watch areas over a restart, by name', () => {
  const west = keepWatchArea(bench.archive, { name: 'West', ring });
  const east = keepWatchArea(bench.archive, { name: 'East', ring: ring.slice().reverse() });
  bench.reopen();
  expect(listWatchAreas(bench.archive)).toEqual([east, west]);
  expect(readWatchArea(bench.archive, west.areaId)).toEqual({ areaId: west.areaId, name: 'West', ring });
});

test('never gives the number of a removed area to another', () => {
  const { areaId } = keepWatchArea(bench.archive, { name: 'Old', ring });
  removeWatchArea(bench.archive, areaId);
  expect(keepWatchArea(bench.archive, { name: 'New', ring }).areaId).toBeGreaterThan(areaId);
});

test('says so when there is no such area', () => {
  const notStored = expect.objectContaining({ code: 'not-stored' });
  expect(() => readWatchArea(bench.archive, 3)).toThrow(notStored);
  expect(() => removeWatchArea(bench.archive, 3)).toThrow(notStored);
});
