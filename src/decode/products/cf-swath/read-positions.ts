import { Problem } from '../../../problems/problem.ts';
import { LOOKED_NO_WIND, type Swath } from '../../../swath/swath.ts';
import { type CfFile, tellProblem } from './cf-file.ts';
import type { SwathVariables } from './find-variables.ts';
import { OUT_OF_RANGE, unpackValues } from './unpack-values.ts';

/**
 * Sets the position of every cell of a pass and marks as looked at all that have one; longitudes 0 to 360 become -180
 * to 180. Rows of fill in cut or merged files stay 'never looked'. Returns how many cells were looked at.
 */
export function readPositions(file: CfFile, variables: SwathVariables, first: number, swath: Swath): number {
  const taking = { first, count: swath.state.length, factor: 1, outOfRange: OUT_OF_RANGE };
  unpackValues(file, variables.lon, { ...taking, plausibleHighest: 360 }, (lons, start) => swath.lon.set(lons, start));
  const counts = { looked: 0, impossible: 0 };
  unpackValues(file, variables.lat, { ...taking, plausibleHighest: 90 }, (lats, start) => {
    placeCells(swath, lats, start, counts);
  });
  if (counts.impossible > 0) {
    const sentence = `Cells with a position that is not on the earth: ${counts.impossible}. They count as never looked at.`;
    tellProblem(file, new Problem('values-out-of-range', sentence));
  }
  return counts.looked;
}

/** Rounding in a file's scale factor may carry a pole or a meridian this far beyond itself, degrees. */
const SLACK_DEG = 0.001;

function placeCells(
  { state, lon, lat }: Swath,
  lats: Float64Array,
  start: number,
  counts: { looked: number; impossible: number },
): void {
  let looked = 0;
  for (let i = 0; i < lats.length; i++) {
    const cell = start + i;
    const cellLat = lats[i];
    const cellLon = lon[cell];
    if (Math.abs(cellLat) <= 90 + SLACK_DEG && cellLon >= -180 - SLACK_DEG && cellLon <= 360 + SLACK_DEG) {
      state[cell] = LOOKED_NO_WIND;
      lat[cell] = Math.min(90, Math.max(-90, cellLat));
      if (cellLon >= 180) lon[cell] = cellLon - 360;
      else if (cellLon < -180) lon[cell] = cellLon + 360;
      looked++;
    } else {
      if (!Number.isNaN(cellLat) && !Number.isNaN(cellLon)) counts.impossible++;
      lon[cell] = Number.NaN;
    }
  }
  counts.looked += looked;
}
