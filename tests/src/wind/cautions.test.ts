import { expect, test } from 'vitest';
import { type CautionedCell, cautionCell, standingCautions } from '../../../src/wind/cautions.ts';
import { flagBit } from '../../../src/wind/flags.ts';

// The limits held here (25 m/s, 4 m/s, rain by band, ice, coast) are common practice with such winds; no single source.

const calmCase: CautionedCell = {
  hasWind: true,
  speedMs: 10,
  directionFrom: 200,
  flags: 0,
  solutionDirections: [200],
  hasBackground: false,
  iceProbability: Number.NaN,
  band: 'C',
  checksRain: true,
  areFlagsKnown: true,
  isDirectionStated: true,
  landKm: null,
};

const cautionsOf = (changes: Partial<CautionedCell>) => cautionCell({ ...calmCase, ...changes }).join(' ');

test('says of every wind that it is past, a mean, and not for navigation', () => {
  const cautions = cautionsOf({});
  for (const part of ['observation of the past', 'gusts are higher', 'Not for navigation']) {
    expect(cautions).toContain(part);
  }
});

test('says of water without a wind that this is not calm', () => {
  const cautions = cautionsOf({ hasWind: false, speedMs: Number.NaN, directionFrom: null });
  expect(cautions).toContain('it does not mean calm');
  expect(cautions).not.toContain('gusts');
});

test.each<[string, Partial<CautionedCell>, string]>([
  ['a wind above 25 m/s', { speedMs: 25.1 }, 'likely too low'],
  ['a wind under 4 m/s', { speedMs: 3.9 }, 'direction can hardly be told'],
  ['Ku-band rain', { flags: flagBit.rain, band: 'Ku' }, 'a very strong one too low'],
  ['C-band rain', { flags: flagBit.rain }, 'heavy rain changes the speed'],
  ['rain of an unknown band, as the worse of both', { flags: flagBit.rain, band: null }, 'a very strong one too low'],
  ['an unusable rain check', { flags: flagBit.rainCheckNotUsable }, 'could not be checked'],
  ['a pass without any rain flag', { checksRain: false }, 'may never have been checked'],
  ['a solution the other way', { solutionDirections: [200, 25] }, 'points nearly the other way'],
  ['a direction nobody stated', { isDirectionStated: false, directionFrom: null }, 'does not say which way'],
  ['an unknown direction', { directionFrom: null }, 'direction is not known'],
  ['land in the cell', { flags: flagBit.landInCell }, 'Land lies in this cell'],
  ['land near by', { landKm: 49 }, 'Land is near'],
  ['ice in the cell', { flags: flagBit.iceInCell }, 'Ice lies in this cell'],
  ['likely ice', { iceProbability: 0.51 }, 'Ice is more likely than not'],
  ['unknown flags', { areFlagsKnown: false }, 'no flag does not mean good'],
  ['a failed quality check', { flags: flagBit.fieldConsistencyFailed }, 'may be right all the same'],
  ['a model wind beside it', { hasBackground: true }, 'nobody observed it'],
])('warns of %s', (_what, changes, sentence) => {
  expect(cautionsOf(changes)).toContain(sentence);
  expect(cautionsOf({})).not.toContain(sentence);
});

test('takes north as one direction when it looks for a reversed solution', () => {
  const reversed = 'Another solution points nearly the other way';
  expect(cautionsOf({ directionFrom: 5, solutionDirections: [5, 355] })).not.toContain(reversed);
  expect(cautionsOf({ directionFrom: 5, solutionDirections: [5, 175] })).toContain(reversed);
});

test('names nothing as safe', () => {
  const everything = [...standingCautions, cautionsOf({})].join(' ');
  expect(everything).not.toMatch(/\b(safe|reliable|no gale|certain)\b/i);
});
