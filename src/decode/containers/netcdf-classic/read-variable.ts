import { Problem } from '../../../problems/problem.ts';
import { copyValues } from './copy-values.ts';
import { type NetcdfArray, netcdfTypes } from './netcdf-types.ts';
import type { NetcdfHeader, NetcdfVariable } from './read-netcdf-header.ts';

/** All values of a variable in its own type, rows first; Problem 'truncated' when the file does not hold them. */
export function readVariable(bytes: Uint8Array, header: NetcdfHeader, variable: NetcdfVariable): NetcdfArray {
  checkExtent(bytes, header, variable);
  const target = netcdfTypes[variable.type].create(variable.runs * variable.runLength);
  copyRuns(bytes, header, variable, target);
  return target;
}

/**
 * All values of a variable as numbers, rows first, neither scaled nor masked. One array type for every variable keeps
 * the loops after it fast. Of 64-bit integers the nearest number.
 */
export function readVariableAsNumbers(
  bytes: Uint8Array,
  header: NetcdfHeader,
  variable: NetcdfVariable,
): Float64Array<ArrayBuffer> {
  checkExtent(bytes, header, variable);
  const target = new Float64Array(variable.runs * variable.runLength);
  copyRuns(bytes, header, variable, target);
  return target;
}

/** Asks whether the file reaches as far as the header says, before any memory is taken for it. */
function checkExtent(bytes: Uint8Array, header: NetcdfHeader, variable: NetcdfVariable): void {
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

function copyRuns(bytes: Uint8Array, header: NetcdfHeader, variable: NetcdfVariable, target: NetcdfArray): void {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  for (let run = 0; run < variable.runs; run++) {
    const byteOffset = variable.begin + run * header.recordStride;
    copyValues(view, byteOffset, variable.runLength, variable.type, target, run * variable.runLength);
  }
}
