import { expect, test } from 'vitest';
import { SmallFile, variable } from './small-swath.ts';

const NaN3 = [Number.NaN, Number.NaN, Number.NaN];
const modelSpeed = (name: string, attributes: Record<string, string>) =>
  variable(name, 'float', Float32Array.of(1, 2, 3), { standard_name: 'wind_speed', units: 'm s-1', ...attributes });

test.each([
  ['its name', modelSpeed('model_speed', {})],
  ['its long name', modelSpeed('speed_2', { long_name: 'background wind speed at 10 m' })],
  ['an attribute about its source', modelSpeed('speed_2', { background_wind_source: 'numerical model' })],
])('knows a model wind by %s and takes the other one, wherever it stands', (_, model) => {
  const first = new SmallFile().add(model, true).swath();
  const last = new SmallFile().add(model).swath();
  expect([Array.from(first.speedMs), Array.from(last.speedMs)]).toEqual([
    [10, 11, 12],
    [10, 11, 12],
  ]);
  expect(Array.from(first.background?.speedMs ?? [])).toEqual([1, 2, 3]);
});

test("does not take a scatterometer's model function for a model", () => {
  const file = new SmallFile().describe('wind_speed', { long_name: 'wind speed from the model function' });
  expect(Array.from(file.swath().speedMs)).toEqual([10, 11, 12]);
});

test('refuses to guess between two winds of which neither is a model', () => {
  const refusal = new SmallFile().add(modelSpeed('wind_speed_2', {})).refusal();
  expect(refusal.code).toBe('unsupported-format');
  expect(refusal.message).toContain('wind_speed, wind_speed_2');
});

test('passes over the error of a wind', () => {
  const file = new SmallFile().add(modelSpeed('wind_speed_error', {}), true);
  expect(Array.from(file.swath().speedMs)).toEqual([10, 11, 12]);
});

test('refuses a file whose only wind is a model wind', () => {
  expect(new SmallFile().remove('wind_speed').add(modelSpeed('model_speed', {})).refusal().code).toBe('not-wind');
});

test('refuses the same kind of file without wind', () => {
  const file = new SmallFile().remove('wind_speed', 'wind_dir');
  file.add(variable('soil_moisture', 'float', Float32Array.of(1, 2, 3), { units: '1' }));
  expect(file.refusal().code).toBe('not-wind');
});

test('refuses a grid: longitude and latitude of one dimension each', () => {
  const file = new SmallFile().remove('time', 'lat', 'lon', 'wind_speed', 'wind_dir');
  file.add({ ...variable('row', 'float', Float32Array.of(50), { units: 'degrees_north' }), dimensions: ['row'] });
  file.add({ ...variable('cell', 'float', Float32Array.of(1, 2, 3), { units: 'degrees_east' }), dimensions: ['cell'] });
  file.add(variable('uwnd', 'float', Float32Array.of(1, 2, 3), { units: 'm/s', _Fillvalue: Float32Array.of(-999) }));
  file.add(variable('vwnd', 'float', Float32Array.of(1, 2, 3), { units: 'm/s' }));
  expect(file.refusal().code).toBe('not-a-swath');
});

test('refuses winds that have no time', () => {
  expect(new SmallFile().remove('time').refusal().code).toBe('not-a-swath');
});

test('takes the position that the wind names in its coordinates where there are two', () => {
  const file = new SmallFile().describe('wind_speed', { coordinates: 'lat lon' });
  file.add(variable('satellite_lat', 'double', Float64Array.of(...NaN3), { units: 'degrees_north' }), true);
  file.add(variable('satellite_lon', 'double', Float64Array.of(...NaN3), { units: 'degrees_east' }), true);
  expect(Array.from(file.swath().lon)).toEqual([10, 11, 12]);
});

test.each([
  ['degrees_north', 'degrees_east'],
  ['degree_N', 'degree_E'],
  ['degreesN', 'degreesE'],
])('knows positions by the units %s and %s', (north, east) => {
  // CF conventions 4.1 and 4.2: the accepted spellings.
  const file = new SmallFile().describe('lat', { units: north }).describe('lon', { units: east });
  expect(Array.from(file.swath().lat)).toEqual([50, 50, 50]);
});

test('works speed and direction out from eastward and northward parts', () => {
  const file = new SmallFile().remove('wind_speed', 'wind_dir');
  // A wind of 5 m/s towards the east-north-east of a 3-4-5 triangle, a west wind, and a north wind.
  file.add(variable('u', 'float', Float32Array.of(4, 8, 0), { standard_name: 'eastward_wind', units: 'm s-1' }));
  file.add(variable('v', 'float', Float32Array.of(3, 0, -6), { standard_name: 'northward_wind', units: 'm s-1' }));
  const { speedMs, directionFrom, isDirectionStated } = file.swath();
  expect(Array.from(speedMs)).toEqual([5, 8, 6]);
  // 180 + atan2(4, 3) in degrees is 233.130.
  expect(Array.from(directionFrom, (degrees) => degrees.toFixed(3))).toEqual(['233.130', '270.000', '0.000']);
  expect(isDirectionStated).toBe(true);
});
