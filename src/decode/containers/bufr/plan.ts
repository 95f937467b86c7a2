import { MOST_BITS } from '../../../bytes/bit-reader.ts';
import { Problem } from '../../../problems/problem.ts';
import { ELEMENT, formatDescriptor, OPERATOR, REPLICATION, splitDescriptor } from './descriptor.ts';
import { describeOperator } from './operator-names.ts';
import { findElement, type TableElement } from './table-b.ts';
import { findSequence } from './table-d.ts';

/** An element as it is packed here: the line of table B with the operators in force applied. */
export interface ElementStep extends TableElement {
  /** Whether a field of all ones means missing: not for 1-bit elements, not for class 31 (FM 94 regulation 94.1.5). */
  canBeMissing: boolean;
}

/** Steps that are met several times. */
export interface ReplicationStep {
  /** How often, where the descriptors say it; null where the data do. */
  times: number | null;
  /** The element that says how often, where `times` is null. */
  counter: ElementStep | null;
  steps: PlanStep[];
}

export type PlanStep = ElementStep | ReplicationStep;

/**
 * What the data of a message hold, in order: sequences opened, operators applied, replications kept as loops.
 * Refuses, by name and place, an operator other than 2 01 and 2 02 and a descriptor that stands in no table of ours.
 * The descriptors stand two octets each from `firstByte` of the file.
 */
export function planDescriptors(descriptors: readonly number[], firstByte: number): PlanStep[] {
  const placed = descriptors.map((descriptor, index) => ({ descriptor, byte: firstByte + 2 * index }));
  return planList(placed, { addedWidth: 0, addedScale: 0, elementCount: 0 });
}

export function isReplication(step: PlanStep): step is ReplicationStep {
  return 'steps' in step;
}

/** A descriptor and the byte of the file where it, or the sequence it came in, stands. */
interface PlacedDescriptor {
  descriptor: number;
  byte: number;
}

/** What stands at this point of the list. */
interface PlanState {
  /** The operators in force: 2 01 YYY and 2 02 YYY, each YYY - 128 (FM 94 table C). */
  addedWidth: number;
  addedScale: number;
  elementCount: number;
}

/** Far more elements than any template has; a list that opens into more is damaged. */
const MOST_ELEMENTS = 20_000;

function planList(descriptors: readonly PlacedDescriptor[], state: PlanState): PlanStep[] {
  const steps: PlanStep[] = [];
  for (let i = 0; i < descriptors.length; i++) {
    const placed = descriptors[i];
    const { f, x } = splitDescriptor(placed.descriptor);
    if (f === ELEMENT) steps.push(planElement(placed, state));
    else if (f === OPERATOR) applyOperator(placed, state);
    else if (f === REPLICATION) {
      const replication = planReplication(descriptors, i, state);
      if (replication.steps.length > 0 || replication.counter) steps.push(replication);
      i += x + (replication.counter ? 1 : 0);
    } else steps.push(...planList(openSequence(placed), state));
  }
  return steps;
}

function planElement({ descriptor, byte }: PlacedDescriptor, state: PlanState): ElementStep {
  const element = findElement(descriptor);
  if (!element) {
    const name = formatDescriptor(descriptor);
    throw new Problem('unknown-descriptor', `Element ${name} is in no table this program has.`, { byte });
  }
  state.elementCount++;
  if (state.elementCount > MOST_ELEMENTS) {
    throw new Problem('damaged', `The list of descriptors opens into more than ${MOST_ELEMENTS} elements.`, { byte });
  }
  const canBeMissing = element.widthBits > 1 && splitDescriptor(descriptor).x !== 31;
  if (element.kind !== 'quantity') return { ...element, canBeMissing };
  const widthBits = element.widthBits + state.addedWidth;
  if (widthBits < 1 || widthBits > MOST_BITS) {
    throw new Problem('damaged', `Element ${formatDescriptor(descriptor)} is given ${widthBits} bits.`, { byte });
  }
  return { ...element, widthBits, scale: element.scale + state.addedScale, canBeMissing };
}

function applyOperator({ descriptor, byte }: PlacedDescriptor, state: PlanState): void {
  const { x, y } = splitDescriptor(descriptor);
  const added = y === 0 ? 0 : y - 128;
  if (x === 1) state.addedWidth = added;
  else if (x === 2) state.addedScale = added;
  else {
    const name = describeOperator(descriptor);
    throw new Problem('unsupported-operator', `Operator ${name} is not one this program can apply.`, { byte });
  }
}

function planReplication(descriptors: readonly PlacedDescriptor[], index: number, state: PlanState): ReplicationStep {
  const { descriptor, byte } = descriptors[index];
  const { x, y } = splitDescriptor(descriptor);
  const isDelayed = y === 0;
  const first = index + (isDelayed ? 2 : 1);
  if (x === 0 || first + x > descriptors.length) {
    const name = formatDescriptor(descriptor);
    throw new Problem('damaged', `Replication ${name} repeats more descriptors than follow it.`, { byte });
  }
  if (isDelayed && state.addedWidth !== 0) {
    // The manual does not say whether 2 01 widens the count too, and programs differ.
    const message = 'A delayed replication under operator 2 01 (change data width) can be read in two ways.';
    throw new Problem('unsupported-operator', message, { byte });
  }
  const counter = isDelayed ? planCounter(descriptors[index + 1]) : null;
  const body = descriptors.slice(first, first + x);
  const { addedWidth, addedScale } = state;
  const steps = planList(body, state);
  // An operator that a block leaves in force is in force when the block begins again.
  const isChanged = state.addedWidth !== addedWidth || state.addedScale !== addedScale;
  if (isChanged && JSON.stringify(planList(body, { ...state })) !== JSON.stringify(steps)) {
    throw new Problem('unsupported-operator', 'A repeated block is packed otherwise each time it is met.', { byte });
  }
  return { times: isDelayed ? null : y, counter, steps };
}

/** The count follows its replication and is not one of the X descriptors repeated (FM 94, delayed replication). */
function planCounter(placed: PlacedDescriptor): ElementStep {
  const { descriptor, byte } = placed;
  if (descriptor !== 31000 && descriptor !== 31001 && descriptor !== 31002) {
    const name = formatDescriptor(descriptor);
    const message = `Delayed replication counted by ${name} is not one this program can read.`;
    throw new Problem('unsupported-operator', message, { byte });
  }
  return planElement(placed, { addedWidth: 0, addedScale: 0, elementCount: 0 });
}

function openSequence({ descriptor, byte }: PlacedDescriptor): PlacedDescriptor[] {
  const sequence = findSequence(descriptor);
  if (sequence) return sequence.map((part) => ({ descriptor: part, byte }));
  const name = formatDescriptor(descriptor);
  throw new Problem('unknown-descriptor', `Sequence ${name} is in no table this program has.`, { byte });
}
