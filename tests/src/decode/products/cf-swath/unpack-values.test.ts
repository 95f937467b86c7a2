import { expect, test } from 'vitest';
import { flagsOf, SmallFile } from './small-swath.ts';

const speedsOf = (file: SmallFile) => Array.from(file.swath().speedMs, (speed) => Number(speed.toFixed(3)));
const missing = Number.NaN;

test('unpacks by scale and offset: packed x scale + offset (CF conventions 8.1)', () => {
  const file = new SmallFile().fill('wind_speed', 'short', Int16Array.of(-100, 0, 100));
  file.describe('wind_speed', { scale_factor: Float64Array.of(0.01), add_offset: Float64Array.of(5) });
  expect(speedsOf(file)).toEqual([4, 5, 6]);
});

test('compares the fill value before unpacking', () => {
  const file = new SmallFile().fill('wind_speed', 'short', Int16Array.of(1000, 10, 20));
  file.describe('wind_speed', { scale_factor: Float64Array.of(0.01), _FillValue: Int16Array.of(10) });
  expect(speedsOf(file)).toEqual([10, missing, 0.2]);
});

test('takes every one of several missing values for missing', () => {
  const file = new SmallFile().fill('wind_speed', 'short', Int16Array.of(-1, -2, 7));
  file.describe('wind_speed', { _FillValue: Int16Array.of(-1), missing_value: Int16Array.of(-1, -2) });
  expect(speedsOf(file)).toEqual([missing, missing, 7]);
});

test.each(['_Fillvalue', 'FillValue', 'fill_value'])('knows a fill value that is spelt %s', (name) => {
  const file = new SmallFile().fill('wind_speed', 'short', Int16Array.of(12, 99, 13));
  expect(speedsOf(file.describe('wind_speed', { [name]: Int16Array.of(99) }))).toEqual([12, missing, 13]);
});

test('takes what the library writes by default for missing where no fill is stated', () => {
  // netCDF C library, netcdf.h: NC_FILL_SHORT is -32767.
  const file = new SmallFile().fill('wind_speed', 'short', Int16Array.of(12, -32767, 13));
  expect(flagsOf(file.swath())[1]).toEqual(['qualityUnknown']);
});

test('compares floating-point fills loosely: 1.e+30 as float and as double', () => {
  const file = new SmallFile().fill('wind_speed', 'float', Float32Array.of(12, 1e30, 13));
  expect(speedsOf(file.describe('wind_speed', { missing_value: Float64Array.of(1e30) }))).toEqual([12, missing, 13]);
});

test('takes packed values outside the valid range for missing', () => {
  const file = new SmallFile().fill('wind_speed', 'short', Int16Array.of(-1, 5000, 5001));
  file.describe('wind_speed', { scale_factor: Float64Array.of(0.01), valid_range: Int16Array.of(0, 5000) });
  expect(speedsOf(file)).toEqual([missing, 50, missing]);
});

test('does not apply a range of another type: unpacked floats keep the valid_max of their packed days', () => {
  const file = new SmallFile().describe('wind_speed', { valid_min: Int16Array.of(11), valid_max: Int16Array.of(5000) });
  expect(speedsOf(file)).toEqual([10, 11, 12]);
});

test('does not apply a range far beyond what the quantity can be: it is of another packing', () => {
  const file = new SmallFile().fill('lon', 'float', Float32Array.of(-10, 11, 12));
  file.describe('lon', { valid_min: Float32Array.of(0), valid_max: Float32Array.of(36_000_000) });
  expect(Array.from(file.swath().lon)).toEqual([-10, 11, 12]);
});

test('reads a signed byte as unsigned when _Unsigned says so', () => {
  const file = new SmallFile().fill('wind_speed', 'byte', Int8Array.of(10, -1, -56));
  file.describe('wind_speed', { _Unsigned: 'true', scale_factor: Float64Array.of(0.2), _FillValue: Int8Array.of(-1) });
  expect(speedsOf(file)).toEqual([2, missing, 40]);
});

test('reads a signed byte as unsigned when its valid range says so (CF conventions 2.2)', () => {
  const file = new SmallFile().fill('wind_speed', 'byte', Int8Array.of(10, -1, -56));
  file.describe('wind_speed', { scale_factor: Float64Array.of(0.2), valid_range: Int16Array.of(0, 254) });
  expect(speedsOf(file)).toEqual([2, missing, 40]);
});

test('reads a scale factor that was written as text', () => {
  const file = new SmallFile().fill('wind_speed', 'short', Int16Array.of(100, 110, 120));
  expect(speedsOf(file.describe('wind_speed', { scale_factor: '0.1' }))).toEqual([10, 11, 12]);
});

test('reads every row of a swath longer than one chunk', () => {
  const rows = 1500;
  const file = new SmallFile();
  file.content.dimensions[0].length = rows;
  const count = (first: number) => Float64Array.from({ length: rows * 3 }, (_, cell) => first + (cell % 50));
  for (const name of ['time', 'lat', 'lon', 'wind_speed', 'wind_dir']) file.fill(name, 'double', count(10));
  expect(Array.from(file.swath().speedMs)).toEqual(Array.from(count(10)));
});

test('brings knots and kilometres an hour to metres per second', () => {
  // 1 kt is 1852/3600 m/s.
  expect(speedsOf(new SmallFile().describe('wind_speed', { units: 'knots' }))[0]).toBe(5.144);
  expect(speedsOf(new SmallFile().describe('wind_speed', { units: 'km h-1' }))[0]).toBe(2.778);
});

test.each(['', 'furlong'])("refuses a speed whose unit is '%s' rather than to guess", (units) => {
  expect(new SmallFile().describe('wind_speed', { units }).refusal().code).toBe('unsupported-format');
});

test('takes a speed that no wind has out, flags and tells it', () => {
  const { swaths, problems } = new SmallFile().fill('wind_speed', 'float', Float32Array.of(-1, 327, 12)).read();
  expect(flagsOf(swaths[0]).map((flags) => flags.includes('outOfRange'))).toEqual([true, true, false]);
  expect(Array.from(swaths[0].speedMs)).toEqual([missing, missing, 12]);
  expect(problems.map(({ code }) => code)).toEqual(['values-out-of-range']);
});
