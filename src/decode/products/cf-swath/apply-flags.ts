import type { Problem } from '../../../problems/problem.ts';
import { NEVER_LOOKED, type Swath, WIND } from '../../../swath/swath.ts';
import { flagBit } from '../../../wind/flags.ts';
import { checkStatedSpeeds, tallyWords, type WordTallies } from './check-stated-speeds.ts';
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
  const problems: Problem[] = [];
  for (const [index, field] of fields.entries()) {
    const tallies = tallyWords(swath, field);
    const doubt = checkStatedSpeeds(field, tallies);
    if (doubt) problems.push(doubt);
    const meanings = doubt ? null : field.meanings;
    if (meanings) mapFlags(swath, field, meanings, index === 0);
    if (meanings) tellUnreviewed(swath, field, meanings, tallies);
    if (index === 0) swath.flagReading = meanings ? 'as-file-states' : 'unknown';
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

/** What one raw word means of a cell with a wind, and of one without. */
interface WordReading {
  ofWinds: number;
  ofEmptyCells: number;
}

function mapFlags(swath: Swath, field: FlagField, meanings: FlagMeaning[], isFirst: boolean): void {
  const { state, flags } = swath;
  const readings = new Map<number, WordReading>();
  const unknown = isFirst ? flagBit.qualityUnknown : 0;
  readings.set(MISSING_FLAGS, { ofWinds: unknown, ofEmptyCells: unknown });
  let lastRaw = -1;
  let ofWinds = 0;
  let ofEmptyCells = 0;
  for (let cell = 0; cell < state.length; cell++) {
    const raw = field.raw[cell];
    if (raw !== lastRaw) {
      const reading = readings.get(raw) ?? readWord(raw, meanings);
      readings.set(raw, reading);
      ({ ofWinds, ofEmptyCells } = reading);
      lastRaw = raw;
    }
    if (state[cell] === WIND) flags[cell] |= ofWinds;
    else if (state[cell] !== NEVER_LOOKED) flags[cell] |= ofEmptyCells;
  }
}

/**
 * In the Ku-band family a cell's processing stops at the first test that fails and leaves the bits of all later ones
 * set, meaning nothing: of a cell without a wind only the first set bit is believed.
 */
function readWord(raw: number, meanings: FlagMeaning[]): WordReading {
  const set = meanings.filter((meaning) => meaning.flag !== null && hasMeaning(raw, meaning));
  const flagsOf = (list: FlagMeaning[]) => list.reduce((flags, { flag }) => flags | (flag ? flagBit[flag] : 0), 0);
  const believed = set.some(({ family }) => family === 'ku-band') ? set.slice(0, 1) : set;
  return { ofWinds: flagsOf(set), ofEmptyCells: flagsOf(believed) };
}

/** Words nobody reviewed are shown as the file has them, never turned into good or bad by their wording. */
function tellUnreviewed(swath: Swath, field: FlagField, meanings: FlagMeaning[], tallies: WordTallies): void {
  const unreviewed = meanings.filter(({ flag }) => flag === null);
  if (unreviewed.length === 0) return;
  const counted = unreviewed.map((meaning) => {
    let winds = 0;
    for (const [raw, tally] of tallies) if (hasMeaning(raw, meaning)) winds += tally.winds;
    return `${meaning.word} (set in ${winds} winds)`;
  });
  swath.notes.push(`Flags of ${field.name} we have not reviewed, not judged here: ${counted.join(', ')}.`);
}

/** No rain flag must not be taken for no rain. */
function tellRainCheck(swath: Swath): void {
  let found = 0;
  for (let cell = 0; cell < swath.flags.length; cell++) found |= swath.flags[cell];
  if ((found & (flagBit.rain | flagBit.rainCheckNotUsable)) === 0) {
    swath.notes.push('No cell has a rain flag: that may mean that rain was not checked, not that there was none.');
  }
}
