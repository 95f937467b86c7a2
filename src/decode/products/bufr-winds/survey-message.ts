import { Problem } from '../../../problems/problem.ts';
import type { Viewing } from '../../../swath/swath.ts';
import { formatDescriptor } from '../../containers/bufr/descriptor.ts';
import type { FoundMessage } from '../../containers/bufr/find-messages.ts';
import { type OpenMessage, openMessage } from '../../containers/bufr/open-message.ts';
import { type CellColumns, findCellColumns } from './cell-columns.ts';
import type { TableSize } from './cell-table.ts';

/** What a message holds, found before anything is read, so that tables can be made in one piece. */
export interface SurveyedMessage {
  message: FoundMessage;
  /** Null where the elements tell neither kind. */
  viewing: Viewing | null;
  /** The element of its flag word; 0 where it has none. */
  flagDescriptor: number;
  size: TableSize;
  /** Kept where it is small; a message of many differing blocks is opened again. */
  open: OpenMessage | null;
}

/** More solutions or looks than any template gives a cell; a message with more is damaged. */
const MOST_SOLUTIONS = 16;
const MOST_LOOKS = 8;

/**
 * Whether and what cells of a scatterometer a message holds, told by its elements, not by its sequence. Throws
 * 'not-a-swath' where there are none, 'unsupported-format' where they have no number across the track.
 */
export function surveyMessage(bytes: Uint8Array, message: FoundMessage): SurveyedMessage {
  const open = openMessage(bytes, message);
  const size: TableSize = { cells: message.subsetCount, looks: 0, solutions: 0 };
  let flagDescriptor = 0;
  for (const block of open.blocks) {
    const columns = findCellColumns(open.reader, block);
    refuseUnlessCells(columns, message);
    size.looks = Math.max(size.looks, columns.looks.length);
    size.solutions = Math.max(size.solutions, columns.solutions.length);
    flagDescriptor = columns.flagWord?.element.descriptor ?? flagDescriptor;
  }
  refuseImpossible(size, message);
  return { message, viewing: tellViewing(open), flagDescriptor, size, open: open.blocks.length === 1 ? open : null };
}

function refuseUnlessCells({ lat, lon, time, cellNumber, looks, solutions }: CellColumns, message: FoundMessage): void {
  const list = message.descriptors.map(formatDescriptor).join(', ');
  const isSwath = lat && lon && time[0] && (looks.length > 0 || solutions.length > 0);
  if (!isSwath) throw new Problem('not-a-swath', `The message (${list}) holds no cells of a scatterometer.`);
  if (cellNumber) return;
  throw new Problem('unsupported-format', `The message (${list}) gives its cells no number across the track.`);
}

function refuseImpossible({ cells, looks, solutions }: TableSize, message: FoundMessage): void {
  // Different cells differ in place, number or time: n of them cannot be told apart by fewer than n log2 n bits.
  const bits = (message.dataEndByte - message.dataByte) * 8;
  if (cells * Math.log2(cells) > bits) {
    throw new Problem(
      'damaged',
      `The message states ${cells} cells, more than its ${bits / 8} bytes of data can hold.`,
    );
  }
  if (looks > MOST_LOOKS || solutions > MOST_SOLUTIONS) {
    throw new Problem('damaged', `The message gives a cell ${looks} radar looks and ${solutions} winds.`);
  }
}

/**
 * Tells the kind by elements that only one kind has (FM 94 table D, 3 12): pencil beams a sensor indicator, 0 02 048, fan
 * beams an antenna beam azimuth, 0 02 134, or the flag word 0 21 155.
 */
function tellViewing({ blocks }: OpenMessage): Viewing | null {
  const elements = new Set(blocks[0]?.columns.map(({ element }) => element.descriptor));
  if (elements.has(2048)) return 'pencil-beam';
  return elements.has(2134) || elements.has(21155) ? 'fan-beam' : null;
}
