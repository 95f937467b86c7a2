import { Problem } from '../../../problems/problem.ts';
import { NEVER_LOOKED, type Swath, WIND } from '../../../swath/swath.ts';
import { flagBit } from '../../../wind/flags.ts';
import { type CfFile, tellProblem } from './cf-file.ts';
import type { WindVariables } from './find-variables.ts';
import { readDirections } from './read-directions.ts';
import { MOST_SPEED_MS, readSpeeds } from './read-speeds.ts';
import { OUT_OF_RANGE } from './unpack-values.ts';

/**
 * Sets speed and direction of every looked-at cell of a pass that has a wind. A wind without a direction is still a
 * wind; where the file does not say which way its directions point, all are left out and the problem is told.
 */
export function readWinds(file: CfFile, wind: WindVariables, first: number, swath: Swath): void {
  if ('eastward' in wind) readParts(file, wind, first, swath);
  else readSpeedAndDirection(file, wind, first, swath);
  markWinds(file, swath);
}

type SpeedAndDirection = Extract<WindVariables, { speed: unknown }>;
type Parts = Extract<WindVariables, { eastward: unknown }>;

function readSpeedAndDirection(file: CfFile, wind: SpeedAndDirection, first: number, swath: Swath): void {
  readSpeeds(file, wind.speed, first, swath.speedMs);
  const sense = wind.direction ? readDirections(file, wind.direction, first, swath.directionFrom) : 'unknown';
  swath.isDirectionStated = sense !== 'unknown';
  if (sense === 'to') {
    swath.notes.push(
      'The file says where its winds blow to; their directions are turned round to where they come from.',
    );
  }
  if (sense !== 'unknown') return;
  const lack = wind.direction
    ? `The file does not say which way ${wind.direction.name} points: to where the wind blows, or from where it comes`
    : 'The file has no wind direction that can be told from others';
  swath.notes.push(`${lack}.`);
  const part = `variable ${wind.direction?.name ?? wind.speed.name}`;
  const sentence = `${lack}. Its speeds are kept, directions left out.`;
  tellProblem(file, new Problem('direction-not-stated', sentence, { part }));
}

/** Eastward and northward parts always point to where the wind blows: u = -V sin(from), v = -V cos(from). */
function readParts(file: CfFile, { eastward, northward }: Parts, first: number, swath: Swath): void {
  const u = new Float32Array(swath.state.length);
  const v = new Float32Array(swath.state.length);
  readSpeeds(file, eastward, first, u);
  readSpeeds(file, northward, first, v);
  for (let cell = 0; cell < u.length; cell++) {
    swath.speedMs[cell] = Math.hypot(u[cell], v[cell]);
    swath.directionFrom[cell] = directionOfParts(u[cell], v[cell]);
  }
  swath.isDirectionStated = true;
  swath.notes.push(`Speed and direction are worked out from ${eastward.name} and ${northward.name}.`);
}

/** The direction a wind blows from, -180 to 180 degrees brought to 0 <= d < 360 after rounding to 32 bits. */
function directionOfParts(eastward: number, northward: number): number {
  const from = Math.fround((Math.atan2(-eastward, -northward) * 180) / Math.PI);
  return from < 0 ? Math.fround(from + 360) % 360 : from;
}

/** Tells winds from cells without one, and takes out what cannot be. */
function markWinds(file: CfFile, swath: Swath): void {
  const { state, speedMs, directionFrom, flags } = swath;
  let impossibleSpeeds = 0;
  let impossibleDirections = 0;
  for (let cell = 0; cell < state.length; cell++) {
    const speed = speedMs[cell];
    if (speed >= 0 && speed <= MOST_SPEED_MS && state[cell] !== NEVER_LOOKED) {
      state[cell] = WIND;
      // NaN or impossible.
      if (!(directionFrom[cell] < 360)) {
        flags[cell] |= flagBit.directionUnknown;
        if (directionFrom[cell] === OUT_OF_RANGE) {
          flags[cell] |= flagBit.outOfRange;
          impossibleDirections++;
        }
        directionFrom[cell] = Number.NaN;
      }
      continue;
    }
    if (!Number.isNaN(speed) && state[cell] !== NEVER_LOOKED) {
      flags[cell] |= flagBit.outOfRange;
      impossibleSpeeds++;
    }
    speedMs[cell] = Number.NaN;
    directionFrom[cell] = Number.NaN;
  }
  tellImpossible(file, impossibleSpeeds, 'Speeds', 'They count as no wind');
  tellImpossible(file, impossibleDirections, 'Directions', 'Their winds are kept without one');
}

function tellImpossible(file: CfFile, count: number, word: string, consequence: string): void {
  if (count === 0) return;
  const sentence = `${word} that cannot be, or are outside the file's own range: ${count}. ${consequence}.`;
  tellProblem(file, new Problem('values-out-of-range', sentence));
}
