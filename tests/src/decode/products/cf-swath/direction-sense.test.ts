import { expect, test } from 'vitest';
import { flagsOf, SmallFile, variable } from './small-swath.ts';

/** A small file whose wind direction has no standard name; in it the directions 90, 180 and 270 stand. */
function unnamed(): SmallFile {
  const file = new SmallFile();
  delete file.get('wind_dir').attributes.standard_name;
  return file;
}

test('reads wind_from_direction as it stands', () => {
  expect(Array.from(new SmallFile().swath().directionFrom)).toEqual([90, 180, 270]);
});

test('turns wind_to_direction round', () => {
  const file = new SmallFile().describe('wind_dir', { standard_name: 'wind_to_direction' });
  expect(Array.from(file.swath().directionFrom)).toEqual([270, 0, 90]);
});

test("believes the file's comment where there is no standard name", () => {
  const file = unnamed();
  file.content.attributes.comment = 'All wind directions in oceanographic convention (0 deg. flowing North)';
  expect(Array.from(file.swath().directionFrom)).toEqual([270, 0, 90]);
});

test('finds the comment of a re-served copy, which has a prefix before its name', () => {
  const file = unnamed();
  file.content.attributes['NC_GLOBAL.comment'] =
    'All wind directions in oceanographic convention (0 deg. flowing North)';
  expect(file.swath().isDirectionStated).toBe(true);
});

test("believes the variable's own text before the file's comment", () => {
  const file = unnamed().describe('wind_dir', { long_name: 'wind direction, meteorological convention' });
  file.content.attributes.comment = 'Directions in oceanographic convention';
  expect(Array.from(file.swath().directionFrom)).toEqual([90, 180, 270]);
});

test('never guesses: keeps the speeds, leaves the directions out, flags the winds and tells it', () => {
  const { swaths, problems } = unnamed().read();
  expect(swaths[0].isDirectionStated).toBe(false);
  expect(Array.from(swaths[0].speedMs)).toEqual([10, 11, 12]);
  expect(Array.from(swaths[0].directionFrom)).toEqual([Number.NaN, Number.NaN, Number.NaN]);
  expect(flagsOf(swaths[0]).every((flags) => flags.includes('directionUnknown'))).toBe(true);
  expect(problems.map(({ code, place }) => [code, place.part])).toEqual([
    ['direction-not-stated', 'variable wind_dir'],
  ]);
});

test('does not believe a text that says both', () => {
  const file = unnamed();
  file.content.attributes.comment = 'Oceanographic convention, not meteorological convention';
  expect(file.swath().isDirectionStated).toBe(false);
});

test('does not turn the background round by the word of the observed wind', () => {
  const file = new SmallFile();
  const words = { units: 'm s-1', standard_name: 'wind_speed' };
  file.add(variable('model_speed', 'float', Float32Array.of(1, 2, 3), words));
  file.add(variable('model_dir', 'float', Float32Array.of(1, 2, 3), { units: 'degree' }));
  expect(Array.from(file.swath().background?.directionFrom ?? [])).toEqual([Number.NaN, Number.NaN, Number.NaN]);
});

test('brings directions of -180 to 360 to 0 up to but not including 360', () => {
  const file = new SmallFile().fill('wind_dir', 'double', Float64Array.of(-90, 360, 359.9999999));
  expect(Array.from(file.swath().directionFrom)).toEqual([270, 0, 0]);
});

test('keeps the wind of an impossible direction, flags it and tells it', () => {
  const { swaths, problems } = new SmallFile().fill('wind_dir', 'float', Float32Array.of(90, 464, 270)).read();
  expect(Array.from(swaths[0].speedMs)).toEqual([10, 11, 12]);
  expect(flagsOf(swaths[0])[1]).toEqual(['outOfRange', 'directionUnknown', 'qualityUnknown']);
  expect(problems.map(({ code }) => code)).toEqual(['values-out-of-range']);
});

test('leaves directions of an unknown unit out', () => {
  expect(new SmallFile().describe('wind_dir', { units: 'points' }).swath().isDirectionStated).toBe(false);
});
