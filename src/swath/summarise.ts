import { isGale } from '../wind/beaufort.ts';
import { flagBit } from '../wind/flags.ts';
import { NEVER_LOOKED, type Swath, WIND } from './swath.ts';

/** What a whole swath comes to. Rows and columns are counted from 1. The figures of the maximum are null without a wind. */
export interface SwathSummary {
  /** Times of the first and last look, ms; NaN when nothing was looked at. */
  startMs: number;
  endMs: number;
  /** Cells that were looked at, with a wind or without. */
  cells: number;
  winds: number;
  /** Winds of gale force or more by the whole-knot rule. */
  galeWinds: number;
  maxSpeedMs: number | null;
  maxLon: number | null;
  maxLat: number | null;
  maxTimeMs: number | null;
  maxRow: number | null;
  maxColumn: number | null;
  /** Whether any cell was found to hold rain: the only proof in a file that its producer looks for rain at all. */
  checksRain: boolean;
}

/** Counts a swath and finds its strongest wind (the first of equals). */
export function summariseSwath(swath: Swath): SwathSummary {
  let startMs = Number.POSITIVE_INFINITY;
  let endMs = Number.NEGATIVE_INFINITY;
  let cells = 0;
  let winds = 0;
  let galeWinds = 0;
  let strongest = -1;
  let checksRain = false;
  for (let cell = 0; cell < swath.state.length; cell++) {
    if (swath.state[cell] === NEVER_LOOKED) continue;
    cells++;
    if (swath.timeMs[cell] < startMs) startMs = swath.timeMs[cell];
    if (swath.timeMs[cell] > endMs) endMs = swath.timeMs[cell];
    if (swath.flags[cell] & flagBit.rain) checksRain = true;
    if (swath.state[cell] !== WIND) continue;
    winds++;
    if (isGale(swath.speedMs[cell])) galeWinds++;
    if (strongest < 0 || swath.speedMs[cell] > swath.speedMs[strongest]) strongest = cell;
  }
  const hasWind = strongest >= 0;
  return {
    startMs: startMs <= endMs ? startMs : Number.NaN,
    endMs: startMs <= endMs ? endMs : Number.NaN,
    cells,
    winds,
    galeWinds,
    maxSpeedMs: hasWind ? swath.speedMs[strongest] : null,
    maxLon: hasWind ? swath.lon[strongest] : null,
    maxLat: hasWind ? swath.lat[strongest] : null,
    maxTimeMs: hasWind ? swath.timeMs[strongest] : null,
    maxRow: hasWind ? Math.floor(strongest / swath.columns) + 1 : null,
    maxColumn: hasWind ? (strongest % swath.columns) + 1 : null,
    checksRain,
  };
}
