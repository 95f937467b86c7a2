import { EARTH_RADIUS_KM, longitudeDifference } from '../geometry/sphere.ts';
import { NEVER_LOOKED, type Swath } from './swath.ts';

/**
 * The patch of water each cell stands for, as two half-sides of a parallelogram about the cell's centre, in metres east
 * and north. Entries 4 * cell to 4 * cell + 3: along-track east, along-track north, cross-track east, cross-track north;
 * 0 where never looked. A corner is the centre plus or minus each half-side.
 */
export interface Footprints {
  halfSidesM: Int16Array;
}

/** How much longer than the cell size a step between neighbours may be before they are no neighbours (nadir gap, lost rows). */
const LONGEST_STEP = 1.6;

const METRES_PER_DEGREE = (Math.PI / 180) * EARTH_RADIUS_KM * 1000;

/**
 * Footprints of all cells, from the lattice itself: half the step to the real neighbours on either side. A cell with no
 * neighbour along one axis gets a side of its cell size square to the other axis. Neighbours in the array that are
 * farther apart than 1.6 cell sizes are none, so no footprint reaches into the nadir gap.
 */
export function measureFootprints(swath: Swath): Footprints {
  const { rows, columns } = swath;
  const halfSidesM = new Int16Array(rows * columns * 4);
  const along: Side = { east: 0, north: 0 };
  const across: Side = { east: 0, north: 0 };
  const sizeM = swath.cellSizeM > 0 ? swath.cellSizeM : 25_000;
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      const cell = row * columns + column;
      if (swath.state[cell] === NEVER_LOOKED) continue;
      const hasAlong = measureSide(
        swath,
        cell,
        row > 0 ? cell - columns : -1,
        row + 1 < rows ? cell + columns : -1,
        sizeM,
        along,
      );
      const hasAcross = measureSide(
        swath,
        cell,
        column > 0 ? cell - 1 : -1,
        column + 1 < columns ? cell + 1 : -1,
        sizeM,
        across,
      );
      if (!hasAlong && !hasAcross) setSide(along, 0, sizeM / 2);
      else if (!hasAlong) setSquare(along, across, sizeM / 2);
      if (!hasAcross) setSquare(across, along, sizeM / 2);
      halfSidesM[cell * 4] = along.east;
      halfSidesM[cell * 4 + 1] = along.north;
      halfSidesM[cell * 4 + 2] = across.east;
      halfSidesM[cell * 4 + 3] = across.north;
    }
  }
  return { halfSidesM };
}

interface Side {
  east: number;
  north: number;
}

/** Half the mean step through a cell from the neighbour before to the one after; false where neither is real. */
function measureSide(swath: Swath, cell: number, before: number, after: number, sizeM: number, side: Side): boolean {
  let east = 0;
  let north = 0;
  let steps = 0;
  for (const [neighbour, sign] of [
    [before, -1],
    [after, 1],
  ] as const) {
    if (neighbour < 0 || swath.state[neighbour] === NEVER_LOOKED) continue;
    const stepNorth = (swath.lat[neighbour] - swath.lat[cell]) * METRES_PER_DEGREE;
    const stepEast =
      longitudeDifference(swath.lon[cell], swath.lon[neighbour]) *
      METRES_PER_DEGREE *
      Math.cos((((swath.lat[neighbour] + swath.lat[cell]) / 2) * Math.PI) / 180);
    if (Math.hypot(stepEast, stepNorth) > sizeM * LONGEST_STEP) continue;
    east += sign * stepEast;
    north += sign * stepNorth;
    steps++;
  }
  if (steps === 0) return false;
  setSide(side, east / steps / 2, north / steps / 2);
  return true;
}

function setSide(side: Side, east: number, north: number): void {
  side.east = Math.round(Math.max(-32767, Math.min(32767, east)));
  side.north = Math.round(Math.max(-32767, Math.min(32767, north)));
}

/** A side of a given half-length at a right angle to another. */
function setSquare(side: Side, other: Side, halfM: number): void {
  const length = Math.hypot(other.east, other.north) || 1;
  setSide(side, (-other.north / length) * halfM, (other.east / length) * halfM);
}
