import { type EqualAreaGrid, gridColumnAt, gridRowAt } from '../../geometry/equal-area-grid.ts';
import { EARTH_RADIUS_KM } from '../../geometry/sphere.ts';
import type { SeenBlock } from '../../swath/seen-block.ts';
import { LOOKED_NO_WIND, NEVER_LOOKED, WIND } from '../../swath/swath.ts';

/** How much of some water was looked at. All shares are of its sea, 0 to 1. */
export interface Coverage {
  seaKm2: number;
  /** Outside every footprint: nobody looked. NaN where the water holds no sea. */
  unseenShare: number;
  /** Inside footprints, but none of them held a wind. NaN likewise. */
  noWindShare: number;
  /** What each pass looked at, with or without a wind, by pass id. */
  seenShareOfPass: Map<number, number>;
}

/** A footprint is drawn and counted this much larger than the lattice step, so that neighbours leave no hairline between. */
export const FOOTPRINT_OVERLAP = 1.02;

const RADIANS = Math.PI / 180;

/**
 * Measures coverage on a grid of equal-area points: a point of sea is seen where it lies in the footprint of a cell that
 * passes the test. `isSea` has 1 for each point of the water in question. Blocks of one pass must stand together.
 */
export function measureCoverage(
  grid: EqualAreaGrid,
  isSea: Uint8Array,
  blocks: readonly SeenBlock[],
  isCounted: (block: SeenBlock, cell: number) => boolean,
): Coverage {
  const best = new Uint8Array(isSea.length);
  const lastPass = new Int32Array(isSea.length).fill(-1);
  const pointsOfPass = new Map<number, number>();
  const trigonometry = tabulate(grid);
  for (const block of blocks) {
    let points = pointsOfPass.get(block.passId) ?? 0;
    for (let cell = 0; cell < block.cells; cell++) {
      const state = block.state[cell];
      if (state === NEVER_LOOKED || !isCounted(block, cell)) continue;
      visitPointsOfCell(grid, trigonometry, block, cell, (point) => {
        if (isSea[point] === 0) return;
        if (state > best[point]) best[point] = state;
        if (lastPass[point] === block.passId) return;
        lastPass[point] = block.passId;
        points++;
      });
    }
    pointsOfPass.set(block.passId, points);
  }
  return sumUp(grid, isSea, best, pointsOfPass);
}

function sumUp(grid: EqualAreaGrid, isSea: Uint8Array, best: Uint8Array, pointsOfPass: Map<number, number>): Coverage {
  let sea = 0;
  let noWind = 0;
  let wind = 0;
  for (let point = 0; point < isSea.length; point++) {
    sea += isSea[point];
    if (best[point] === WIND) wind++;
    else if (best[point] === LOOKED_NO_WIND) noWind++;
  }
  return {
    seaKm2: sea * grid.pointKm2,
    unseenShare: sea === 0 ? Number.NaN : (sea - wind - noWind) / sea,
    noWindShare: sea === 0 ? Number.NaN : noWind / sea,
    seenShareOfPass: new Map([...pointsOfPass].map(([passId, points]) => [passId, sea === 0 ? 0 : points / sea])),
  };
}

interface Trigonometry {
  sinLon: Float64Array;
  cosLon: Float64Array;
  sinLat: Float64Array;
  cosLat: Float64Array;
}

function tabulate(grid: EqualAreaGrid): Trigonometry {
  return {
    sinLon: grid.columnLon.map((lon) => Math.sin(lon * RADIANS)),
    cosLon: grid.columnLon.map((lon) => Math.cos(lon * RADIANS)),
    sinLat: grid.rowLat.map((lat) => Math.sin(lat * RADIANS)),
    cosLat: grid.rowLat.map((lat) => Math.cos(lat * RADIANS)),
  };
}

