import { Problem } from '../../../problems/problem.ts';
import { createBackground, LOOKED_NO_WIND, NEVER_LOOKED, type Swath, WIND } from '../../../swath/swath.ts';
import { flagBit } from '../../../wind/flags.ts';
import type { DirectionSense } from './direction-sense.ts';
import type { CfFields, WindField } from './read-fields.ts';

type Tell = (problem: Problem) => void;

/** Speeds beyond this are no wind (no source; above any wind measured at sea). */
const MOST_SPEED_MS = 100;

/**
 * Sets position and time and marks as looked at every cell that has a position; longitudes 0 to 360 become -180 to 180.
 * Rows of fill in cut or merged files stay 'never looked'. Returns how many cells were looked at.
 */
export function fillPositions(swath: Swath, fields: CfFields, tell: Tell): number {
  const { state, lon, lat } = swath;
  let looked = 0;
  let impossible = 0;
  for (let cell = 0; cell < state.length; cell++) {
    const cellLon = fields.lon[cell];
    const cellLat = fields.lat[cell];
    if (cellLat >= -90 && cellLat <= 90 && cellLon >= -180 && cellLon <= 360) {
      state[cell] = LOOKED_NO_WIND;
      lon[cell] = cellLon >= 180 ? cellLon - 360 : cellLon;
      lat[cell] = cellLat;
      looked++;
    } else if (!Number.isNaN(cellLat) && !Number.isNaN(cellLon)) impossible++;
  }
  if (impossible > 0) {
    const sentence = `${impossible} cells have positions that are not on the earth; they count as never looked at.`;
    tell(new Problem('values-out-of-range', sentence));
  }
  return looked;
}

/** Sets speed and direction of every looked-at cell that has a wind. A wind whose direction is missing is still a wind. */
export function fillWinds(swath: Swath, wind: WindField, tell: Tell): void {
  const { state, speedMs, directionFrom, flags } = swath;
  swath.isDirectionStated = wind.sense !== 'unknown';
  let impossibleSpeeds = 0;
  let impossibleDirections = 0;
  for (let cell = 0; cell < state.length; cell++) {
    const speed = wind.speedMs[cell];
    if (state[cell] === NEVER_LOOKED || Number.isNaN(speed)) continue;
    if (!(speed >= 0 && speed <= MOST_SPEED_MS)) {
      flags[cell] |= flagBit.outOfRange;
      impossibleSpeeds++;
      continue;
    }
    state[cell] = WIND;
    speedMs[cell] = speed;
    directionFrom[cell] = toFrom(wind.directionDeg[cell], wind.sense);
    if (!Number.isNaN(directionFrom[cell])) continue;
    flags[cell] |= flagBit.directionUnknown;
    if (!Number.isNaN(wind.directionDeg[cell])) {
      flags[cell] |= flagBit.outOfRange;
      impossibleDirections++;
    }
  }
  tellImpossible(impossibleSpeeds, 'speeds', 'they count as no wind', tell);
  tellImpossible(impossibleDirections, 'directions', 'their winds are kept without one', tell);
}

function tellImpossible(count: number, word: string, consequence: string, tell: Tell): void {
  if (count === 0) return;
  tell(new Problem('values-out-of-range', `${count} wind ${word} are not possible; ${consequence}.`));
}

/** Sets the background wind where there is one, in cells that were looked at. */
export function fillBackground(swath: Swath, wind: WindField | null): void {
  if (!wind) return;
  const background = createBackground(swath.state.length);
  for (let cell = 0; cell < swath.state.length; cell++) {
    if (swath.state[cell] === NEVER_LOOKED) continue;
    background.speedMs[cell] = wind.speedMs[cell];
    background.directionFrom[cell] = toFrom(wind.directionDeg[cell], wind.sense);
  }
  swath.background = background;
}

/** Sets the probability of ice, in cells that were looked at. */
export function fillIceProbability(swath: Swath, probability: Float64Array | null): void {
  if (!probability) return;
  swath.iceProbability = new Float32Array(swath.state.length).fill(Number.NaN);
  for (let cell = 0; cell < swath.state.length; cell++) {
    if (swath.state[cell] !== NEVER_LOOKED) swath.iceProbability[cell] = probability[cell];
  }
}

/**
 * A direction from -180 to 360 degrees as the one the wind blows from, 0 <= d < 360 also once it is rounded to 32 bits;
 * NaN for any other.
 */
function toFrom(direction: number, sense: DirectionSense): number {
  if (!(direction >= -180 && direction <= 360)) return Number.NaN;
  let from = sense === 'to' ? direction + 180 : direction;
  if (from < 0) from += 360;
  if (from >= 360) from -= 360;
  return Math.fround(from) >= 360 ? 0 : from;
}
