import { Problem } from '../../../problems/problem.ts';
import { copyValues } from './copy-values.ts';
import { type NetcdfArray, netcdfTypes } from './netcdf-types.ts';
import type { NetcdfHeader, NetcdfVariable } from './read-netcdf-header.ts';

/** All values of a variable in its own type, rows first; Problem 'truncated' when the file does not hold them. */
export function readVariable(bytes: Uint8Array, header: NetcdfHeader, variable: NetcdfVariable): NetcdfArray {
  checkExtent(bytes, header, variable);
  const count = variable.runs * variable.runLength;
  const target = netcdfTypes[variable.type].create(count);
  copyRange(bytes, header, variable, 0, count, target);
  return target;
}

/**
 * Some values of a variable as numbers, neither scaled nor masked, as many as the target holds, from the value of an
 * index on (rows first). Of 64-bit integers the nearest number. Problem 'truncated' when the file does not hold the
 * whole variable.
 */
export function readNumbers(
  bytes: Uint8Array,
  header: NetcdfHeader,
  variable: NetcdfVariable,
  first: number,
  target: Float64Array,
): void {
  checkExtent(bytes, header, variable);
  if (first + target.length > variable.runs * variable.runLength) throw new RangeError(`${variable.name} is shorter`);
  copyRange(bytes, header, variable, first, target.length, target);
}

/** A Problem 'truncated' when the file does not reach as far as its header says; to be asked before memory is taken. */
export function checkExtent(bytes: Uint8Array, header: NetcdfHeader, variable: NetcdfVariable): void {
  if (variable.runs === 0 || variable.runLength === 0) return;
  const runBytes = variable.runLength * netcdfTypes[variable.type].byteLength;
  const end = variable.begin + (variable.runs - 1) * header.recordStride + runBytes;
  if (!(end <= bytes.length)) {
    throw new Problem(
      'truncated',
      `The values of ${variable.name} should reach to byte ${end}, but the file ends at byte ${bytes.length}.`,
      { file: header.fileName, part: `variable ${variable.name}`, byte: variable.begin },
    );
  }
}

/** Copies values run by run: a record variable's records lie apart, any other variable is one run. */
function copyRange(
  bytes: Uint8Array,
  header: NetcdfHeader,
  variable: NetcdfVariable,
  first: number,
  count: number,
  target: NetcdfArray,
): void {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const { byteLength } = netcdfTypes[variable.type];
  let copied = 0;
  while (copied < count) {
    const run = Math.floor((first + copied) / variable.runLength);
    const within = (first + copied) % variable.runLength;
    const length = Math.min(count - copied, variable.runLength - within);
    const byteOffset = variable.begin + run * header.recordStride + within * byteLength;
    copyValues(view, byteOffset, length, variable.type, target, copied);
    copied += length;
  }
}
