import type { CellCard, PassSummary } from '../contract/values.ts';
import { type Land, nearestLand } from '../geometry/land.ts';
import { Problem } from '../problems/problem.ts';
import type { Archive } from '../store/archive.ts';
import { readCell, type StoredCell } from '../store/cell.ts';
import { readPass } from '../store/passes.ts';
import { LOOKED_NO_WIND, NEVER_LOOKED } from '../swath/swath.ts';
import { cautionCell } from '../wind/cautions.ts';
import { flagWords, listFlags } from '../wind/flags.ts';

/** Everything known of one cell; row and column are counted from 1. Throws 'not-stored' where there is no such cell. */
export function describeCell(
  archive: Archive,
  land: Land,
  place: { passId: number; row: number; column: number },
): CellCard {
  const pass = readPass(archive, place.passId);
  const cell = readCell(archive, place.passId, place.row - 1, place.column - 1);
  if (cell.state === NEVER_LOOKED) {
    throw new Problem('not-stored', 'This place of the pass was never looked at.', {
      file: pass.file,
      part: `row ${place.row}, column ${place.column}`,
    });
  }
  const nearest = nearestLand(land, cell.lon, cell.lat);
  return {
    ...place,
    file: pass.file,
    state: cell.state === LOOKED_NO_WIND ? 'looked but no wind' : 'wind',
    lon: cell.lon,
    lat: cell.lat,
    timeMs: Math.round(cell.timeMs),
    speedMs: orNull(cell.speedMs),
    directionFrom: orNull(cell.directionFrom),
    isDirectionStated: pass.isDirectionStated,
    flagWords: listFlags(cell.flags).map((name) => flagWords[name]),
    flagReading: pass.flagReading,
    checksRain: pass.checksRain,
    rawFlags: cell.rawFlags === 0xffffffff ? null : cell.rawFlags,
    chosenSolution: cell.chosenSolution,
    ...describeGroups(cell),
    cellSizeM: pass.cellSizeM,
    band: pass.band,
    viewing: pass.viewing,
    nearestLand: nearest,
    cautions: cautionCell(toCautioned(pass, cell, nearest?.distanceKm ?? null)),
  };
}

function describeGroups(cell: StoredCell): Pick<CellCard, 'solutions' | 'beams' | 'background' | 'iceProbability'> {
  const { background } = cell;
  return {
    solutions: cell.solutions
      .map((solution, index) => ({
        speedMs: solution.speedMs,
        directionFrom: orNull(solution.directionFrom),
        probability: orNull(solution.probability),
        fitDistance: orNull(solution.fitDistance),
        isChosen: index + 1 === cell.chosenSolution,
      }))
      .filter((solution) => !Number.isNaN(solution.speedMs)),
    beams: cell.beams.map((beam) => ({
      incidenceDeg: orNull(beam.incidenceDeg),
      azimuthDeg: orNull(beam.azimuthDeg),
      backscatterDb: orNull(beam.backscatterDb),
      noisePercent: orNull(beam.noisePercent),
    })),
    background:
      background && !Number.isNaN(background.speedMs)
        ? { speedMs: background.speedMs, directionFrom: orNull(background.directionFrom) }
        : null,
    iceProbability: orNull(cell.iceProbability),
  };
}

function toCautioned(pass: PassSummary, cell: StoredCell, landKm: number | null): Parameters<typeof cautionCell>[0] {
  return {
    hasWind: cell.state !== LOOKED_NO_WIND,
    speedMs: cell.speedMs,
    directionFrom: orNull(cell.directionFrom),
    flags: cell.flags,
    solutionDirections: cell.solutions.map((solution) => solution.directionFrom).filter((one) => !Number.isNaN(one)),
    hasBackground: cell.background !== null && !Number.isNaN(cell.background.speedMs),
    iceProbability: cell.iceProbability,
    band: pass.band,
    checksRain: pass.checksRain,
    areFlagsKnown: pass.flagReading !== 'unknown' && pass.flagReading !== 'absent',
    isDirectionStated: pass.isDirectionStated,
    landKm,
  };
}

function orNull(value: number): number | null {
  return Number.isNaN(value) ? null : value;
}
