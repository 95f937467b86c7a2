import { formatDescriptor } from '../decode/containers/bufr/descriptor.ts';
import { type ElementStep, isReplication, type PlanStep, planDescriptors } from '../decode/containers/bufr/plan.ts';
import { Problem } from '../problems/problem.ts';
import { BitWriter } from './bit-writer.ts';

/** A value of an element: a number in the element's unit, text, or null where missing. */
export type BufrValue = number | string | null;

/** What a message is to hold. */
export interface BufrContent {
  edition: 3 | 4;
  isCompressed: boolean;
  /** F X Y written as one number: 3 12 061 is 312061. */
  descriptors: readonly number[];
  /** The values of each subset in the order of the descriptors opened, counts of delayed blocks among them. */
  subsets: readonly (readonly BufrValue[])[];
  /** The time in the head of the message, milliseconds UTC. */
  timeMs: number;
}

/**
 * One BUFR message (WMO-No. 306, FM 94, edition 3 or 4) without optional section, master table version 18, category 12
 * (single-level satellite data), no originating centre named. Throws 'bad-input' for a value its element cannot hold.
 */
export function encodeBufrMessage(content: BufrContent): Uint8Array {
  const sections = [encodeSection1(content), encodeSection3(content), encodeSection4(content)];
  const length = 8 + sections.reduce((sum, section) => sum + section.length, 0) + 4;
  const head = Uint8Array.of(0x42, 0x55, 0x46, 0x52, ...toOctets(length, 3), content.edition);
  const message = new Uint8Array(length);
  let at = 0;
  for (const part of [head, ...sections, Uint8Array.of(0x37, 0x37, 0x37, 0x37)]) {
    message.set(part, at);
    at += part.length;
  }
  return message;
}

const MASTER_TABLE_VERSION = 18;
const CATEGORY = 12;

/** Octet order: FM 94 section 1 of editions 3 and 4. */
function encodeSection1({ edition, timeMs }: BufrContent): Uint8Array {
  const time = new Date(timeMs);
  const [year, month, day] = [time.getUTCFullYear(), time.getUTCMonth() + 1, time.getUTCDate()];
  const [hour, minute, second] = [time.getUTCHours(), time.getUTCMinutes(), time.getUTCSeconds()];
  if (edition === 4) {
    const centres = [255, 255, 255, 255];
    const head = [0, ...centres, 0, 0, CATEGORY, 255, 0, MASTER_TABLE_VERSION, 0];
    return toSection([...head, ...toOctets(year, 2), month, day, hour, minute, second]);
  }
  const head = [0, 255, 255, 0, 0, CATEGORY, 0, MASTER_TABLE_VERSION, 0];
  return toSection([...head, ((year - 1) % 100) + 1, month, day, hour, minute, 0]);
}

function encodeSection3({ edition, descriptors, subsets, isCompressed }: BufrContent): Uint8Array {
  if (subsets.length > 65_535) throw new Problem('bad-input', 'A message cannot hold more than 65535 subsets.');
  const packed = descriptors.flatMap((descriptor) => {
    const [f, x, y] = [Math.floor(descriptor / 100_000), Math.floor(descriptor / 1000) % 100, descriptor % 1000];
    return [f * 64 + x, y];
  });
  const body = [0, ...toOctets(subsets.length, 2), 0x80 + (isCompressed ? 0x40 : 0), ...packed];
  return toSection(edition === 3 ? [...body, 0] : body);
}

function encodeSection4(content: BufrContent): Uint8Array {
  const writer = new BitWriter();
  const plan = planDescriptors(content.descriptors, 0);
  if (content.isCompressed) writeCompressed(writer, plan, content.subsets);
  else for (const subset of content.subsets) writePlain(writer, plan, subset);
  const data = writer.finish();
  const padding = content.edition === 3 ? data.length % 2 : 0;
  const section = new Uint8Array(4 + data.length + padding);
  section.set(toOctets(section.length, 3));
  section.set(data, 4);
  return section;
}

function writePlain(writer: BitWriter, plan: readonly PlanStep[], subset: readonly BufrValue[]): void {
  const count = walk(plan, subset, (element, index) => {
    const value = subset[index];
    if (element.kind === 'text') writer.writeOctets(packText(element, value));
    else writer.write(packNumber(element, value), element.widthBits);
  });
  refuseUnlessAll(count, subset);
}

