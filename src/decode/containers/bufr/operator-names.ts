import { formatDescriptor, splitDescriptor } from './descriptor.ts';

/** An operator by number and name: '2 04 008 (add associated field)'. */
export function describeOperator(descriptor: number): string {
  const name = names[splitDescriptor(descriptor).x] ?? 'no operator of table C';
  return `${formatDescriptor(descriptor)} (${name})`;
}

/** WMO-No. 306, FM 94 BUFR table C, in our words. */
const names: Record<number, string> = {
  1: 'change data width',
  2: 'change scale',
  3: 'change reference values',
  4: 'add associated field',
  5: 'text follows',
  6: 'width of the local element that follows',
  7: 'increase scale, reference value and data width',
  8: 'change width of text',
  9: 'floating point',
  21: 'data not present',
  22: 'quality information follows',
  23: 'substituted values',
  24: 'first-order statistics',
  25: 'difference statistics',
  32: 'replaced or retained values',
  35: 'cancel backward data reference',
  36: 'define data present bit-map',
  37: 'use data present bit-map',
  41: 'event',
  42: 'conditioning event',
  43: 'categorical forecast values',
};
