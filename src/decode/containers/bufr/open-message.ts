import { BitReader } from '../../../bytes/bit-reader.ts';
import { toProblem } from '../../../problems/problem.ts';
import type { FoundMessage } from './find-messages.ts';
import { type Column, type DataBlock, layOutData } from './lay-out-data.ts';
import { type ElementStep, planDescriptors } from './plan.ts';
import { readExactNumbers, readTexts } from './read-column.ts';

/** A message whose elements have been found and can be read in any order. */
export interface OpenMessage {
  reader: BitReader;
  blocks: DataBlock[];
}

/** Finds where every element of a message is packed. Throws a Problem that names the message and the byte. */
export function openMessage(bytes: Uint8Array, message: FoundMessage): OpenMessage {
  try {
    const plan = planDescriptors(message.descriptors, message.descriptorsByte);
    const reader = new BitReader(bytes, message.dataByte, message.dataEndByte);
    return { reader, blocks: layOutData(reader, plan, message.subsetCount, message.isCompressed) };
  } catch (thrown) {
    throw toProblem(thrown, { part: message.part, byte: message.dataByte });
  }
}

/** One value of one subset, with what it is. */
export interface ElementValue {
  element: ElementStep;
  value: number | string | null;
}

/** Every element of every subset, in the order of the descriptors; counts of delayed blocks too. Missing is null. */
export function* listSubsets({ reader, blocks }: OpenMessage): Generator<ElementValue[]> {
  for (const block of blocks) {
    const columns = block.columns.map((column) => readValues(reader, column, block.subsetCount));
    for (let subset = 0; subset < block.subsetCount; subset++) {
      yield block.columns.map(({ element }, index) => ({ element, value: columns[index][subset] }));
    }
  }
}

function readValues(reader: BitReader, column: Column, subsetCount: number): (number | string | null)[] {
  if (column.element.kind === 'text') return readTexts(reader, column, subsetCount);
  const values = new Float64Array(subsetCount);
  readExactNumbers(reader, column, subsetCount, values);
  return Array.from(values, (value) => (Number.isNaN(value) ? null : value));
}
