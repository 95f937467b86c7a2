import type { Problem } from '../../../problems/problem.ts';
import { NEVER_LOOKED, type Swath, WIND } from '../../../swath/swath.ts';
import { flagBit } from '../../../wind/flags.ts';
import { checkStatedSpeeds } from './check-stated-speeds.ts';
import { type FlagField, type FlagMeaning, hasMeaning, MISSING_FLAGS } from './read-flag-field.ts';

/**
 * Sets our flags on a swath's cells from the file's flag variables, the first of which is the one whose words are kept
 * as read. Where there is none, or its meaning is not certain, every cell that was looked at gets 'qualityUnknown':
 * silence is not praise. What a reader should know goes to the swath's notes; doubts about the list are returned.
 */
export function applyFlags(swath: Swath, fields: FlagField[]): Problem[] {
  if (fields.length === 0) {
    swath.flagReading = 'absent';
    swath.notes.push('The file has no quality flags: the quality of its winds is unknown, not good.');
    markQualityUnknown(swath);
    return [];
  }
  swath.rawFlags.set(fields[0].raw);
  swath.flagReading = fields[0].meanings ? 'as-file-states' : 'unknown';
  const problems: Problem[] = [];
  for (const field of fields) {
    if (!field.meanings) continue;
    const doubt = checkStatedSpeeds(swath, field);
    if (doubt) problems.push(doubt);
    if (doubt && field === fields[0]) swath.flagReading = 'unknown';
    if (!doubt) mapFlags(swath, field, field.meanings, field === fields[0]);
  }
  if (swath.flagReading === 'unknown') {
    swath.notes.push('What the flags of this file mean is not certain: the quality of its winds is unknown, not good.');
    markQualityUnknown(swath);
  }
  tellRainCheck(swath);
  return problems;
}

function markQualityUnknown(swath: Swath): void {
  for (let cell = 0; cell < swath.state.length; cell++) {
    if (swath.state[cell] !== NEVER_LOOKED) swath.flags[cell] |= flagBit.qualityUnknown;
  }
}

/** What one raw word means, and how many winds have it. */
interface WordReading {
  ofWinds: number;
  ofEmptyCells: number;
  winds: number;
}

function mapFlags(swath: Swath, field: FlagField, meanings: FlagMeaning[], isFirst: boolean): void {
  const readings = new Map<number, WordReading>();
  let lastRaw = -1;
  let reading: WordReading = { ofWinds: 0, ofEmptyCells: 0, winds: 0 };
  for (let cell = 0; cell < swath.state.length; cell++) {
    const state = swath.state[cell];
    if (state === NEVER_LOOKED) continue;
    const raw = field.raw[cell];
    if (raw === MISSING_FLAGS) {
      if (isFirst) swath.flags[cell] |= flagBit.qualityUnknown;
      continue;
    }
    if (raw !== lastRaw) {
      reading = readings.get(raw) ?? readWord(raw, meanings);
      readings.set(raw, reading);
      lastRaw = raw;
    }
    if (state === WIND) {
      swath.flags[cell] |= reading.ofWinds;
      reading.winds++;
    } else swath.flags[cell] |= reading.ofEmptyCells;
  }
  tellUnreviewed(swath, field, meanings, readings);
}

/**
 * In the Ku-band family a cell's processing stops at the first test that fails and leaves the bits of all later ones
 * set, meaning nothing: of a cell without a wind only the first set bit is believed.
 */
function readWord(raw: number, meanings: FlagMeaning[]): WordReading {
  const set = meanings.filter((meaning) => meaning.flag !== null && hasMeaning(raw, meaning));
  const flagsOf = (list: FlagMeaning[]) => list.reduce((flags, { flag }) => flags | (flag ? flagBit[flag] : 0), 0);
  const believed = set.some(({ family }) => family === 'ku-band') ? set.slice(0, 1) : set;
  return { ofWinds: flagsOf(set), ofEmptyCells: flagsOf(believed), winds: 0 };
}

/** Words nobody reviewed are shown as the file has them, never turned into good or bad by their wording. */
function tellUnreviewed(
  swath: Swath,
  field: FlagField,
  meanings: FlagMeaning[],
  readings: Map<number, WordReading>,
): void {
  const unreviewed = meanings.filter(({ flag }) => flag === null);
  if (unreviewed.length === 0) return;
  const counted = unreviewed.map((meaning) => {
    let winds = 0;
    for (const [raw, reading] of readings) if (hasMeaning(raw, meaning)) winds += reading.winds;
    return `${meaning.word} (set in ${winds} winds)`;
  });
  swath.notes.push(`Flags of ${field.name} we have not reviewed, not judged here: ${counted.join(', ')}.`);
}

/** No rain flag must not be taken for no rain. */
function tellRainCheck(swath: Swath): void {
  const rainFlags = flagBit.rain | flagBit.rainCheckNotUsable;
  if (swath.flags.every((flags) => (flags & rainFlags) === 0)) {
    swath.notes.push('No cell has a rain flag: that may mean that rain was not checked, not that there was none.');
  }
}
