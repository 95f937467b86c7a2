import { modelBackscatter } from '../analyse/retrieval/cmod5n.ts';
import { createBackground, createSolutions, type Swath, WIND } from '../swath/swath.ts';
import { flagBit } from '../wind/flags.ts';
import { fanBeamOrbit, locateFanBeamCells, roundTo } from './fan-beam-geometry.ts';

/** Rows of a whole orbit, as in real files. */
const ROWS = 1632;

const SLOTS = 4;
const RADIANS = Math.PI / 180;

/**
 * A whole invented orbit of 1632 x 42 cells with beams and two to four solutions, for measuring speed. Winds are smooth
 * waves over the globe, land is where another wave is high; solutions are written down, not retrieved.
 */
export function makeBenchmarkOrbit(): Swath {
  const crossing = { lon: -61.33, lat: 0, timeMs: Date.UTC(2031, 0, 17, 6), isAscending: true };
  const { swath, beams } = locateFanBeamCells(fanBeamOrbit, crossing, ROWS);
  const cells = swath.lon.length;
  const solutions = createSolutions(cells, SLOTS);
  const background = createBackground(cells);
  swath.beams = beams;
  swath.solutions = solutions;
  swath.background = background;
  swath.iceProbability = new Float32Array(cells);
  swath.cellSizeM = 25_000;
  swath.band = 'C';
  swath.viewing = 'fan-beam';
  swath.platformCode = 904;
  swath.isDirectionStated = true;
  swath.flagReading = 'as-table';
  for (let cell = 0; cell < cells; cell++) {
    const lon = swath.lon[cell] * RADIANS;
    const lat = swath.lat[cell] * RADIANS;
    const speedMs = roundTo(11 + 7 * Math.sin(3 * lon + 2 * lat) * Math.cos(5 * lat) + 4 * Math.sin(11 * lon), 2);
    const directionFrom = roundTo(180 + 170 * Math.sin(2 * lon) * Math.cos(3 * lat), 1);
    background.speedMs[cell] = roundTo(speedMs * 0.95, 2);
    background.directionFrom[cell] = roundTo(directionFrom + 5, 2);
    for (let look = cell * 3; look < cell * 3 + 3; look++) {
      const relativeDeg = directionFrom - beams.azimuthDeg[look] - 180;
      const echo = modelBackscatter(speedMs, relativeDeg, beams.incidenceDeg[look]);
      beams.backscatterDb[look] = roundTo(10 * Math.log10(echo), 2);
      beams.noisePercent[look] = roundTo(2 + (look % 7) / 2, 1);
    }
    if (isBenchmarkLand(lon, lat)) swath.flags[cell] = flagBit.landInCell | flagBit.tooFewLooks;
    else addWind(swath, cell, speedMs, directionFrom);
  }
  return swath;
}

function isBenchmarkLand(lon: number, lat: number): boolean {
  return Math.sin(2 * lon + 1) * Math.cos(2 * lat) + 0.4 * Math.sin(7 * lon) * Math.sin(9 * lat) > 0.25;
}

/** Two to four solutions, the chosen one first or, in every fourth cell, second. */
function addWind(swath: Swath, cell: number, speedMs: number, directionFrom: number): void {
  const { solutions } = swath;
  if (solutions === null) return;
  const count = 2 + (cell % 3);
  const chosen = cell % 4 === 0 ? 1 : 0;
  for (let n = 0; n < count; n++) {
    const slot = cell * SLOTS + n;
    const place = n < 2 ? Number(n !== chosen) : n;
    solutions.speedMs[slot] = roundTo(speedMs * (1 + 0.04 * place), 2);
    solutions.directionFrom[slot] = roundTo((directionFrom + [0, 180, 90, 270][place]) % 360, 1);
    solutions.probability[slot] = [0.55, 0.44, 0.006, 0.004][n] / [1, 0.99, 0.996, 1][count - 1];
    solutions.fitDistance[slot] = roundTo(n < 2 ? 0.5 + n / 10 : 20 + n, 1);
  }
  swath.state[cell] = WIND;
  swath.chosenSolution[cell] = chosen + 1;
  swath.speedMs[cell] = solutions.speedMs[cell * SLOTS + chosen];
  swath.directionFrom[cell] = solutions.directionFrom[cell * SLOTS + chosen];
  if (swath.speedMs[cell] <= 3) swath.flags[cell] |= flagBit.atMost3Ms;
  if (swath.speedMs[cell] > 30) swath.flags[cell] |= flagBit.above30Ms;
}
