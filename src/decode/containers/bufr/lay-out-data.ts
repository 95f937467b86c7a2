import { type BitReader, MOST_BITS } from '../../../bytes/bit-reader.ts';
import { Problem } from '../../../problems/problem.ts';
import { formatDescriptor } from './descriptor.ts';
import { type ElementStep, isReplication, type PlanStep } from './plan.ts';

/**
 * Where one element of every subset of a block is packed. The packed value of subset n (from 0) is `base` plus the field
 * of `widthBits` bits at `position + n * strideBits`; a stride of 0 is one value for all.
 */
export interface Column {
  element: ElementStep;
  /** Which of the elements with this descriptor, counted from 0 along a subset. */
  occurrence: number;
  position: number;
  widthBits: number;
  strideBits: number;
  base: number;
}

/** Subsets that hold the same elements in the same order. */
export interface DataBlock {
  firstSubset: number;
  subsetCount: number;
  columns: Column[];
}

/**
 * Finds where every element of a data section is packed, without reading the values. A compressed section is one block;
 * in others, neighbouring subsets are one block as long as they repeat their delayed blocks equally often.
 */
export function layOutData(
  reader: BitReader,
  plan: readonly PlanStep[],
  subsetCount: number,
  isCompressed: boolean,
): DataBlock[] {
  if (plan.length === 0 || subsetCount === 0) return [];
  reader.moveTo(0);
  if (isCompressed) return [layOutCompressed(reader, plan, subsetCount)];
  const blocks: DataBlock[] = [];
  for (let next = 0; next < subsetCount; next += blocks[blocks.length - 1].subsetCount) {
    blocks.push(layOutAlike(reader, plan, next, subsetCount - next));
  }
  return blocks;
}

/** FM 94, data compression: the smallest value, 6 bits for the width of the increments, an increment for each subset. */
const INCREMENT_WIDTH_BITS = 6;

function layOutCompressed(reader: BitReader, plan: readonly PlanStep[], subsetCount: number): DataBlock {
  const columns = createColumnList();
  walk(plan, (element, isCounter) => {
    const isText = element.kind === 'text';
    const { position } = reader;
    const base = isText ? 0 : reader.read(element.widthBits);
    if (isText) reader.skip(element.widthBits);
    // The width of text increments counts octets (FM 94, data compression).
    const widthBits = reader.read(INCREMENT_WIDTH_BITS) * (isText ? 8 : 1);
    if (widthBits === 0) {
      columns.add({ element, position, widthBits: element.widthBits, strideBits: 0, base: 0 });
      return base;
    }
    refuseTooWide(reader, element, isText ? 0 : widthBits);
    const column = { element, position: reader.position, widthBits, strideBits: widthBits, base };
    columns.add(column);
    if (isCounter) return readEqualCounts(reader, column, subsetCount);
    reader.skip(widthBits * subsetCount);
    return 0;
  });
  return { firstSubset: 0, subsetCount, columns: columns.list };
}

function refuseTooWide({ byte }: BitReader, { descriptor }: ElementStep, widthBits: number): void {
  if (widthBits <= MOST_BITS) return;
  const name = formatDescriptor(descriptor);
  throw new Problem('damaged', `Element ${name} has increments of ${widthBits} bits.`, { byte });
}

/** In compressed data every subset must repeat a delayed block equally often. */
function readEqualCounts(reader: BitReader, column: Omit<Column, 'occurrence'>, subsetCount: number): number {
  const { byte } = reader;
  const increments = new Set<number>();
  for (let i = 0; i < subsetCount; i++) increments.add(reader.read(column.widthBits));
  if (increments.size === 1) return column.base + [...increments][0];
  throw new Problem('damaged', 'Compressed cells repeat a block a different number of times.', { byte });
}

/** A block of up to `most` subsets that are laid out as the one the reader stands at. */
function layOutAlike(reader: BitReader, plan: readonly PlanStep[], firstSubset: number, most: number): DataBlock {
  const columns = createColumnList();
  const counters: { offset: number; widthBits: number; count: number }[] = [];
  const start = reader.position;
  walk(plan, (element, isCounter) => {
    const { position } = reader;
    const { widthBits } = element;
    columns.add({ element, position, widthBits, strideBits: 0, base: 0 });
    if (!isCounter) {
      reader.skip(widthBits);
      return 0;
    }
    const count = reader.read(widthBits);
    counters.push({ offset: position - start, widthBits, count });
    return count;
  });
  const strideBits = reader.position - start;
  for (const column of columns.list) column.strideBits = strideBits;
  const isNextAlike = (next: number) =>
    reader.remainingBits >= strideBits &&
    counters.every(({ offset, widthBits, count }) => {
      reader.moveTo(next + offset);
      return reader.read(widthBits) === count;
    });
  let subsetCount = 1;
  while (subsetCount < most && isNextAlike(start + subsetCount * strideBits)) {
    subsetCount++;
    reader.moveTo(start + subsetCount * strideBits);
  }
  reader.moveTo(start + subsetCount * strideBits);
  return { firstSubset, subsetCount, columns: columns.list };
}

/** Meets the elements of a plan in order. `visit` moves the reader past the element; of a counter it gives the count. */
function walk(steps: readonly PlanStep[], visit: (element: ElementStep, isCounter: boolean) => number): void {
  for (const step of steps) {
    if (!isReplication(step)) {
      visit(step, false);
      continue;
    }
    const times = step.counter ? visit(step.counter, true) : (step.times ?? 0);
    if (step.steps.length === 0) continue;
    for (let i = 0; i < times; i++) walk(step.steps, visit);
  }
}

/** Far more elements than any subset has; a replication that unrolls into more is damaged. */
const MOST_COLUMNS = 100_000;

function createColumnList() {
  const list: Column[] = [];
  const met = new Map<number, number>();
  return {
    list,
    add(column: Omit<Column, 'occurrence'>): void {
      const { descriptor } = column.element;
      const occurrence = met.get(descriptor) ?? 0;
      met.set(descriptor, occurrence + 1);
      if (list.length === MOST_COLUMNS) {
        const name = formatDescriptor(descriptor);
        throw new Problem('damaged', `A cell unrolls into more than ${MOST_COLUMNS} elements at ${name}.`);
      }
      list.push({ ...column, occurrence });
    },
  };
}