/** FM 94, data compression: for each element the smallest value, 6 bits for the width of increments, the increments. */
function writeCompressed(
  writer: BitWriter,
  plan: readonly PlanStep[],
  subsets: readonly (readonly BufrValue[])[],
): void {
  const count = walk(plan, subsets[0] ?? [], (element, index) => {
    const values = subsets.map((subset) => subset[index]);
    if (element.kind === 'text') writeTexts(writer, element, values);
    else writeNumbers(writer, element, values);
  });
  for (const subset of subsets) refuseUnlessAll(count, subset);
}

function writeNumbers(writer: BitWriter, element: ElementStep, values: readonly BufrValue[]): void {
  const packed = values.map((value) => packNumber(element, value));
  const present = packed.filter((_, index) => values[index] !== null);
  const least = present.reduce((a, b) => Math.min(a, b), Number.POSITIVE_INFINITY);
  const most = present.reduce((a, b) => Math.max(a, b), 0);
  if (present.length === 0 || (present.length === packed.length && least === most)) {
    writer.write(packed[0], element.widthBits);
    writer.write(0, 6);
    return;
  }
  // The largest increment must leave all ones free, which mean missing.
  const widthBits = Math.ceil(Math.log2(most - least + 2));
  writer.write(least, element.widthBits);
  writer.write(widthBits, 6);
  for (const [index, value] of packed.entries()) {
    writer.write(values[index] === null ? 2 ** widthBits - 1 : value - least, widthBits);
  }
}

function writeTexts(writer: BitWriter, element: ElementStep, values: readonly BufrValue[]): void {
  const packed = values.map((value) => packText(element, value));
  const isSame = values.every((value) => value === values[0]);
  const octetCount = element.widthBits / 8;
  writer.writeOctets(isSame ? packed[0] : new Uint8Array(octetCount));
  writer.write(isSame ? 0 : octetCount, 6);
  if (!isSame) for (const text of packed) writer.writeOctets(text);
}

function packNumber(element: ElementStep, value: BufrValue | undefined): number {
  const { widthBits, scale, reference, canBeMissing, descriptor } = element;
  const most = 2 ** widthBits - 1;
  if (value === null && canBeMissing) return most;
  const packed = typeof value === 'number' ? Math.round(value * 10 ** scale) - reference : Number.NaN;
  if (packed >= 0 && packed <= (canBeMissing ? most - 1 : most)) return packed;
  throw new Problem('bad-input', `Element ${formatDescriptor(descriptor)} cannot hold ${value}.`);
}

function packText({ widthBits, descriptor }: ElementStep, value: BufrValue | undefined): Uint8Array {
  const octets = new Uint8Array(widthBits / 8).fill(value === null ? 0xff : 0x20);
  if (value === null) return octets;
  if (typeof value !== 'string' || value.length > octets.length) {
    throw new Problem('bad-input', `Element ${formatDescriptor(descriptor)} cannot hold ${value}.`);
  }
  for (let i = 0; i < value.length; i++) octets[i] = value.charCodeAt(i);
  return octets;
}

/** Meets the elements of a plan with the index of each one's value; the values say how often delayed blocks repeat. */
function walk(
  steps: readonly PlanStep[],
  values: readonly BufrValue[],
  visit: (element: ElementStep, index: number) => void,
  first = 0,
): number {
  let index = first;
  for (const step of steps) {
    if (!isReplication(step)) {
      visit(step, index++);
      continue;
    }
    const times = step.times ?? Number(values[index]);
    if (step.counter) visit(step.counter, index++);
    for (let i = 0; i < times; i++) index = walk(step.steps, values, visit, index);
  }
  return index;
}

function refuseUnlessAll(count: number, subset: readonly BufrValue[]): void {
  if (count === subset.length) return;
  throw new Problem('bad-input', `A subset has ${subset.length} values where its descriptors ask for ${count}.`);
}

/** A section: its length in three octets, then its body. */
function toSection(body: readonly number[]): Uint8Array {
  return Uint8Array.of(...toOctets(body.length + 3, 3), ...body);
}

function toOctets(value: number, count: number): number[] {
  return Array.from({ length: count }, (_, i) => Math.floor(value / 256 ** (count - 1 - i)) % 256);
}