/**
 * Visits the grid's points in a cell's parallelogram, measured on the plane that touches the sphere at the cell's centre
 * (orthographic: at 25 km its error is under a metre), so that nothing special happens at the poles or the date line.
 */
function visitPointsOfCell(
  grid: EqualAreaGrid,
  trigonometry: Trigonometry,
  block: SeenBlock,
  cell: number,
  visit: (point: number) => void,
): void {
  const lon = block.lonE5[cell] / 1e5;
  const lat = block.latE5[cell] / 1e5;
  const scale = FOOTPRINT_OVERLAP / (EARTH_RADIUS_KM * 1000);
  const aEast = block.halfSidesM[cell * 4] * scale;
  const aNorth = block.halfSidesM[cell * 4 + 1] * scale;
  const bEast = block.halfSidesM[cell * 4 + 2] * scale;
  const bNorth = block.halfSidesM[cell * 4 + 3] * scale;
  const area = aEast * bNorth - aNorth * bEast;
  if (area === 0) return;

  const reachEast = Math.abs(aEast) + Math.abs(bEast);
  const reachNorth = Math.abs(aNorth) + Math.abs(bNorth);
  // Near a pole a step east leads across parallels too.
  const reachLat = (Math.abs(lat) > 85 ? Math.hypot(reachEast, reachNorth) : reachNorth) / RADIANS;
  const firstRow = Math.max(0, gridRowAt(grid, Math.max(-90, lat - reachLat)));
  const lastRow = Math.min(grid.rows - 1, gridRowAt(grid, Math.min(90, lat + reachLat)));
  if (firstRow > lastRow) return;
  const highestCos = Math.cos(Math.min(90, Math.abs(lat) + reachLat) * RADIANS);
  const reachLon = reachEast / RADIANS / Math.max(1e-9, highestCos);
  const columnSpan = reachLon >= 180 ? grid.columns : Math.ceil((2 * reachLon * grid.columns) / grid.widthDeg) + 1;
  const firstColumn = reachLon >= 180 ? 0 : firstColumnFrom(grid, lon - reachLon);
  if (firstColumn >= grid.columns || firstColumn + columnSpan < 0) return;

  const sinLon0 = Math.sin(lon * RADIANS);
  const cosLon0 = Math.cos(lon * RADIANS);
  const sinLat0 = Math.sin(lat * RADIANS);
  const cosLat0 = Math.cos(lat * RADIANS);
  for (let row = firstRow; row <= lastRow; row++) {
    const sinLat = trigonometry.sinLat[row];
    const cosLat = trigonometry.cosLat[row];
    for (let step = 0; step < Math.min(columnSpan, grid.columns); step++) {
      const column = grid.widthDeg === 360 ? (firstColumn + step + grid.columns) % grid.columns : firstColumn + step;
      if (column < 0 || column >= grid.columns) continue;
      const sinDelta = trigonometry.sinLon[column] * cosLon0 - trigonometry.cosLon[column] * sinLon0;
      const cosDelta = trigonometry.cosLon[column] * cosLon0 + trigonometry.sinLon[column] * sinLon0;
      if (sinLat * sinLat0 + cosLat * cosLat0 * cosDelta < 0) continue;
      const east = cosLat * sinDelta;
      const north = cosLat0 * sinLat - sinLat0 * cosLat * cosDelta;
      const alongA = (east * bNorth - north * bEast) / area;
      const alongB = (aEast * north - aNorth * east) / area;
      if (Math.abs(alongA) <= 1 && Math.abs(alongB) <= 1) visit(row * grid.columns + column);
    }
  }
}

/** The first column at or east of a longitude a little west of a cell; negative when the cell lies just past the western edge. */
function firstColumnFrom(grid: EqualAreaGrid, lon: number): number {
  const column = gridColumnAt(grid, lon);
  const columnsRound = Math.round((360 / grid.widthDeg) * grid.columns);
  return column > grid.columns + (columnsRound - grid.columns) / 2 ? column - columnsRound : column;
}
