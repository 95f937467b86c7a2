import { Problem } from '../../../problems/problem.ts';
import { LOOKED_NO_WIND, type Swath } from '../../../swath/swath.ts';
import { type CfFile, tellProblem } from './cf-file.ts';
import type { SwathVariables } from './find-variables.ts';
import { unpackValues } from './unpack-values.ts';

/**
 * Sets the position of every cell of a pass and marks as looked at all that have one; longitudes 0 to 360 become -180
 * to 180. Rows of fill in cut or merged files stay 'never looked'. Returns how many cells were looked at.
 */
export function readPositions(file: CfFile, variables: SwathVariables, first: number, swath: Swath): number {
  const taking = { first, count: swath.state.length, factor: 1 };
  unpackValues(file, variables.lon, { ...taking, plausibleHighest: 360 }, (lons, start) => swath.lon.set(lons, start));
  const counts = { looked: 0, impossible: 0 };
  unpackValues(file, variables.lat, { ...taking, plausibleHighest: 90 }, (lats, start) => {
    placeCells(swath, lats, start, counts);
  });
  if (counts.impossible > 0) {
    const sentence = `${counts.impossible} cells have positions that are not on the earth; they count as never looked at.`;
    tellProblem(file, new Problem('values-out-of-range', sentence));
  }
  return counts.looked;
}

function placeCells(
  { state, lon, lat }: Swath,
  lats: Float64Array,
  start: number,
  counts: { looked: number; impossible: number },
): void {
  let looked = 0;
  for (let i = 0; i < lats.length; i++) {
    const cell = start + i;
    const cellLon = lon[cell];
    if (lats[i] >= -90 && lats[i] <= 90 && cellLon >= -180 && cellLon <= 360) {
      state[cell] = LOOKED_NO_WIND;
      lat[cell] = lats[i];
      if (cellLon >= 180) lon[cell] = cellLon - 360;
      looked++;
    } else {
      if (!Number.isNaN(lats[i]) && !Number.isNaN(cellLon)) counts.impossible++;
      lon[cell] = Number.NaN;
    }
  }
  counts.looked += looked;
}
