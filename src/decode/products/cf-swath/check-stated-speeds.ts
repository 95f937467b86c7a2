import { Problem } from '../../../problems/problem.ts';
import { type Swath, WIND } from '../../../swath/swath.ts';
import { type FlagField, hasMeaning, MISSING_FLAGS } from './read-flag-field.ts';

/** The winds of one flag word: all of them, and those whose speed is clearly below or above the two stated limits. */
interface WordTally {
  winds: number;
  below3: number;
  above3: number;
  below30: number;
  above30: number;
}

/** A tally for each flag word that winds of the swath have. */
export type WordTallies = Map<number, WordTally>;

/** A speed this near to a limit proves nothing: it was rounded to 0.01 m/s after the flag was set. */
const SLACK_MS = 0.011;

/** Counts the winds of each flag word. */
export function tallyWords(swath: Swath, field: FlagField): WordTallies {
  const tallies: WordTallies = new Map();
  let tally = emptyTally();
  let lastRaw = MISSING_FLAGS;
  for (let cell = 0; cell < swath.state.length; cell++) {
    const raw = field.raw[cell];
    if (swath.state[cell] !== WIND || raw === MISSING_FLAGS) continue;
    if (raw !== lastRaw) {
      tally = tallies.get(raw) ?? emptyTally();
      tallies.set(raw, tally);
      lastRaw = raw;
    }
    const speedMs = swath.speedMs[cell];
    tally.winds++;
    if (speedMs < 3 - SLACK_MS) tally.below3++;
    if (speedMs > 3 + SLACK_MS) tally.above3++;
    if (speedMs < 30 - SLACK_MS) tally.below30++;
    if (speedMs > 30 + SLACK_MS) tally.above30++;
  }
  return tallies;
}

function emptyTally(): WordTally {
  return { winds: 0, below3: 0, above3: 0, below30: 0, above30: 0 };
}

/** Flag words that state a speed themselves: of a word's winds, those that must have it and those that must not. */
const statedSpeeds = new Map([
  [
    'small_wind_less_than_or_equal_to_3_m_s',
    { must: (tally: WordTally) => tally.below3, mustNot: (tally: WordTally) => tally.above3 },
  ],
  [
    'large_wind_greater_than_30_m_s',
    { must: (tally: WordTally) => tally.above30, mustNot: (tally: WordTally) => tally.below30 },
  ],
]);

/** In two real orbits every wind agreed; a list shifted by one bit disagrees in nearly each light wind. */
const LEAST_AGREEMENT = 0.95;

/** Asks whether the bits that state a speed stand in the winds that have it; a Problem where they do not. */
export function checkStatedSpeeds(field: FlagField, tallies: WordTallies): Problem | null {
  for (const meaning of field.meanings ?? []) {
    const stated = statedSpeeds.get(meaning.word);
    if (!stated) continue;
    let agreeing = 0;
    let disagreeing = 0;
    for (const [raw, tally] of tallies) {
      if (hasMeaning(raw, meaning)) {
        agreeing += stated.must(tally);
        disagreeing += stated.mustNot(tally);
      } else disagreeing += stated.must(tally);
    }
    const telling = agreeing + disagreeing;
    if (agreeing >= LEAST_AGREEMENT * telling) continue;
    const sentence = `The flag '${meaning.word}' of ${field.name} fits the speed in only ${agreeing} of the ${telling} winds it concerns, so its flags are unknown.`;
    return new Problem('flags-unknown', sentence, { part: `variable ${field.name}` });
  }
  return null;
}
