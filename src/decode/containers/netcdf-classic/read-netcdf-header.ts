import { ByteReader } from '../../../bytes/byte-reader.ts';
import { copyValues } from './copy-values.ts';
import { type NetcdfType, type NetcdfValue, netcdfTypeOf, netcdfTypes } from './netcdf-types.ts';

/** A dimension; the length of the unlimited one is the number of records. */
export interface NetcdfDimension {
  name: string;
  length: number;
  isUnlimited: boolean;
}

/** A variable as the header describes it; its values are read by readVariable. */
export interface NetcdfVariable {
  name: string;
  type: NetcdfType;
  dimensions: NetcdfDimension[];
  attributes: Map<string, NetcdfValue>;
  /** Byte of the first value, from the start of the file. */
  begin: number;
  /** Values in the whole variable, or in one record of a record variable. */
  runLength: number;
  /** 1, or for a record variable the number of records. */
  runs: number;
}

/** The header of a netCDF classic file. */
export interface NetcdfHeader {
  fileName: string;
  /** 1 is CDF-1 (classic), 2 is CDF-2 (64-bit offset), 5 is CDF-5 (64-bit data). */
  version: 1 | 2 | 5;
  dimensions: NetcdfDimension[];
  attributes: Map<string, NetcdfValue>;
  variables: NetcdfVariable[];
  /** Bytes from one record to the next. */
  recordStride: number;
}

// The grammar followed here: netCDF Users Guide, appendix B "File Format Specifications", The Classic Format.
const NC_DIMENSION = 0x0a;
const NC_VARIABLE = 0x0b;
const NC_ATTRIBUTE = 0x0c;

/**
 * The header of a netCDF classic file of any of its three versions. Sizes that cannot be true are a Problem
 * ('truncated' or 'damaged') with the part and byte; a variable whose values are cut off is told by readVariable.
 */
export function readNetcdfHeader(bytes: Uint8Array, fileName: string): NetcdfHeader {
  const reader = new ByteReader(bytes, fileName);
  reader.part = 'header';
  const magic = reader.uint32();
  const version = magic & 0xff;
  if (magic >>> 8 !== 0x434446 || (version !== 1 && version !== 2 && version !== 5)) {
    throw reader.damaged('it does not begin with CDF and a version 1, 2 or 5', 0);
  }
  const grammar = new HeaderGrammar(reader, version);
  const statedRecords = grammar.recordCount();
  const dimensions = grammar.list(NC_DIMENSION, 'dimension', () => grammar.dimension());
  if (dimensions.filter((dimension) => dimension.isUnlimited).length > 1) {
    throw reader.damaged('it has more than one unlimited dimension');
  }
  const attributes = grammar.attributes();
  const variables = grammar.list(NC_VARIABLE, 'variable', () => grammar.variable(dimensions));
  for (const variable of variables) {
    if (variable.runLength > 0 && variable.begin < reader.position) {
      reader.part = `variable ${variable.name}`;
      throw reader.damaged(`its values are said to begin inside the header, at byte ${variable.begin}`);
    }
  }

  const recordVariables = variables.filter(isRecordVariable);
  const recordStride = measureRecordStride(recordVariables);
  const records = statedRecords ?? countRecords(bytes.length, recordVariables, recordStride);
  for (const dimension of dimensions) if (dimension.isUnlimited) dimension.length = records;
  for (const variable of recordVariables) variable.runs = records;
  return { fileName, version, dimensions, attributes, variables, recordStride };
}

/** Whether a variable grows along the unlimited dimension, which is then its first. */
function isRecordVariable(variable: NetcdfVariable): boolean {
  return variable.dimensions[0]?.isUnlimited ?? false;
}

/**
 * Each variable's part of a record is padded to 4 bytes, but for a single record variable: "in the special case of
 * only one record variable of type byte, char or short (ubyte, ushort), no padding is used between records".
 */
function measureRecordStride(variables: NetcdfVariable[]): number {
  const sizes = variables.map((variable) => variable.runLength * netcdfTypes[variable.type].byteLength);
  return sizes.length === 1 ? sizes[0] : sizes.reduce((sum, size) => sum + Math.ceil(size / 4) * 4, 0);
}

/** The whole records there are in a file whose writer left their number open (numrecs = STREAMING). */
function countRecords(fileLength: number, variables: NetcdfVariable[], stride: number): number {
  if (stride === 0) return 0;
  const begin = Math.min(...variables.map((variable) => variable.begin));
  return Math.max(0, Math.floor((fileLength - begin) / stride));
}

/** The productions of the grammar, each reading itself from where the reader stands. */
class HeaderGrammar {
  private readonly reader: ByteReader;
  private readonly version: 1 | 2 | 5;

