import type { NetcdfArray, NetcdfType } from './netcdf-types.ts';

/**
 * Copies a run of big-endian values of one type from a file into an array, from an index on. The array holds the type
 * itself or, for any type, is a Float64Array (64-bit integers then come as the nearest number). The caller has checked
 * that the bytes are there.
 */
export function copyValues(
  view: DataView,
  byteOffset: number,
  count: number,
  type: NetcdfType,
  target: NetcdfArray,
  start: number,
): void {
  // A loop for each type: V8 makes each one tight, where a shared one would be slow for all.
  switch (type) {
    case 'byte':
      for (let i = 0; i < count; i++) target[start + i] = view.getInt8(byteOffset + i);
      return;
    case 'char':
    case 'ubyte':
      for (let i = 0; i < count; i++) target[start + i] = view.getUint8(byteOffset + i);
      return;
    case 'short':
      for (let i = 0; i < count; i++) target[start + i] = view.getInt16(byteOffset + 2 * i);
      return;
    case 'ushort':
      for (let i = 0; i < count; i++) target[start + i] = view.getUint16(byteOffset + 2 * i);
      return;
    case 'int':
      for (let i = 0; i < count; i++) target[start + i] = view.getInt32(byteOffset + 4 * i);
      return;
    case 'uint':
      for (let i = 0; i < count; i++) target[start + i] = view.getUint32(byteOffset + 4 * i);
      return;
    case 'float':
      for (let i = 0; i < count; i++) target[start + i] = view.getFloat32(byteOffset + 4 * i);
      return;
    case 'double':
      for (let i = 0; i < count; i++) target[start + i] = view.getFloat64(byteOffset + 8 * i);
      return;
    case 'int64':
      for (let i = 0; i < count; i++) store64(target, start + i, view.getBigInt64(byteOffset + 8 * i));
      return;
    case 'uint64':
      for (let i = 0; i < count; i++) store64(target, start + i, view.getBigUint64(byteOffset + 8 * i));
  }
}

function store64(target: NetcdfArray, index: number, value: bigint): void {
  if (target instanceof BigInt64Array || target instanceof BigUint64Array) target[index] = value;
  else target[index] = Number(value);
}
