import {
  type NetcdfArray,
  type NetcdfType,
  type NetcdfValue,
  netcdfTypeOfArray,
  netcdfTypes,
} from '../decode/containers/netcdf-classic/netcdf-types.ts';

/** What a netCDF classic file is to hold. */
export interface NetcdfContent {
  /** 1 is CDF-1 (classic), 2 is CDF-2 (64-bit offset), 5 is CDF-5 (64-bit data). */
  version: 1 | 2 | 5;
  /** The unlimited dimension's length is the number of records; at most one may be unlimited. */
  dimensions: { name: string; length: number; isUnlimited?: boolean }[];
  /** Text, or numbers in the array type that is to be the attribute's. */
  attributes: Record<string, NetcdfValue>;
  variables: NetcdfContentVariable[];
}

export interface NetcdfContentVariable {
  name: string;
  type: NetcdfType;
  /** Names of its dimensions, slowest first; the unlimited one may only be the first. */
  dimensions: string[];
  attributes: Record<string, NetcdfValue>;
  /** All values, slowest dimension first. */
  values: NetcdfArray;
}

/**
 * The bytes of a netCDF classic file, as the netCDF C library lays it out: netCDF Users Guide, appendix B "File Format
 * Specifications", The Classic Format. Content that its version cannot hold is a plain error: it is ours.
 */
export function encodeNetcdf(content: NetcdfContent): Uint8Array<ArrayBuffer> {
  const unlimited = content.dimensions.find((dimension) => dimension.isUnlimited);
  const lengths = new Map(content.dimensions.map((dimension) => [dimension.name, dimension.length]));
  const plans = content.variables.map((variable) => planVariable(variable, lengths, unlimited?.name));
  const recordPlans = plans.filter((plan) => plan.isRecord);
  // The format's one exception: a single record variable is not padded between records.
  if (recordPlans.length === 1) recordPlans[0].stride = recordPlans[0].byteLength;

  const records = unlimited?.length ?? 0;
  let end = writeHeader(content, plans, records).length;
  for (const plan of plans) if (!plan.isRecord) end = placeAt(plan, end);
  const firstRecord = end;
  for (const plan of recordPlans) end = placeAt(plan, end);
  const recordStride = end - firstRecord;
  const total = firstRecord + records * recordStride;

  const bytes = new Uint8Array(total);
  bytes.set(writeHeader(content, plans, records));
  const view = new DataView(bytes.buffer);
  for (const plan of plans) {
    const runs = plan.isRecord ? records : 1;
    for (let run = 0; run < runs; run++) writeRun(view, plan, plan.begin + run * recordStride, run);
  }
  return bytes;
}

/** How a variable will lie in the file. */
interface VariablePlan {
  variable: NetcdfContentVariable;
  dimensionIds: number[];
  isRecord: boolean;
  /** Values in the variable, or in one record of it. */
  runLength: number;
  /** Their bytes, without and with padding. */
  byteLength: number;
  stride: number;
  begin: number;
}

function planVariable(
  variable: NetcdfContentVariable,
  lengths: Map<string, number>,
  unlimitedName: string | undefined,
): VariablePlan {
  const names = [...lengths.keys()];
  const isRecord = unlimitedName !== undefined && variable.dimensions[0] === unlimitedName;
  const fixed = variable.dimensions.slice(isRecord ? 1 : 0);
  const runLength = fixed.reduce((product, name) => product * (lengths.get(name) ?? Number.NaN), 1);
  const byteLength = runLength * netcdfTypes[variable.type].byteLength;
  const wanted = runLength * (isRecord ? (lengths.get(variable.dimensions[0]) ?? 0) : 1);
  if (variable.values.length !== wanted) {
    throw new RangeError(`${variable.name} has ${variable.values.length} values, its dimensions ask for ${wanted}`);
  }
  const dimensionIds = variable.dimensions.map((name) => names.indexOf(name));
  return { variable, dimensionIds, isRecord, runLength, byteLength, stride: Math.ceil(byteLength / 4) * 4, begin: 0 };
}

function placeAt(plan: VariablePlan, begin: number): number {
  plan.begin = begin;
  return begin + plan.stride;
}

