import { flagBit } from './flags.ts';

/** What every window, card and terminal listing shows whatever the data: the limits of such winds at all. */
export const standingCautions = [
  'Every wind here is an observation of the past, at the time printed beside it; none is a forecast.',
  'Where nothing is drawn nothing was observed: it does not mean calm, nor that no warning is needed.',
  'Winds are means over a cell at 10 m height as if the air were neutral: gusts and squalls are higher.',
  'Above about 25 m/s winds are uncertain and likely too low.',
  'Rain can spoil a wind, in the Ku band above all; a wind without a rain flag may never have been checked for rain.',
  'A direction can be wrong by about 180 degrees, most of all in light wind and near fronts and centres.',
  'Near coasts and ice winds may be wrong or missing.',
  'The responsible forecaster, official warnings and local rules come first; nothing here weakens a warning.',
  'Not for navigation: the map is no chart.',
] as const;

/** What the cautions of one cell depend on. */
export interface CautionedCell {
  hasWind: boolean;
  speedMs: number;
  /** Degrees, or null when not known. */
  directionFrom: number | null;
  /** Our flag word (wind/flags). */
  flags: number;
  /** Directions of all solutions, degrees, the chosen one first. */
  solutionDirections: readonly number[];
  hasBackground: boolean;
  /** Probability of ice, 0 to 1; NaN where not known. */
  iceProbability: number;
  band: 'C' | 'Ku' | null;
  checksRain: boolean;
  areFlagsKnown: boolean;
  isDirectionStated: boolean;
  /** Distance to the nearest land, km, or null when far off. */
  landKm: number | null;
}

/** Speeds above this are uncertain and likely low, m/s: domain limit of C-band and Ku-band wind retrieval. */
const HIGH_WIND_MS = 25;
/** Below this the direction can hardly be told, m/s. */
const LIGHT_WIND_MS = 4;
/** Land nearer than this can reach into a footprint of 50 km, km. Common practice, no source. */
const NEAR_LAND_KM = 50;

/** What a reader must know before believing one cell, in plain sentences, the weightiest first. */
export function cautionCell(cell: CautionedCell): string[] {
  if (!cell.hasWind) {
    return [
      'This water was looked at, but no wind came of it: it does not mean calm.',
      ...cautionPlace(cell),
      'Not for navigation.',
    ];
  }
  return [
    'This is an observation of the past, at the time given; it is not a forecast.',
    ...cautionSpeed(cell),
    ...cautionRain(cell),
    ...cautionDirection(cell),
    ...cautionPlace(cell),
    ...cautionFlags(cell),
    ...(cell.hasBackground ? ['The background wind is from a model; nobody observed it.'] : []),
    'Not for navigation.',
  ];
}

function cautionSpeed({ speedMs }: CautionedCell): string[] {
  const mean = 'The speed is a mean over the cell at 10 m height as if the air were neutral; gusts are higher.';
  if (speedMs <= HIGH_WIND_MS) return [mean];
  return ['Above about 25 m/s such a speed is uncertain and likely too low: the true wind may be stronger.', mean];
}

function cautionRain({ flags, band, checksRain }: CautionedCell): string[] {
  if (flags & flagBit.rain) {
    if (band === 'C') return ['Rain was found here: heavy rain changes the speed somewhat.'];
    return ['Rain was found here: expect a light wind to read too high and a very strong one too low.'];
  }
  if (flags & flagBit.rainCheckNotUsable) return ['Whether it rained here could not be checked.'];
  if (checksRain) return [];
  return ['No cell of this pass carries a rain flag: rain may never have been checked, so do not read it as no rain.'];
}

function cautionDirection(cell: CautionedCell): string[] {
  const { directionFrom, speedMs, solutionDirections, isDirectionStated } = cell;
  if (!isDirectionStated) return ['The file does not say which way its directions point, so none is given.'];
  if (directionFrom === null) return ['The direction is not known.'];
  const cautions: string[] = [];
  if (speedMs < LIGHT_WIND_MS) cautions.push('Under about 4 m/s the direction can hardly be told.');
  if (solutionDirections.some((other) => isReversed(directionFrom, other))) {
    cautions.push('Another solution points nearly the other way: the direction may be reversed.');
  } else {
    cautions.push('The direction may be reversed, most of all near fronts and centres.');
  }
  return cautions;
}

/** Whether two directions differ by 150 degrees or more: a rival the other way round. Common practice, no source. */
function isReversed(one: number, other: number): boolean {
  return Math.abs(((one - other + 540) % 360) - 180) >= 150;
}

function cautionPlace({ flags, landKm, iceProbability }: CautionedCell): string[] {
  const cautions: string[] = [];
  if (flags & flagBit.landInCell) cautions.push('Land lies in this cell: what it says may be wrong.');
  else if (landKm !== null && landKm < NEAR_LAND_KM) {
    cautions.push('Land is near: echoes from it may have reached this cell.');
  }
  if (flags & flagBit.iceInCell) cautions.push('Ice lies in this cell: what it says may be wrong.');
  else if (iceProbability > 0.5) cautions.push('Ice is more likely than not here: what the cell says may be wrong.');
  return cautions;
}

function cautionFlags({ flags, areFlagsKnown }: CautionedCell): string[] {
  if (!areFlagsKnown || flags & flagBit.qualityUnknown) {
    return ['The meaning of the quality flags of this file is not known: no flag does not mean good.'];
  }
  const failed = flagBit.fitQualityFailed | flagBit.fieldConsistencyFailed | flagBit.radarFitTooFar;
  if (flags & failed) {
    return ['The producer marks this wind as doubtful; near a storm it may be right all the same.'];
  }
  return [];
}
