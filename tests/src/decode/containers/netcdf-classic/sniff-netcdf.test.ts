import { expect, test } from 'vitest';
import {
  isHdf4,
  isHdf5,
  isNetcdfClassic,
  refuseOtherNetcdf,
} from '../../../../../src/decode/containers/netcdf-classic/sniff-netcdf.ts';

const hdf5Signature = [0x89, 0x48, 0x44, 0x46, 0x0d, 0x0a, 0x1a, 0x0a];

test('knows the three classic versions and no other', () => {
  const versions = [1, 2, 3, 4, 5].filter((version) => isNetcdfClassic(Uint8Array.of(0x43, 0x44, 0x46, version)));
  expect(versions).toEqual([1, 2, 5]);
});

test('knows HDF5, at the start and after a user block', () => {
  const afterBlock = new Uint8Array(1100);
  afterBlock.set(hdf5Signature, 1024);
  expect(isHdf5(Uint8Array.from(hdf5Signature))).toBe(true);
  expect(isHdf5(afterBlock)).toBe(true);
  expect(isHdf5(new Uint8Array(1100))).toBe(false);
});

test('refuses netCDF-4 and HDF4 by name and lets anything else pass', () => {
  const hdf4 = Uint8Array.of(0x0e, 0x03, 0x13, 0x01);
  expect(isHdf4(hdf4)).toBe(true);
  expect(refuseOtherNetcdf(hdf4, 'a.hdf')?.message).toContain('HDF4 file');
  expect(refuseOtherNetcdf(Uint8Array.from(hdf5Signature), 'a.nc')?.message).toContain('netCDF-4 (HDF5) file');
  expect(refuseOtherNetcdf(Uint8Array.from(hdf5Signature), 'a.nc')?.code).toBe('unsupported-format');
  expect(refuseOtherNetcdf(Uint8Array.of(0x42, 0x55, 0x46, 0x52), 'a.bufr')).toBeNull();
});
