import { chooseSolutions, measureDisagreement } from '../analyse/retrieval/choose-solutions.ts';
import { invertCell, type RadarLook, solutionProbabilities } from '../analyse/retrieval/invert.ts';
import { type Beams, createBackground, createSolutions, type Swath, WIND } from '../swath/swath.ts';
import { flagBit } from '../wind/flags.ts';
import { fanBeamOrbit, fanBeamSides, locateFanBeamCells, roundTo } from './fan-beam-geometry.ts';
import { measureLooks, type WindField } from './fan-beam-looks.ts';
import type { Crossing } from './orbit.ts';
import { createRandom } from './random.ts';
import { speedAndDirection } from './storm.ts';
import { measureCover, type Surface } from './surface.ts';

export interface FanBeamPassOptions {
  /** Where and when the track crosses the middle row. */
  crossing: Crossing;
  rows: number;
  /** The wind that is there. */
  windAt: WindField;
  /** The wind that a model believes is there: carried as background and used to start the choice of solutions. */
  modelWindAt: WindField;
  surface: Surface;
  /** Rows [first, end) whose fore look was lost, on the left side: cells looked at without a wind. */
  rowsWithoutForeLook: readonly [first: number, end: number];
  seed: number;
  platformCode: number;
}

/** Half side of the square whose land and ice count against a cell, km: 25-km cells resolve about 50 km. */
const FOOTPRINT_HALF_KM = 25;

/** Shares of the footprint above which no wind is retrieved. */
const MOST_LAND = 0.2;
const MOST_ICE = 0.05;

/** Noise above which a look is called noisy, percent. */
const NOISY_PERCENT = 14;

/** Thresholds of the two quality checks, chosen for some tens of cells in a pass. */
const WORST_FIT = 18;
const HOPELESS_FIT = 50;
const MOST_DISAGREEMENT = 0.75;

const SOLUTION_SLOTS = 4;
const SPURIOUS_RATIO = 20;

/**
 * A pass of an invented C-band fan-beam scatterometer over an invented sea: the wind makes the backscatter of three looks
 * by CMOD5.N, noise is added, and winds are retrieved from the looks as from real ones.
 */
export function makeFanBeamPass(options: FanBeamPassOptions): Swath {
  const { swath, beams } = locateFanBeamCells(fanBeamOrbit, options.crossing, options.rows);
  swath.beams = beams;
  swath.cellSizeM = 25_000;
  swath.band = 'C';
  swath.viewing = 'fan-beam';
  swath.platformCode = options.platformCode;
  swath.isDirectionStated = true;
  swath.flagReading = 'as-table';
  swath.iceProbability = new Float32Array(swath.lon.length);
  addBackground(swath, options.modelWindAt);
  look(swath, beams, options);
  retrieve(swath, beams);
  choose(swath);
  return swath;
}

function addBackground(swath: Swath, modelWindAt: WindField): void {
  const background = createBackground(swath.lon.length);
  for (let cell = 0; cell < swath.lon.length; cell++) {
    const wind = speedAndDirection(modelWindAt(swath.lon[cell], swath.lat[cell], swath.timeMs[cell]));
    background.speedMs[cell] = roundTo(wind.speedMs, 2);
    background.directionFrom[cell] = roundTo(wind.directionFrom, 2) % 360;
  }
  swath.background = background;
}

