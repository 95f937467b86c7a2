import { findFlagTable } from '../decode/products/bufr-winds/flag-tables.ts';
import { NEVER_LOOKED, type Swath, WIND } from '../swath/swath.ts';
import { flagBit } from '../wind/flags.ts';
import { type BufrValue, encodeBufrMessage } from './encode-bufr-message.ts';

/** How a pass is to be written. */
export interface FanBeamOptions {
  /** Satellite identifier, element 0 01 007: a number that no platform has. */
  platformCode: number;
  edition?: 3 | 4;
  isCompressed?: boolean;
  /** Cells of a message, the last one's left over; a row may go on in the next message. */
  cellsPerMessage?: number;
  /** Whether each message stands in a bulletin with a heading. */
  hasHeadings?: boolean;
  /** How many places lower than their table the flag bits stand: 1 as the main producer of such files writes them. */
  flagPlacesLower?: 0 | 1;
}

/**
 * A C-band fan-beam pass as a BUFR file of sequence 3 12 061: every cell that was looked at, with its beams, solutions,
 * background wind and flags. Places never looked at have no cell. Throws 'bad-input' for values that do not fit.
 */
export function encodeFanBeamBufr(swath: Swath, options: FanBeamOptions): Uint8Array {
  const { edition = 4, isCompressed = true, cellsPerMessage = 1458, hasHeadings = false } = options;
  const cells = Array.from(swath.state.keys()).filter((cell) => swath.state[cell] !== NEVER_LOOKED);
  const parts: Uint8Array[] = [];
  for (let first = 0; first < cells.length; first += cellsPerMessage) {
    const chosen = cells.slice(first, first + cellsPerMessage);
    const subsets = chosen.map((cell) => listValues(swath, cell, options));
    const timeMs = swath.timeMs[chosen[0]];
    const message = encodeBufrMessage({ edition, isCompressed, descriptors: [312061], subsets, timeMs });
    if (hasHeadings) parts.push(encodeHeading(parts.length / 3 + 1, timeMs, message.length), message, bulletinEnd);
    else parts.push(message);
  }
  return joinBytes(parts);
}

/** The values of one cell in the order of 3 12 061 (WMO-No. 306, FM 94 table D). */
function listValues(swath: Swath, cell: number, options: FanBeamOptions): BufrValue[] {
  const time = new Date(swath.timeMs[cell]);
  return [
    ...[null, null, null, options.platformCode, null, null],
    ...[time.getUTCFullYear(), time.getUTCMonth() + 1, time.getUTCDate()],
    ...[time.getUTCHours(), time.getUTCMinutes(), time.getUTCSeconds()],
    ...[swath.lat[cell], swath.lon[cell]],
    ...[orNull(swath.cellSizeM), null, (cell % swath.columns) + 1, null, null, null],
    ...[0, 1, 2].flatMap((beam) => listBeam(swath, cell, beam)),
    ...nulls(LAND_ELEMENTS),
    ...[null, null, ...listBackground(swath, cell), null],
    ...[packFlags(swath.flags[cell], options.flagPlacesLower ?? 1), ...listSolutions(swath, cell)],
  ];
}

/** 3 21 030. Real files number the beams 1, 2, 3 where the code table of 0 08 085 has 0, 1, 2. */
function listBeam({ beams }: Swath, cell: number, beam: number): BufrValue[] {
  const n = cell * (beams?.count ?? 0) + beam;
  const looks = beams
    ? [beams.incidenceDeg[n], beams.azimuthDeg[n], beams.backscatterDb[n], beams.noisePercent[n]].map(orNull)
    : nulls(4);
  return [beam + 1, ...looks, ...nulls(9)];
}

/** 3 12 060, of which nothing is written. */
const LAND_ELEMENTS = 20;

function listBackground({ background, iceProbability }: Swath, cell: number): BufrValue[] {
  const wind = background ? [background.speedMs[cell], background.directionFrom[cell]].map(orNull) : nulls(2);
  return [...wind, iceProbability ? orNull(iceProbability[cell]) : null];
}

/** Number of solutions, the chosen one, the slots. The likelihood is the decimal logarithm of the probability. */
function listSolutions({ solutions, state, chosenSolution }: Swath, cell: number): BufrValue[] {
  if (!solutions) return [null, null, 0];
  const { slots, speedMs, directionFrom, probability, fitDistance } = solutions;
  const numbers = Array.from({ length: slots }, (_, n) => cell * slots + n);
  const found = numbers.filter((n) => speedMs[n] >= 0).length;
  const values = numbers.flatMap((n) =>
    [speedMs[n], directionFrom[n], fitDistance[n], Math.max(-30, Math.log10(probability[n]))].map(orNull),
  );
  return [found, state[cell] === WIND ? chosenSolution[cell] : null, slots, ...values];
}

function packFlags(flags: number, placesLower: number): number | null {
  if (flags & flagBit.qualityUnknown) return null;
  const table = findFlagTable(21155);
  let word = 0;
  table?.flags.forEach((flag, index) => {
    if (flag && flags & flagBit[flag]) word += 2 ** (table.widthBits - (index + 1) - placesLower);
  });
  return word;
}

/** A bulletin's start: its length, a number, and an abbreviated heading of an invented place (WMO-No. 386, part II). */
function encodeHeading(number: number, timeMs: number, messageLength: number): Uint8Array {
  const time = new Date(timeMs);
  const [day, hour, minute] = [time.getUTCDate(), time.getUTCHours(), time.getUTCMinutes()].map(twoDigits);
  const body = `\x01\r\r\n${String(number).padStart(3, '0')}\r\r\nISXX01 XXXX ${day}${hour}${minute}\r\r\n`;
  const length = body.length + messageLength + bulletinEnd.length;
  return toOctets(`${String(length).padStart(8, '0')}00${body}`);
}

function toOctets(text: string): Uint8Array {
  return Uint8Array.from(text, (character) => character.charCodeAt(0));
}

const bulletinEnd = toOctets('\r\r\n\x03');

function joinBytes(parts: readonly Uint8Array[]): Uint8Array {
  const joined = new Uint8Array(parts.reduce((sum, part) => sum + part.length, 0));
  let at = 0;
  for (const part of parts) {
    joined.set(part, at);
    at += part.length;
  }
  return joined;
}

function orNull(value: number): number | null {
  return Number.isNaN(value) ? null : value;
}

function nulls(count: number): null[] {
  return new Array<null>(count).fill(null);
}

function twoDigits(value: number): string {
  return String(value).padStart(2, '0');
}
