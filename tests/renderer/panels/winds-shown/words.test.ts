import { expect, test } from 'vitest';
import {
  classesFrom,
  knotsOfClass,
  lowestMsOfClass,
  summariseSwitches,
} from '../../../../renderer/panels/winds-shown/words.ts';
import { showEverything } from '../../../../src/wind/switches.ts';

test('shows the limits of the classes in knots (WMO-No. 306, code table 1100)', () => {
  expect([0, 7, 8, 10, 12].map(knotsOfClass)).toEqual(['under 1', '28 to 33', '34 to 40', '48 to 55', '64 and over']);
});

test('begins gale at 33.5 kt in metres per second: 33.5 x 1852 / 3600 = 17.23', () => {
  expect(lowestMsOfClass(8)).toBe('17.23');
});

test('shows from gale up nothing weaker', () => {
  expect(classesFrom(8).indexOf(true)).toBe(8);
});

test('says in a few words what is shown', () => {
  const all = showEverything();
  expect(summariseSwitches(all)).toBe('all');
  expect(summariseSwitches({ ...all, beaufortShown: classesFrom(8) })).toBe('gale and more');
  expect(summariseSwitches({ beaufortShown: classesFrom(13), doubtShown: { ...all.doubtShown, rain: false } })).toBe(
    'no class; without rain',
  );
});
