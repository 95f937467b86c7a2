import { expect, test } from 'vitest';
import { keepSetting, readSetting } from '../../../src/store/settings.ts';
import { atArchive } from './at-archive.ts';

const bench = atArchive();

test('keeps the last value of a setting over a restart', () => {
  keepSetting(bench.archive, 'screen', { light: 'day' });
  keepSetting(bench.archive, 'screen', { light: 'night', hidden: [1, 2] });
  bench.reopen();
  expect(readSetting(bench.archive, 'screen')).toEqual({ light: 'night', hidden: [1, 2] });
});

test('says null of a setting that was never kept', () => {
  expect(readSetting(bench.archive, 'screen')).toBeNull();
});
