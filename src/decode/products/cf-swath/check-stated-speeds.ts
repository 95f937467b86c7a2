import { Problem } from '../../../problems/problem.ts';
import { type Swath, WIND } from '../../../swath/swath.ts';
import { type FlagField, type FlagMeaning, hasMeaning, MISSING_FLAGS } from './read-flag-field.ts';

/** Flag words that state a speed themselves, and so can be held against the winds. */
const statedSpeeds = new Map([
  ['small_wind_less_than_or_equal_to_3_m_s', { limitMs: 3, isTrueOf: (speedMs: number) => speedMs <= 3 }],
  ['large_wind_greater_than_30_m_s', { limitMs: 30, isTrueOf: (speedMs: number) => speedMs > 30 }],
]);

/** A speed this near to the limit proves nothing: it was rounded to 0.01 m/s after the flag was set. */
const SLACK_MS = 0.011;

/** In two real orbits every wind agreed; a list shifted by one bit disagrees in nearly each light wind. */
const LEAST_AGREEMENT = 0.95;

/** Asks whether the bits that state a speed stand in the cells that have it; a Problem where they do not. */
export function checkStatedSpeeds(swath: Swath, field: FlagField): Problem | null {
  for (const meaning of field.meanings ?? []) {
    const stated = statedSpeeds.get(meaning.word);
    if (!stated) continue;
    const { telling, agreeing } = countAgreement(swath, field, meaning, stated);
    if (agreeing >= LEAST_AGREEMENT * telling) continue;
    return new Problem(
      'flags-unknown',
      `The flag '${meaning.word}' of ${field.name} fits the speed in only ${agreeing} of the ${telling} winds it concerns, so its flags are unknown.`,
      { part: `variable ${field.name}` },
    );
  }
  return null;
}

/** Counts the winds that have the bit or should have it, and those of them where both hold. The rest prove nothing. */
function countAgreement(
  swath: Swath,
  field: FlagField,
  meaning: FlagMeaning,
  stated: { limitMs: number; isTrueOf: (speedMs: number) => boolean },
): { telling: number; agreeing: number } {
  let telling = 0;
  let agreeing = 0;
  for (let cell = 0; cell < swath.state.length; cell++) {
    if (swath.state[cell] !== WIND || field.raw[cell] === MISSING_FLAGS) continue;
    const speedMs = swath.speedMs[cell];
    if (Math.abs(speedMs - stated.limitMs) < SLACK_MS) continue;
    const isSet = hasMeaning(field.raw[cell], meaning);
    const isTrue = stated.isTrueOf(speedMs);
    if (isSet || isTrue) telling++;
    if (isSet && isTrue) agreeing++;
  }
  return { telling, agreeing };
}
