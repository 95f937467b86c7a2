import type { ToldProblem } from '../contract/values.ts';
import { describePlace, type Problem, toProblem } from '../problems/problem.ts';
import { summariseSwath } from '../swath/summarise.ts';
import { NEVER_LOOKED, type Swath, WIND } from '../swath/swath.ts';
import { type FlagName, flagBit, flagNames } from '../wind/flags.ts';
import { decodeFile } from '../workers/decode-file.ts';

/** What one file holds, counted before anything is stored or removed. */
export interface InspectedFile {
  /** As the user gave it. */
  file: string;
  /** In plain words; null where no reader knew the file. */
  format: string | null;
  passes: InspectedPass[];
  problems: ToldProblem[];
}

/** One pass of it. Times are ISO 8601 in UTC; the figures of the maximum are null without a wind. */
export interface InspectedPass {
  start: string | null;
  end: string | null;
  rows: number;
  columns: number;
  /** Cells looked at. */
  cells: number;
  winds: number;
  sumSpeedMs: number;
  /** Of the wind's motion; null where winds are there but no direction is known. */
  sumEastwardMs: number | null;
  sumNorthwardMs: number | null;
  maxSpeedMs: number | null;
  maxLon: number | null;
  maxLat: number | null;
  maxTime: string | null;
  windsAtLeast17p2Ms: number;
  /** By the whole-knot rule. */
  windsOfGale: number;
  /** Cells that carry each flag, by our names; flags of no cell are left out. */
  flagCounts: Partial<Record<FlagName, number>>;
  directionStated: boolean;
  /** Radar looks kept for each cell. */
  beams: number;
  /** The most solutions any cell holds. */
  solutionsMax: number;
  windsNotFirstSolution: number;
  notes: string[];
}

/** Decodes files without storing them, one after the other. What cannot be read is told, never thrown. */
export function inspectFiles(paths: readonly string[]): InspectedFile[] {
  return paths.map(inspectFile);
}

function inspectFile(file: string): InspectedFile {
  try {
    const { format, swaths, problems } = decodeFile(file);
    return { file, format, passes: swaths.map(inspectSwath), problems: problems.map((one) => tell(one, file)) };
  } catch (thrown) {
    return { file, format: null, passes: [], problems: [tell(toProblem(thrown), file)] };
  }
}

function tell({ code, message, place }: Problem, file: string): ToldProblem {
  return { code, message, where: describePlace({ ...place, file }) };
}

function inspectSwath(swath: Swath): InspectedPass {
  const summary = summariseSwath(swath);
  const sums = sumWinds(swath);
  const isDirectionKnown = summary.winds === 0 || sums.directions > 0;
  return {
    start: tellTime(summary.startMs),
    end: tellTime(summary.endMs),
    rows: swath.rows,
    columns: swath.columns,
    cells: summary.cells,
    winds: summary.winds,
    sumSpeedMs: round(sums.speed, 4),
    sumEastwardMs: isDirectionKnown ? round(sums.eastward, 4) : null,
    sumNorthwardMs: isDirectionKnown ? round(sums.northward, 4) : null,
    maxSpeedMs: roundOrNull(summary.maxSpeedMs, 4),
    maxLon: roundOrNull(summary.maxLon, 5),
    maxLat: roundOrNull(summary.maxLat, 5),
    maxTime: tellTime(summary.maxTimeMs),
    windsAtLeast17p2Ms: sums.atLeast17p2,
    windsOfGale: summary.galeWinds,
    flagCounts: countFlags(swath),
    directionStated: swath.isDirectionStated,
    beams: swath.beams?.count ?? 0,
    solutionsMax: countSolutions(swath),
    windsNotFirstSolution: sums.notFirst,
    notes: swath.notes,
  };
}

/** Speeds are held in 32 bits, so 17.2 may be this much less than itself, m/s. */
const SPEED_SLACK_MS = 1e-6;

function sumWinds(swath: Swath) {
  const sums = { speed: 0, eastward: 0, northward: 0, directions: 0, atLeast17p2: 0, notFirst: 0 };
  for (let cell = 0; cell < swath.state.length; cell++) {
    if (swath.state[cell] !== WIND) continue;
    const speedMs = swath.speedMs[cell];
    sums.speed += speedMs;
    if (speedMs + SPEED_SLACK_MS >= 17.2) sums.atLeast17p2++;
    if (swath.chosenSolution[cell] > 1) sums.notFirst++;
    if (Number.isNaN(swath.directionFrom[cell])) continue;
    sums.directions++;
    // Blowing from a direction is moving the other way.
    sums.eastward -= speedMs * Math.sin((swath.directionFrom[cell] * Math.PI) / 180);
    sums.northward -= speedMs * Math.cos((swath.directionFrom[cell] * Math.PI) / 180);
  }
  return sums;
}

function countFlags(swath: Swath): Partial<Record<FlagName, number>> {
  const counts: Partial<Record<FlagName, number>> = {};
  for (const name of flagNames) {
    let count = 0;
    for (let cell = 0; cell < swath.state.length; cell++) {
      if (swath.state[cell] !== NEVER_LOOKED && swath.flags[cell] & flagBit[name]) count++;
    }
    if (count > 0) counts[name] = count;
  }
  return counts;
}

function countSolutions({ solutions, state }: Swath): number {
  if (solutions === null) return 0;
  let most = 0;
  for (let cell = 0; cell < state.length; cell++) {
    let count = 0;
    for (let slot = 0; slot < solutions.slots; slot++) {
      if (!Number.isNaN(solutions.speedMs[cell * solutions.slots + slot])) count++;
    }
    most = Math.max(most, count);
  }
  return most;
}

function tellTime(timeMs: number | null): string | null {
  if (timeMs === null || !Number.isFinite(timeMs)) return null;
  return new Date(timeMs).toISOString().replace('.000Z', 'Z');
}

function roundOrNull(value: number | null, decimals: number): number | null {
  return value === null ? null : round(value, decimals);
}

/** A value as decimals show it: 32-bit speeds would otherwise print as 10.699999809. */
function round(value: number, decimals: number): number {
  return Number(value.toFixed(decimals));
}
