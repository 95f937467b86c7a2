import { expect, test } from 'vitest';
import { cBandFlagWords, kuBandFlagWords } from '../../../../../src/decode/products/cf-swath/flag-words.ts';
import { flagsOf, SmallFile, variable } from './small-swath.ts';

const SMALL_WIND = 'small_wind_less_than_or_equal_to_3_m_s';

/** A small file whose three cells have these flag words; the list names two words, for the bits 1 and 2. */
function withFlags(words: number[], meanings: string, masks = Int32Array.of(1, 2)): SmallFile {
  const attributes = { standard_name: 'status_flag', flag_masks: masks, flag_meanings: meanings };
  return new SmallFile().add(variable('quality', 'int', Int32Array.from(words), attributes));
}

test('reads independent bits by their masks: (value AND mask) is not 0 (CF conventions 3.5)', () => {
  const file = withFlags([0, 2, 3], 'rain_detected some_portion_of_wvc_is_over_land');
  expect(flagsOf(file.swath())).toEqual([[], ['landInCell'], ['landInCell', 'rain']]);
});

test('reads exclusive values, alone and under a mask (CF conventions 3.5)', () => {
  const words = 'rain_detected some_portion_of_wvc_is_over_land';
  const values = withFlags([1, 2, 3], words).describe('quality', { flag_values: Int32Array.of(1, 2) });
  delete values.get('quality').attributes.flag_masks;
  expect(flagsOf(values.swath())).toEqual([['rain'], ['landInCell'], []]);
  const both = withFlags([5, 6, 7], words, Int32Array.of(3, 3)).describe('quality', {
    flag_values: Int32Array.of(1, 2),
  });
  expect(flagsOf(both.swath())).toEqual([['rain'], ['landInCell'], []]);
});

test('tells the fit check of any producer from the field-consistency check', () => {
  const file = withFlags([1, 2, 0], 'anyone_quality_control_fails variational_quality_control_fails');
  expect(flagsOf(file.swath())).toEqual([['fitQualityFailed'], ['fieldConsistencyFailed'], []]);
});

test('takes a list with one mask for two words for unknown flags, and says so', () => {
  const { swaths, problems } = withFlags([0, 1, 2], 'rain_detected data_are_redundant', Int32Array.of(1)).read();
  expect(swaths[0].flagReading).toBe('unknown');
  expect(flagsOf(swaths[0])).toEqual([['qualityUnknown'], ['qualityUnknown'], ['qualityUnknown']]);
  expect(Array.from(swaths[0].rawFlags)).toEqual([0, 1, 2]);
  expect(problems.map(({ code, place }) => [code, place.part])).toEqual([['flags-unknown', 'variable quality']]);
});

test('takes the quality of a file without flags for unknown, not for good', () => {
  const swath = new SmallFile().swath();
  expect(swath.flagReading).toBe('absent');
  expect(flagsOf(swath)).toEqual([['qualityUnknown'], ['qualityUnknown'], ['qualityUnknown']]);
  expect(Array.from(swath.rawFlags)).toEqual([0xffffffff, 0xffffffff, 0xffffffff]);
});

test('lists words nobody reviewed without judging them, however good or bad they sound', () => {
  const swath = withFlags([1, 1, 0], 'perfectly_usable_flag data_are_redundant').swath();
  expect(flagsOf(swath)).toEqual([[], [], []]);
  expect(swath.notes.join(' ')).toContain('perfectly_usable_flag (set in 2 winds)');
});

test('finds that the list is shifted when the light-wind bit stands in strong winds', () => {
  const file = withFlags([0, 1, 1], `${SMALL_WIND} rain_detected`);
  const { swaths, problems } = file.fill('wind_speed', 'float', Float32Array.of(2, 11, 12)).read();
  expect(swaths[0].flagReading).toBe('unknown');
  expect(flagsOf(swaths[0])[1]).toEqual(['qualityUnknown']);
  expect(problems[0].message).toContain('in only 0 of the 3 winds');
});

test('trusts a list whose light-wind bit stands in the light winds, and is not put off by one at the limit', () => {
  const file = withFlags([1, 0, 2], `${SMALL_WIND} rain_detected`);
  const swath = file.fill('wind_speed', 'float', Float32Array.of(2, 3, 12)).swath();
  expect(swath.flagReading).toBe('as-file-states');
  expect(flagsOf(swath)).toEqual([['atMost3Ms'], [], ['rain']]);
});

test('maps rain words of a second flag variable too, and keeps the first one as raw', () => {
  const file = withFlags([0, 0, 4], 'poor_azimuth_diversity data_are_redundant', Int32Array.of(4, 8));
  const extra = { flag_masks: Int16Array.of(1), flag_meanings: 'rain_impact_flag' };
  const swath = file.add(variable('extra_flags', 'short', Int16Array.of(0, 1, 1), extra), true).swath();
  expect(flagsOf(swath)).toEqual([[], ['rain'], ['rain', 'poorLookGeometry']]);
  expect(Array.from(swath.rawFlags)).toEqual([0, 0, 4]);
});

test('takes a missing flag word for unknown quality, never for all flags set', () => {
  const file = withFlags([-2147483647, -1, 0], 'rain_detected data_are_redundant');
  expect(flagsOf(file.swath())).toEqual([['qualityUnknown'], ['qualityUnknown'], []]);
});

test('has the masks of each family as its files have them', () => {
  // C band: 2^6 to 2^22 in the order of the list. Ku band: the sum of its masks is the valid_max of its files, 32643.
  expect(cBandFlagWords.map(({ mask }) => Math.log2(mask))).toEqual(
    Array.from({ length: 17 }, (_, index) => index + 6),
  );
  expect(kuBandFlagWords.reduce((sum, { mask }) => sum + mask, 0)).toBe(32643);
});
