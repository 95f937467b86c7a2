import { expect, test } from 'vitest';
import { adoptTask, hearNews, isUnderWay, type Load, waitingLoad } from '../../../renderer/state/loads.ts';
import type { NewsLine } from '../../../src/contract/news.ts';

const fate = (taskId: number, file: string): NewsLine => ({
  kind: 'file fate',
  taskId,
  fate: { file, fate: 'loaded', passIds: [1], problems: [] },
});
const ended = (taskId: number): NewsLine => ({ kind: 'load ended', taskId, wasStopped: false });
const hearAll = (loads: Load[], lines: NewsLine[]) => lines.reduce((now, line) => hearNews(now, line, 100), loads);

test('follows a given file from its task to its fate', () => {
  const given = adoptTask([waitingLoad(1, 'storm.bufr')], 1, 7);
  const [load] = hearAll(given, [fate(7, 'storm.bufr'), ended(7)]);
  expect(load).toMatchObject({ loadId: 1, stage: 'ended', file: 'storm.bufr' });
  expect(load.fates).toHaveLength(1);
});

test('takes in news that came before the task was known to be ours', () => {
  const early = hearAll([{ ...waitingLoad(1, 'storm.bufr'), stage: 'sending' }], [fate(7, 'storm.bufr'), ended(7)]);
  expect(early).toHaveLength(2);
  const [load, ...others] = adoptTask(early, 1, 7);
  expect(others).toEqual([]);
  expect(load).toMatchObject({ loadId: 1, taskId: 7, stage: 'ended' });
  expect(load.fates).toHaveLength(1);
});

test('shows a task that the host began by itself', () => {
  const progress: NewsLine = {
    kind: 'load progress',
    taskId: 3,
    file: 'a.nc',
    filesDone: 1,
    filesTotal: 4,
    bytesDone: 50,
    bytesTotal: 200,
  };
  const [load] = hearAll([], [progress]);
  expect(load).toMatchObject({ loadId: 100, taskId: 3, stage: 'reading', file: 'a.nc', share: 0.25, filesTotal: 4 });
  expect(isUnderWay(load)).toBe(true);
});

test('lets the end of an unknown task pass', () => {
  expect(hearAll([], [ended(9)])).toEqual([]);
});
