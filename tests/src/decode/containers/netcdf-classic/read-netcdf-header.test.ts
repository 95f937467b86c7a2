import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { readNetcdfHeader } from '../../../../../src/decode/containers/netcdf-classic/read-netcdf-header.ts';
import { encodeNetcdf } from '../../../../../src/demo/encode-netcdf.ts';
import { Problem } from '../../../../../src/problems/problem.ts';

// Expected values: the .cdl text that the netCDF C library's ncgen made these files from.
const fixture = (name: string) =>
  new Uint8Array(readFileSync(new URL(`../../../../fixtures/netcdf/${name}`, import.meta.url)));
const headerOf = (name: string) => readNetcdfHeader(fixture(name), name);

/** A small CDF-1 file: the byte offsets in the tests below are those of the grammar, counted by hand. */
const smallFile = () =>
  encodeNetcdf({
    version: 1,
    dimensions: [{ name: 'cell', length: 4 }],
    attributes: {},
    variables: [{ name: 'w', type: 'short', dimensions: ['cell'], attributes: {}, values: Int16Array.of(1, 2, 3, 4) }],
  });
// magic 0, numrecs 4, dim tag 8, dims 12, name length 16, 'cell' 20, length 24, no attributes 28 to 35,
// var tag 36, vars 40, name length 44, 'w' 48, rank 52, dimid 56, no attributes 60 to 67, type 68, vsize 72, begin 76.
const DIMENSIONS = 12;
const DIMENSION_LENGTH = 24;
const DIMENSION_ID = 56;
const TYPE = 68;
const BEGIN = 76;

function problemWith(byteOffset: number, value: number): Problem {
  const bytes = smallFile();
  new DataView(bytes.buffer).setUint32(byteOffset, value);
  return problemOf(() => readNetcdfHeader(bytes, 'small.nc'));
}

function problemOf(act: () => unknown): Problem {
  try {
    act();
  } catch (thrown) {
    if (thrown instanceof Problem) return thrown;
  }
  throw new Error('no Problem was thrown');
}

for (const version of [1, 2, 5] as const) {
  test(`reads the dimensions of CDF-${version}, the unlimited one with its number of records`, () => {
    expect(headerOf(`records-cdf${version}.nc`).dimensions).toEqual([
      { name: 'time', length: 3, isUnlimited: true },
      { name: 'beam', length: 3, isUnlimited: false },
      { name: 'letters', length: 5, isUnlimited: false },
    ]);
  });
}

test('reads text attributes as UTF-8, to the last character', () => {
  expect(headerOf('records-cdf1.nc').attributes.get('title')).toBe('a seå of räin');
});

test('reads text that is not UTF-8 as Latin-1', () => {
  const bytes = encodeNetcdf({ version: 1, dimensions: [], attributes: { title: 'abcd' }, variables: [] });
  bytes.set([0x53, 0x65, 0xe5, 0x21], bytes.length - 12);
  expect(readNetcdfHeader(bytes, 'old.nc').attributes.get('title')).toBe('Seå!');
});

test('gives number attributes in their own type', () => {
  const { attributes, variables } = headerOf('records-cdf1.nc');
  expect(attributes.get('levels')).toEqual(Int32Array.of(1, 2, 3));
  expect(attributes.get('gain')).toEqual(Float32Array.of(0.5, 1.5));
  expect(variables[0].attributes.get('valid_range')).toEqual(Int8Array.of(-100, 100));
  expect(headerOf('every-type.nc').attributes.get('wide')).toEqual(BigInt64Array.of(-9007199254740993n));
});

test('counts the whole records itself when the writer left their number open', () => {
  const bytes = fixture('records-cdf1.nc');
  new DataView(bytes.buffer).setUint32(4, 0xffffffff);
  const { dimensions } = readNetcdfHeader(bytes.subarray(0, bytes.length - 1), 'open.nc');
  expect(dimensions[0].length).toBe(2);
});

test('says where a header is cut off', () => {
  const problem = problemOf(() => readNetcdfHeader(smallFile().subarray(0, 46), 'small.nc'));
  expect(problem.code).toBe('truncated');
  expect(problem.place).toEqual({ file: 'small.nc', part: 'variable 1', byte: 44 });
});

test('refuses a list longer than the file without taking memory for it', () => {
  expect(problemWith(DIMENSIONS, 0x7fffffff).code).toBe('truncated');
});

test('refuses a negative length', () => {
  const problem = problemWith(DIMENSION_LENGTH, 0x80000001);
  expect(problem.place).toEqual({ file: 'small.nc', part: 'dimension 1', byte: DIMENSION_LENGTH });
});

test('refuses a dimension that is not there', () => {
  expect(problemWith(DIMENSION_ID, 7).place).toEqual({ file: 'small.nc', part: 'variable w', byte: DIMENSION_ID });
});

test('refuses a type that the version does not have', () => {
  expect(problemWith(TYPE, 10).message).toContain('CDF-1 has no type 10');
});

test('refuses values that are said to begin inside the header', () => {
  expect(problemWith(BEGIN, 20).place.part).toBe('variable w');
});

test('refuses a version that does not exist', () => {
  expect(problemWith(0, 0x43444603).code).toBe('damaged');
});

test('says truncated, and nothing else, wherever a header is cut', () => {
  const bytes = fixture('records-cdf5.nc');
  const dataBegin = Math.min(...headerOf('records-cdf5.nc').variables.map((variable) => variable.begin));
  const codes = new Set<string>();
  for (let length = 0; length < dataBegin; length++) {
    codes.add(problemOf(() => readNetcdfHeader(bytes.subarray(0, length), 'cut.nc')).code);
  }
  expect([...codes]).toEqual(['truncated']);
});
