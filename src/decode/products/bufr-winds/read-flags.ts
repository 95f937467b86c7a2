import { NEVER_LOOKED, type Swath, WIND } from '../../../swath/swath.ts';
import { flagBit } from '../../../wind/flags.ts';
import type { FlagTable } from './flag-tables.ts';

/** A flag word that is missing: all ones (FM 94 regulation 94.1.5), never all flags set. */
const MISSING_WORD = 0xffffffff;

/** Fewer winds than this of 3 m/s or less or above 30 m/s say nothing for certain. Our choice, no source. */
const FEWEST_TELLING_WINDS = 10;

/** The part of the winds that must agree with a reading. Our choice, no source: real files agree to the last wind. */
const LEAST_AGREEMENT = 0.98;

/** Winds this near to 3 or 30 m/s are left out, since the file rounds speeds that the producer compared unrounded. */
const ROUNDING_MS = 0.011;

/**
 * Reads a swath's flag words into our flags. One producer writes every bit one place lower than its table says, so the
 * words are first checked against the winds: the bit 'speed of 3 m/s or less' must go with just those winds, the bit
 * 'above 30 m/s' too. The reading that agrees is used and named in the notes; where none does, or too few winds can
 * tell, no bit is read and cells with a bit set are marked quality unknown.
 */
export function readFlags(swath: Swath, table: FlagTable | undefined): void {
  if (!swath.rawFlags.some((word) => word !== MISSING_WORD)) {
    swath.flagReading = 'absent';
    swath.notes.push('The file gives no flags: the quality of its cells is unknown.');
    markUnknown(swath, () => true);
  } else if (!table) {
    leaveUnread(swath, 'The flag bits of this kind of file cannot be checked against its winds', () => true);
  } else {
    readCheckedFlags(swath, table);
  }
}

function readCheckedFlags(swath: Swath, table: FlagTable): void {
  const asTable = countAgreement(swath, table, 0);
  const oneLower = countAgreement(swath, table, 1);
  const { telling } = asTable;
  const winds = `${telling === 1 ? '1 wind' : `${telling} winds`} of 3 m/s or less or above 30 m/s`;
  if (telling < FEWEST_TELLING_WINDS) {
    leaveUnread(swath, `There are too few winds to check the flag bits by: ${winds}`, (word) => word !== 0);
  } else if (isGood(asTable)) {
    swath.flagReading = 'as-table';
    swath.notes.push(`Flag bits stand where their table puts them: checked against ${winds}.`);
    readWords(swath, table, 0);
  } else if (isGood(oneLower)) {
    swath.flagReading = 'one-bit-lower';
    swath.notes.push(`Flag bits stand one place lower than their table puts them: checked against ${winds}.`);
    readWords(swath, table, 1);
  } else {
    leaveUnread(swath, `The flag bits disagree with ${winds}`, () => true);
  }
}

function leaveUnread(swath: Swath, reason: string, isUnknown: (word: number) => boolean): void {
  const count = markUnknown(swath, isUnknown);
  swath.flagReading = 'unknown';
  const consequence = count === 0 ? 'no cell has a bit set' : `cells whose quality is thereby unknown: ${count}`;
  swath.notes.push(`${reason}. They are not read; ${consequence}.`);
}

interface Agreement {
  /** Winds looked at, and those of 3 m/s or less or above 30 m/s among them. */
  checked: number;
  telling: number;
  checkedAgreed: number;
  tellingAgreed: number;
}

function isGood({ checked, telling, checkedAgreed, tellingAgreed }: Agreement): boolean {
  return checkedAgreed >= checked * LEAST_AGREEMENT && tellingAgreed >= telling * LEAST_AGREEMENT;
}

function countAgreement(swath: Swath, table: FlagTable, placesLower: number): Agreement {
  const lightMask = maskOf(table, table.flags.indexOf('atMost3Ms'), placesLower);
  const strongMask = maskOf(table, table.flags.indexOf('above30Ms'), placesLower);
  const agreement = { checked: 0, telling: 0, checkedAgreed: 0, tellingAgreed: 0 };
  for (let cell = 0; cell < swath.state.length; cell++) {
    const word = swath.rawFlags[cell];
    const speedMs = swath.speedMs[cell];
    if (swath.state[cell] !== WIND || swath.chosenSolution[cell] === 0 || word === MISSING_WORD) continue;
    if (Math.abs(speedMs - 3) < ROUNDING_MS || Math.abs(speedMs - 30) < ROUNDING_MS) continue;
    const [isLight, isStrong] = [speedMs < 3, speedMs > 30];
    const agrees = ((word & lightMask) !== 0) === isLight && ((word & strongMask) !== 0) === isStrong;
    agreement.checked++;
    if (agrees) agreement.checkedAgreed++;
    if (!isLight && !isStrong) continue;
    agreement.telling++;
    if (agrees) agreement.tellingAgreed++;
  }
  return agreement;
}

/** The mask of entry `index` of a table: bit n of a word of w bits is 2^(w-n). */
function maskOf({ widthBits }: FlagTable, index: number, placesLower: number): number {
  return 2 ** (widthBits - (index + 1) - placesLower);
}

function readWords(swath: Swath, table: FlagTable, placesLower: number): void {
  const read = new Map<number, number>();
  let seen = 0;
  for (let cell = 0; cell < swath.rawFlags.length; cell++) {
    const word = swath.rawFlags[cell];
    if (word === 0) continue;
    let flags = read.get(word);
    if (flags === undefined) {
      flags = word === MISSING_WORD ? flagBit.qualityUnknown : readWord(word, table, placesLower);
      read.set(word, flags);
    }
    if (swath.state[cell] === NEVER_LOOKED) continue;
    swath.flags[cell] |= flags;
    seen |= flags;
  }
  if ((seen & (flagBit.rain | flagBit.rainCheckNotUsable)) === 0) {
    swath.notes.push(
      'No rain bit is set anywhere in this file. That is not "no rain": the check may not be made at all.',
    );
  }
}

function readWord(word: number, table: FlagTable, placesLower: number): number {
  let flags = 0;
  table.flags.forEach((flag, index) => {
    if (flag && (word & maskOf(table, index, placesLower)) !== 0) flags |= flagBit[flag];
  });
  return flags;
}

/** Marks looked-at cells quality unknown by their flag word; gives how many. */
function markUnknown(swath: Swath, isUnknown: (word: number) => boolean): number {
  let count = 0;
  for (let cell = 0; cell < swath.rawFlags.length; cell++) {
    if (swath.state[cell] === NEVER_LOOKED || !isUnknown(swath.rawFlags[cell])) continue;
    swath.flags[cell] |= flagBit.qualityUnknown;
    count++;
  }
  return count;
}