/** Radar looks and what stands in the way of a wind: land, ice, a lost or a noisy look. */
function look(swath: Swath, beams: Beams, { surface, windAt, rowsWithoutForeLook, seed }: FanBeamPassOptions): void {
  const random = createRandom(seed);
  const [firstLost, endLost] = rowsWithoutForeLook;
  for (let cell = 0; cell < swath.lon.length; cell++) {
    const cover = measureCover(surface, swath.lon[cell], swath.lat[cell], FOOTPRINT_HALF_KM);
    measureLooks(swath, beams, cell, windAt, cover.land, random);
    const row = Math.floor(cell / swath.columns);
    const isForeLost = row >= firstLost && row < endLost && cell % swath.columns < fanBeamSides[0][1];
    if (isForeLost) {
      beams.backscatterDb[cell * beams.count] = Number.NaN;
      beams.noisePercent[cell * beams.count] = Number.NaN;
    }
    if (swath.iceProbability !== null) swath.iceProbability[cell] = roundTo(cover.ice, 3);
    let flags = 0;
    if (cover.land > 0) flags |= flagBit.landInCell;
    if (cover.ice > 0) flags |= flagBit.iceInCell;
    const looks = beams.noisePercent.subarray(cell * beams.count, (cell + 1) * beams.count);
    if (isForeLost || cover.land > MOST_LAND) flags |= flagBit.tooFewLooks;
    else if (looks.some((percent) => percent > NOISY_PERCENT)) flags |= flagBit.noisyLook;
    if (cover.ice > MOST_ICE) flags |= flagBit.noWindSolution;
    swath.flags[cell] = flags;
  }
}

/** All possible winds of every cell that can have one, rounded as the file holds them. */
function retrieve(swath: Swath, beams: Beams): void {
  const solutions = createSolutions(swath.lon.length, SOLUTION_SLOTS);
  for (let cell = 0; cell < swath.lon.length; cell++) {
    if ((swath.flags[cell] & (flagBit.tooFewLooks | flagBit.noWindSolution)) !== 0) continue;
    const looks = listLooks(beams, cell);
    if (looks.length < beams.count) {
      swath.flags[cell] |= flagBit.tooFewLooks;
      continue;
    }
    const found = invertCell(looks, { spuriousRatio: SPURIOUS_RATIO });
    const probabilities = solutionProbabilities(found, looks.length);
    for (const [n, solution] of found.entries()) {
      const slot = cell * SOLUTION_SLOTS + n;
      solutions.speedMs[slot] = roundTo(solution.speedMs, 2);
      solutions.directionFrom[slot] = roundTo(solution.directionFrom, 1) % 360;
      solutions.probability[slot] = probabilities[n];
      solutions.fitDistance[slot] = roundTo(Math.min(400, solution.cost), 1);
    }
    if (found[0].cost > WORST_FIT) swath.flags[cell] |= flagBit.fitQualityFailed;
    if (found[0].cost > HOPELESS_FIT) swath.flags[cell] |= flagBit.noWindSolution | flagBit.radarFitTooFar;
  }
  swath.solutions = solutions;
}

function listLooks(beams: Beams, cell: number): RadarLook[] {
  const looks: RadarLook[] = [];
  for (let place = cell * beams.count; place < (cell + 1) * beams.count; place++) {
    if (Number.isNaN(beams.backscatterDb[place])) continue;
    looks.push({
      incidenceDeg: beams.incidenceDeg[place],
      azimuthDeg: beams.azimuthDeg[place],
      backscatter: 10 ** (beams.backscatterDb[place] / 10),
      noise: beams.noisePercent[place] / 100,
    });
  }
  return looks;
}

/** Picks one solution of each cell by the filter, and flags what the picked wind gives cause for. */
function choose(swath: Swath): void {
  const { solutions, background, rows, columns } = swath;
  if (solutions === null) return;
  const field = { rows, columns, solutions, background };
  const rules = { sides: fanBeamSides };
  const chosen = chooseSolutions(field, rules);
  const disagreement = measureDisagreement(field, chosen, rules);
  swath.chosenSolution.set(chosen);
  for (let cell = 0; cell < chosen.length; cell++) {
    if (chosen[cell] === 0) continue;
    const slot = cell * solutions.slots + chosen[cell] - 1;
    const speedMs = solutions.speedMs[slot];
    swath.state[cell] = WIND;
    swath.speedMs[cell] = speedMs;
    swath.directionFrom[cell] = solutions.directionFrom[slot];
    if (speedMs <= 3) swath.flags[cell] |= flagBit.atMost3Ms;
    if (speedMs > 30) swath.flags[cell] |= flagBit.above30Ms;
    if (disagreement[cell] > MOST_DISAGREEMENT * Math.max(6, speedMs)) {
      swath.flags[cell] |= flagBit.fieldConsistencyFailed;
    }
  }
}
