/** The external types of the netCDF classic formats; the last five exist in CDF-5 only. */
export type NetcdfType =
  | 'byte'
  | 'char'
  | 'short'
  | 'int'
  | 'float'
  | 'double'
  | 'ubyte'
  | 'ushort'
  | 'uint'
  | 'int64'
  | 'uint64';

/** Values as the file holds them, in the machine's own byte order; characters are bytes. */
export type NetcdfArray =
  | Int8Array
  | Uint8Array
  | Int16Array
  | Uint16Array
  | Int32Array
  | Uint32Array
  | Float32Array
  | Float64Array
  | BigInt64Array
  | BigUint64Array;

/** An attribute: text, or one or more numbers. */
export type NetcdfValue = string | NetcdfArray;

interface TypeFacts {
  /** nc_type of the format specification. */
  code: number;
  byteLength: number;
  create: (length: number) => NetcdfArray;
  /** What the library writes where nobody wrote (NC_FILL_...); of 64-bit integers the nearest number. */
  defaultFill: number;
}

/**
 * Codes and sizes: netCDF Users Guide, appendix B "File Format Specifications", The Classic Format, nc_type.
 * Default fills: netCDF C library, netcdf.h, NC_FILL_BYTE to NC_FILL_UINT64.
 */
export const netcdfTypes: Record<NetcdfType, TypeFacts> = {
  byte: { code: 1, byteLength: 1, create: (length) => new Int8Array(length), defaultFill: -127 },
  char: { code: 2, byteLength: 1, create: (length) => new Uint8Array(length), defaultFill: 0 },
  short: { code: 3, byteLength: 2, create: (length) => new Int16Array(length), defaultFill: -32767 },
  int: { code: 4, byteLength: 4, create: (length) => new Int32Array(length), defaultFill: -2147483647 },
  float: { code: 5, byteLength: 4, create: (length) => new Float32Array(length), defaultFill: 9.969209968386869e36 },
  double: { code: 6, byteLength: 8, create: (length) => new Float64Array(length), defaultFill: 9.969209968386869e36 },
  ubyte: { code: 7, byteLength: 1, create: (length) => new Uint8Array(length), defaultFill: 255 },
  ushort: { code: 8, byteLength: 2, create: (length) => new Uint16Array(length), defaultFill: 65535 },
  uint: { code: 9, byteLength: 4, create: (length) => new Uint32Array(length), defaultFill: 4294967295 },
  int64: { code: 10, byteLength: 8, create: (length) => new BigInt64Array(length), defaultFill: -(2 ** 63) },
  uint64: {
    code: 11,
    byteLength: 8,
    create: (length) => new BigUint64Array(length),
    defaultFill: 2 ** 64,
  },
};

const typeOfCode = new Map(Object.entries(netcdfTypes).map(([type, { code }]) => [code, type as NetcdfType]));

/** The type of a code in a file of a version; undefined where that version has no such type. */
export function netcdfTypeOf(code: number, version: number): NetcdfType | undefined {
  return version < 5 && code > 6 ? undefined : typeOfCode.get(code);
}

/** The type whose values an array holds; a Uint8Array counts as ubyte, for text is a string. */
export function netcdfTypeOfArray(array: NetcdfArray): NetcdfType {
  if (array instanceof Int8Array) return 'byte';
  if (array instanceof Int16Array) return 'short';
  if (array instanceof Int32Array) return 'int';
  if (array instanceof Float32Array) return 'float';
  if (array instanceof Float64Array) return 'double';
  if (array instanceof Uint8Array) return 'ubyte';
  if (array instanceof Uint16Array) return 'ushort';
  if (array instanceof Uint32Array) return 'uint';
  return array instanceof BigInt64Array ? 'int64' : 'uint64';
}