function writeHeader(content: NetcdfContent, plans: VariablePlan[], records: number): Uint8Array {
  const writer = new HeaderWriter(content.version);
  writer.uint32(0x43444600 + content.version);
  writer.size(records);
  writer.list(0x0a, content.dimensions, ({ name, length, isUnlimited }) => {
    writer.name(name);
    writer.size(isUnlimited ? 0 : length);
  });
  writer.attributes(content.attributes);
  writer.list(0x0b, plans, (plan) => {
    writer.name(plan.variable.name);
    writer.size(plan.dimensionIds.length);
    for (const id of plan.dimensionIds) writer.size(id);
    writer.attributes(plan.variable.attributes);
    writer.type(plan.variable.type);
    writer.size(Math.ceil(plan.byteLength / 4) * 4);
    writer.offset(plan.begin);
  });
  return writer.bytes();
}

/** Writes one run of values and pads it, as the specification asks, with the variable's fill value. */
function writeRun(view: DataView, plan: VariablePlan, begin: number, run: number): void {
  const { type, values, attributes } = plan.variable;
  const size = netcdfTypes[type].byteLength;
  for (let i = 0; i < plan.runLength; i++) setValue(view, begin + i * size, type, values[run * plan.runLength + i]);
  const fill = attributes._FillValue;
  const padding = fill === undefined || typeof fill === 'string' ? netcdfTypes[type].defaultFill : fill[0];
  for (let at = plan.byteLength; at < plan.stride; at += size) setValue(view, begin + at, type, padding);
}

function setValue(view: DataView, byteOffset: number, type: NetcdfType, value: number | bigint): void {
  if (type === 'int64') view.setBigInt64(byteOffset, BigInt(value));
  else if (type === 'uint64') view.setBigUint64(byteOffset, BigInt(value));
  else if (type === 'double') view.setFloat64(byteOffset, Number(value));
  else if (type === 'float') view.setFloat32(byteOffset, Number(value));
  else if (type === 'int' || type === 'uint') view.setUint32(byteOffset, Number(value));
  else if (type === 'short' || type === 'ushort') view.setUint16(byteOffset, Number(value));
  else view.setUint8(byteOffset, Number(value));
}

/** Collects a header's bytes. */
class HeaderWriter {
  private readonly version: 1 | 2 | 5;
  private readonly collected: number[] = [];

  constructor(version: 1 | 2 | 5) {
    this.version = version;
  }

  bytes(): Uint8Array {
    return Uint8Array.from(this.collected);
  }

  uint32(value: number): void {
    this.collected.push((value >>> 24) & 0xff, (value >>> 16) & 0xff, (value >>> 8) & 0xff, value & 0xff);
  }

  /** A count or length: 8 bytes in CDF-5, otherwise 4. */
  size(value: number): void {
    if (this.version === 5) this.uint64(value);
    else this.uint32(value);
  }

  /** A place in the file: 4 bytes in CDF-1, otherwise 8. */
  offset(value: number): void {
    if (this.version === 1) this.uint32(value);
    else this.uint64(value);
  }

  list<Item>(tag: number, items: Item[], writeItem: (item: Item) => void): void {
    this.uint32(items.length > 0 ? tag : 0);
    this.size(items.length);
    for (const item of items) writeItem(item);
  }

  attributes(attributes: Record<string, NetcdfValue>): void {
    this.list(0x0c, Object.entries(attributes), ([name, value]) => {
      this.name(name);
      if (typeof value === 'string') {
        this.type('char');
        this.name(value);
        return;
      }
      const type = netcdfTypeOfArray(value);
      const size = netcdfTypes[type].byteLength;
      const view = new DataView(new ArrayBuffer(value.length * size));
      for (let index = 0; index < value.length; index++) setValue(view, index * size, type, value[index]);
      this.type(type);
      this.size(value.length);
      this.padded(new Uint8Array(view.buffer));
    });
  }

  type(type: NetcdfType): void {
    const { code } = netcdfTypes[type];
    if (this.version < 5 && code > 6) throw new RangeError(`CDF-${this.version} has no type ${type}`);
    this.uint32(code);
  }

  /** Text with its length before it, in UTF-8. */
  name(text: string): void {
    const encoded = new TextEncoder().encode(text);
    this.size(encoded.length);
    this.padded(encoded);
  }

  private padded(bytes: Uint8Array): void {
    this.collected.push(...bytes);
    while (this.collected.length % 4 !== 0) this.collected.push(0);
  }

  private uint64(value: number): void {
    this.uint32(Math.floor(value / 2 ** 32));
    this.uint32(value % 2 ** 32);
  }
}
