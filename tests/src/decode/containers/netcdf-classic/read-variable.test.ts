import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { readNetcdfHeader } from '../../../../../src/decode/containers/netcdf-classic/read-netcdf-header.ts';
import { readNumbers, readVariable } from '../../../../../src/decode/containers/netcdf-classic/read-variable.ts';
import { Problem } from '../../../../../src/problems/problem.ts';

// Expected values: the .cdl text (or, for every type, the script) that the netCDF C library made these files from.
const fixture = (name: string) =>
  new Uint8Array(readFileSync(new URL(`../../../../fixtures/netcdf/${name}`, import.meta.url)));

function find(bytes: Uint8Array, variableName: string) {
  const header = readNetcdfHeader(bytes, 'test.nc');
  const variable = header.variables.find(({ name }) => name === variableName);
  if (!variable) throw new Error(`no ${variableName}`);
  return { header, variable };
}

function valuesOf(bytes: Uint8Array, variableName: string) {
  const { header, variable } = find(bytes, variableName);
  return readVariable(bytes, header, variable);
}

function numbersOf(bytes: Uint8Array, variableName: string, first: number, count: number) {
  const { header, variable } = find(bytes, variableName);
  const target = new Float64Array(count);
  readNumbers(bytes, header, variable, first, target);
  return target;
}

for (const version of [1, 2, 5]) {
  const bytes = fixture(`records-cdf${version}.nc`);

  test(`reads signed bytes of CDF-${version} records without their padding`, () => {
    expect(valuesOf(bytes, 'look')).toEqual(Int8Array.of(-1, 2, -128));
  });

  test(`reads rows of shorts of CDF-${version} records in order`, () => {
    expect(valuesOf(bytes, 'level')).toEqual(Int16Array.of(1, 2, 3, -4, -5, -6, 700, -32767, 32767));
  });

  test(`reads fixed text of CDF-${version} to its last character`, () => {
    expect(new TextDecoder().decode(valuesOf(bytes, 'word') as Uint8Array<ArrayBuffer>)).toBe('north');
  });

  test(`reads fixed numbers, record numbers and a single number of CDF-${version}`, () => {
    expect(valuesOf(bytes, 'height')).toEqual(Int32Array.of(-1, 0, 2147483647));
    expect(valuesOf(bytes, 'when')).toEqual(Float64Array.of(1.5, 2.5, -3.25));
    expect(valuesOf(bytes, 'zero')).toEqual(Float32Array.of(0.125));
  });
}

test('reads a single record variable, whose records are not padded', () => {
  expect(valuesOf(fixture('one-record-variable.nc'), 'level')).toEqual(Int16Array.of(1, -2, 3, -4, 5));
});

test('reads every type of CDF-5 to its limits', () => {
  const bytes = fixture('every-type.nc');
  expect(valuesOf(bytes, 'a')).toEqual(Int8Array.of(-128, 127));
  expect(valuesOf(bytes, 'b')).toEqual(Uint8Array.of(0, 255));
  expect(valuesOf(bytes, 'c')).toEqual(Int16Array.of(-32768, 32767));
  expect(valuesOf(bytes, 'd')).toEqual(Uint16Array.of(0, 65535));
  expect(valuesOf(bytes, 'e')).toEqual(Int32Array.of(-2147483648, 2147483647));
  expect(valuesOf(bytes, 'f')).toEqual(Uint32Array.of(0, 4294967295));
  expect(valuesOf(bytes, 'g')).toEqual(BigInt64Array.of(-9223372036854775807n, 9223372036854775807n));
  expect(valuesOf(bytes, 'h')).toEqual(BigUint64Array.of(0n, 18446744073709551615n));
  expect(valuesOf(bytes, 'i')).toEqual(Float32Array.of(-1.5, 3.25));
  expect(valuesOf(bytes, 'j')).toEqual(Float64Array.of(-1e300, 1e-300));
  expect(valuesOf(bytes, 'k')).toEqual(new TextEncoder().encode('no'));
});

test('gives any type as plain numbers on request', () => {
  const bytes = fixture('every-type.nc');
  expect(numbersOf(bytes, 'a', 0, 2)).toEqual(Float64Array.of(-128, 127));
  expect(numbersOf(bytes, 'f', 0, 2)).toEqual(Float64Array.of(0, 4294967295));
  expect(numbersOf(bytes, 'h', 1, 1)).toEqual(Float64Array.of(2 ** 64));
});

test('gives a stretch of numbers that begins and ends in the middle of records', () => {
  expect(numbersOf(fixture('records-cdf1.nc'), 'level', 2, 5)).toEqual(Float64Array.of(3, -4, -5, -6, 700));
});

test('refuses a stretch that is longer than the variable', () => {
  expect(() => numbersOf(fixture('records-cdf1.nc'), 'level', 5, 5)).toThrow('level is shorter');
});

test('reads from bytes that lie inside a larger buffer', () => {
  const bytes = fixture('records-cdf1.nc');
  const larger = new Uint8Array(bytes.length + 3);
  larger.set(bytes, 3);
  expect(valuesOf(larger.subarray(3), 'height')).toEqual(Int32Array.of(-1, 0, 2147483647));
});

test('names the variable and the byte when the file ends before the values do', () => {
  const bytes = fixture('records-cdf1.nc');
  const cut = bytes.subarray(0, bytes.length - 1);
  const { begin } = readNetcdfHeader(cut, 'test.nc').variables.find(({ name }) => name === 'when') ?? {};
  expect(() => valuesOf(cut, 'when')).toThrow(Problem);
  expect(() => valuesOf(cut, 'when')).toThrow(
    expect.objectContaining({ code: 'truncated', place: { file: 'test.nc', part: 'variable when', byte: begin } }),
  );
});

test('takes no memory for a number of records that the file cannot hold', () => {
  const bytes = fixture('records-cdf1.nc');
  new DataView(bytes.buffer).setUint32(4, 0x7fffffff);
  expect(() => valuesOf(bytes, 'when')).toThrow(expect.objectContaining({ code: 'truncated' }));
});

test('still reads the variables that are whole in a file that is cut off', () => {
  const bytes = fixture('records-cdf1.nc');
  expect(valuesOf(bytes.subarray(0, bytes.length - 1), 'height')).toEqual(Int32Array.of(-1, 0, 2147483647));
});
