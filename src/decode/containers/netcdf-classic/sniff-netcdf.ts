import { Problem } from '../../../problems/problem.ts';

/** Whether bytes begin as a netCDF classic file does: 'CDF' and version 1, 2 or 5. */
export function isNetcdfClassic(bytes: Uint8Array): boolean {
  return beginsWith(bytes, 0, [0x43, 0x44, 0x46]) && [1, 2, 5].includes(bytes[3]);
}

/** Whether bytes are HDF5, the container of netCDF-4. Its signature stands at byte 0 or, after a user block, at 512, 1024, 2048 and so on (HDF5 File Format Specification, II.A). */
export function isHdf5(bytes: Uint8Array): boolean {
  for (let start = 0; start < bytes.length; start = start === 0 ? 512 : start * 2) {
    if (beginsWith(bytes, start, [0x89, 0x48, 0x44, 0x46, 0x0d, 0x0a, 0x1a, 0x0a])) return true;
  }
  return false;
}

/** Whether bytes are HDF4, a format of its own and no kin of HDF5 (HDF Specification, magic number 0e 03 13 01). */
export function isHdf4(bytes: Uint8Array): boolean {
  return beginsWith(bytes, 0, [0x0e, 0x03, 0x13, 0x01]);
}

/** A Problem that names the format, for a relative of netCDF classic that we cannot read; null for anything else. */
export function refuseOtherNetcdf(bytes: Uint8Array, fileName: string): Problem | null {
  const name = isHdf5(bytes) ? 'netCDF-4 (HDF5)' : isHdf4(bytes) ? 'HDF4' : null;
  if (!name) return null;
  const sentence = `This is a ${name} file, which Crosstrack cannot read. It reads netCDF classic: CDF-1, CDF-2 and CDF-5.`;
  return new Problem('unsupported-format', sentence, { file: fileName, byte: 0 });
}

function beginsWith(bytes: Uint8Array, start: number, signature: number[]): boolean {
  return signature.every((byte, index) => bytes[start + index] === byte);
}
