import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { encodeNetcdf, type NetcdfContent } from '../../../src/demo/encode-netcdf.ts';

// The expected bytes are files made by ncgen (netCDF C library 4.9.0) from the .cdl text beside them.
const fixture = (name: string) =>
  new Uint8Array(readFileSync(new URL(`../../fixtures/netcdf/${name}`, import.meta.url)));
const ascii = (text: string) => new TextEncoder().encode(text);

const records: Omit<NetcdfContent, 'version'> = {
  dimensions: [
    { name: 'time', length: 3, isUnlimited: true },
    { name: 'beam', length: 3 },
    { name: 'letters', length: 5 },
  ],
  attributes: { title: 'a seå of räin', levels: Int32Array.of(1, 2, 3), gain: Float32Array.of(0.5, 1.5) },
  variables: [
    {
      name: 'look',
      type: 'byte',
      dimensions: ['time'],
      attributes: { valid_range: Int8Array.of(-100, 100) },
      values: Int8Array.of(-1, 2, -128),
    },
    {
      name: 'level',
      type: 'short',
      dimensions: ['time', 'beam'],
      attributes: { _FillValue: Int16Array.of(-32767), scale_factor: Float64Array.of(0.01) },
      values: Int16Array.of(1, 2, 3, -4, -5, -6, 700, -32767, 32767),
    },
    { name: 'word', type: 'char', dimensions: ['letters'], attributes: {}, values: ascii('north') },
    {
      name: 'height',
      type: 'int',
      dimensions: ['beam'],
      attributes: { units: 'm' },
      values: Int32Array.of(-1, 0, 2147483647),
    },
    {
      name: 'when',
      type: 'double',
      dimensions: ['time'],
      attributes: { units: 'seconds since 1990-01-01' },
      values: Float64Array.of(1.5, 2.5, -3.25),
    },
    { name: 'zero', type: 'float', dimensions: [], attributes: {}, values: Float32Array.of(0.125) },
  ],
};

for (const version of [1, 2, 5] as const) {
  test(`writes CDF-${version} with records, padding and fills byte for byte as the netCDF C library does`, () => {
    expect(encodeNetcdf({ version, ...records })).toEqual(fixture(`records-cdf${version}.nc`));
  });
}

test('writes a single record variable without padding between its records', () => {
  const bytes = encodeNetcdf({
    version: 1,
    dimensions: [
      { name: 'time', length: 5, isUnlimited: true },
      { name: 'fixed', length: 2 },
    ],
    attributes: {},
    variables: [
      { name: 'level', type: 'short', dimensions: ['time'], attributes: {}, values: Int16Array.of(1, -2, 3, -4, 5) },
      { name: 'height', type: 'int', dimensions: ['fixed'], attributes: {}, values: Int32Array.of(6, 7) },
    ],
  });
  expect(bytes).toEqual(fixture('one-record-variable.nc'));
});

test('writes every type of CDF-5 byte for byte as the netCDF C library does', () => {
  const variable = (
    name: string,
    type: NetcdfContent['variables'][0]['type'],
    values: NetcdfContent['variables'][0]['values'],
  ) => ({
    name,
    type,
    dimensions: ['n'],
    attributes: {},
    values,
  });
  const bytes = encodeNetcdf({
    version: 5,
    dimensions: [{ name: 'n', length: 2 }],
    attributes: { small: Uint8Array.of(200), wide: BigInt64Array.of(-9007199254740993n) },
    variables: [
      variable('a', 'byte', Int8Array.of(-128, 127)),
      variable('b', 'ubyte', Uint8Array.of(0, 255)),
      variable('c', 'short', Int16Array.of(-32768, 32767)),
      variable('d', 'ushort', Uint16Array.of(0, 65535)),
      variable('e', 'int', Int32Array.of(-2147483648, 2147483647)),
      variable('f', 'uint', Uint32Array.of(0, 4294967295)),
      variable('g', 'int64', BigInt64Array.of(-9223372036854775807n, 9223372036854775807n)),
      variable('h', 'uint64', BigUint64Array.of(0n, 18446744073709551615n)),
      variable('i', 'float', Float32Array.of(-1.5, 3.25)),
      variable('j', 'double', Float64Array.of(-1e300, 1e-300)),
      variable('k', 'char', ascii('no')),
    ],
  });
  expect(bytes).toEqual(fixture('every-type.nc'));
});

test('refuses a type that the version of the file does not have', () => {
  const encode = () =>
    encodeNetcdf({ version: 1, dimensions: [], attributes: { small: Uint8Array.of(1) }, variables: [] });
  expect(encode).toThrow('CDF-1 has no type ubyte');
});
