import { expect, test } from 'vitest';
import { describeFate, describeStage, listReasons } from '../../../../renderer/panels/loading/words.ts';
import { waitingLoad } from '../../../../renderer/state/loads.ts';

test('tells how far a load is', () => {
  const load = waitingLoad(1, 'storm.bufr');
  expect(describeStage(load)).toBe('waiting');
  expect(describeStage({ ...load, stage: 'sending', share: 0.405 })).toBe('sending, 40 %');
  expect(describeStage({ ...load, stage: 'reading', filesTotal: 3, filesDone: 1, share: 0.5 })).toBe(
    'reading file 2 of 3, 50 %',
  );
  expect(describeStage({ ...load, stage: 'failed', reason: 'larger than 512 MiB' })).toBe(
    'not loaded: larger than 512 MiB',
  );
});

test('tells a fate, and each reason with its place', () => {
  const fate = {
    file: 'a.bufr',
    fate: 'partly read' as const,
    passIds: [1],
    problems: [{ code: 'truncated', message: 'message 3 ends too early', where: 'a.bufr, byte 1402' }],
  };
  expect(describeFate(fate)).toBe('a.bufr: partly read');
  expect(listReasons(fate)).toEqual(['message 3 ends too early (a.bufr, byte 1402)']);
});
