import { expect, test } from 'vitest';
import { flagBit, flagNames, flagWords, listFlags } from '../../../src/wind/flags.ts';
import { isHiddenBySwitches, showEverything } from '../../../src/wind/switches.ts';

test('hides nothing when it opens, whatever the flags', () => {
  expect(isHiddenBySwitches(25, 0xffffffff, showEverything())).toBe(false);
});

test('hides a wind of a class that is switched off, and no other', () => {
  const switches = showEverything();
  switches.beaufortShown[8] = false;
  expect([17.1, 18, 21].map((speedMs) => isHiddenBySwitches(speedMs, 0, switches))).toEqual([false, true, false]);
});

test('hides rain alone when rain alone is switched off', () => {
  const switches = showEverything();
  switches.doubtShown.rain = false;
  expect(isHiddenBySwitches(10, flagBit.rain | flagBit.atMost3Ms, switches)).toBe(true);
  expect(isHiddenBySwitches(10, flagBit.rainCheckNotUsable | flagBit.landInCell, switches)).toBe(false);
});

test('never takes a light or a very strong wind for a doubtful one', () => {
  const switches = showEverything();
  switches.doubtShown.quality = false;
  expect(isHiddenBySwitches(2, flagBit.atMost3Ms, switches)).toBe(false);
  expect(isHiddenBySwitches(31, flagBit.above30Ms, switches)).toBe(false);
});

test('has words for every flag and reads a word back into its flags', () => {
  expect(Object.keys(flagWords)).toEqual([...flagNames]);
  expect(listFlags(flagBit.rain | flagBit.qualityUnknown)).toEqual(['rain', 'qualityUnknown']);
});
