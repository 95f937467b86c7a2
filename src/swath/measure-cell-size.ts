import { distanceKm } from '../geometry/sphere.ts';
import { NEVER_LOOKED, type Swath } from './swath.ts';

/** Pairs of neighbours looked at, spread over the swath: enough for a steady median. */
const MOST_PAIRS = 2000;

/**
 * The median distance between column neighbours of a swath in metres, NaN where no two neighbours were looked at. The
 * median leaves out the nadir gap, which stands between two neighbours of each row only.
 */
export function measureCellSize(swath: Swath): number {
  const { rows, columns, state, lon, lat } = swath;
  const distances: number[] = [];
  const step = Math.max(1, Math.floor((rows * columns) / MOST_PAIRS));
  for (let cell = 0; cell < rows * columns - 1; cell += step) {
    if (cell % columns === columns - 1) continue;
    if (state[cell] === NEVER_LOOKED || state[cell + 1] === NEVER_LOOKED) continue;
    distances.push(distanceKm(lon[cell], lat[cell], lon[cell + 1], lat[cell + 1]));
  }
  if (distances.length === 0) return Number.NaN;
  distances.sort((a, b) => a - b);
  return distances[Math.floor(distances.length / 2)] * 1000;
}