  constructor(reader: ByteReader, version: 1 | 2 | 5) {
    this.reader = reader;
    this.version = version;
  }

  /** numrecs = NON_NEG | STREAMING, the latter undefined here. */
  recordCount(): number | undefined {
    const start = this.reader.position;
    const isStreaming = this.reader.view8(this.version === 5 ? 8 : 4).every((byte) => byte === 0xff);
    if (isStreaming) return undefined;
    this.reader.position = start;
    return this.nonNegative();
  }

  /** dim_list, att_list and var_list = ABSENT | tag nelems [item ...]. */
  list<Item>(tag: number, word: string, readItem: () => Item): Item[] {
    this.reader.part = `list of ${word}s`;
    const start = this.reader.position;
    const foundTag = this.reader.uint32();
    const count = this.nonNegative();
    if (foundTag !== tag && !(foundTag === 0 && count === 0)) {
      throw this.reader.damaged(`a ${word} list should stand here`, start);
    }
    const items: Item[] = [];
    for (let index = 0; index < count; index++) {
      this.reader.part = `${word} ${index + 1}`;
      items.push(readItem());
    }
    return items;
  }

  /** dim = name dim_length; a length of 0 marks the unlimited dimension. */
  dimension(): NetcdfDimension {
    const name = this.name();
    const length = this.nonNegative();
    return { name, length, isUnlimited: length === 0 };
  }

  attributes(): Map<string, NetcdfValue> {
    return new Map(this.list(NC_ATTRIBUTE, 'attribute', () => this.attribute()));
  }

  /** attr = name nc_type nelems [values ...], padded to 4 bytes. Text loses the zero bytes some writers end it with. */
  private attribute(): [string, NetcdfValue] {
    const name = this.name();
    this.reader.part = `attribute ${name}`;
    const type = this.type();
    const count = this.nonNegative();
    const values = this.padded(count * netcdfTypes[type].byteLength);
    if (type === 'char') return [name, decodeText(values).replace(/\0+$/, '')];
    const array = netcdfTypes[type].create(count);
    copyValues(new DataView(values.buffer, values.byteOffset, values.byteLength), 0, count, type, array, 0);
    return [name, array];
  }

  /** var = name nelems [dimid ...] vatt_list nc_type vsize begin. vsize is redundant and may overflow: not used. */
  variable(dimensions: NetcdfDimension[]): NetcdfVariable {
    const name = this.name();
    this.reader.part = `variable ${name}`;
    const rank = this.nonNegative();
    const own: NetcdfDimension[] = [];
    for (let index = 0; index < rank; index++) {
      const start = this.reader.position;
      const dimension = dimensions[this.nonNegative()];
      if (!dimension) throw this.reader.damaged('it names a dimension that is not there', start);
      if (dimension.isUnlimited && index > 0) {
        throw this.reader.damaged('its unlimited dimension is not its first', start);
      }
      own.push(dimension);
    }
    const attributes = this.attributes();
    this.reader.part = `variable ${name}`;
    const type = this.type();
    this.size();
    const begin = this.version === 1 ? this.reader.uint32() : this.reader.uint64();
    const runLength = own.reduce((product, dimension) => product * (dimension.isUnlimited ? 1 : dimension.length), 1);
    return { name, type, dimensions: own, attributes, begin, runLength, runs: 1 };
  }

  /** name = nelems namestring, UTF-8, padded to 4 bytes. */
  private name(): string {
    return decodeText(this.padded(this.nonNegative()));
  }

  private type(): NetcdfType {
    const start = this.reader.position;
    const code = this.reader.uint32();
    const type = netcdfTypeOf(code, this.version);
    if (!type) throw this.reader.damaged(`CDF-${this.version} has no type ${code}`, start);
    return type;
  }

  /** NON_NEG: a signed size of 4 bytes, in CDF-5 of 8, that must not be negative. */
  private nonNegative(): number {
    const start = this.reader.position;
    const value = this.size();
    if (this.version < 5 && value > 0x7fffffff) throw this.reader.damaged(`a size is negative`, start);
    return value;
  }

  private size(): number {
    return this.version === 5 ? this.reader.uint64() : this.reader.uint32();
  }

  private padded(length: number): Uint8Array {
    const bytes = this.reader.view8(length);
    this.reader.take((4 - (length % 4)) % 4);
    return bytes;
  }
}

const utf8 = new TextDecoder('utf-8', { fatal: true });
const latin1 = new TextDecoder('latin1');

/** Text is UTF-8 by the specification; what is not valid as that is read as Latin-1, which older writers used. */
function decodeText(bytes: Uint8Array): string {
  try {
    return utf8.decode(bytes);
  } catch {
    return latin1.decode(bytes);
  }
}
