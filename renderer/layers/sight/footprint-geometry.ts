import type { DrawBlock } from '../../../src/contract/packed-swath.ts';
import { EARTH_RADIUS_KM } from '../../../src/geometry/sphere.ts';
import { mercatorX, mercatorY } from '../../map/mercator.ts';
import type { Reach } from '../../map/view.ts';
import { NEVER_LOOKED } from '../shared/cells.ts';

const METRES_PER_DEGREE = (Math.PI / 180) * EARTH_RADIUS_KM * 1000;
/** Web Mercator has no poles. */
const NEAREST_POLE = 89;

/** Writes a corner of a cell's footprint, its centre plus or minus each half-side, as x and y in Web Mercator. */
export function writeCorner(
  block: DrawBlock,
  cell: number,
  along: number,
  across: number,
  corners: Float64Array,
  at: number,
): void {
  const sides = block.halfSidesM;
  const east = along * sides[cell * 4] + across * sides[cell * 4 + 2];
  const north = along * sides[cell * 4 + 1] + across * sides[cell * 4 + 3];
  const lat = clampLat(block.latE5[cell] / 1e5 + north / METRES_PER_DEGREE);
  const lon = block.lonE5[cell] / 1e5 + east / METRES_PER_DEGREE / Math.cos((lat * Math.PI) / 180);
  corners[at] = mercatorX(lon);
  corners[at + 1] = mercatorY(lat);
}

/** Bits of a cell's joins. */
export const JOINS_COLUMN = 1;
export const JOINS_ROW = 2;
/** Two footprints hang together when their facing edges lie within this share of a side of each other. */
const JOIN_SLACK = 0.4;

const knownJoins = new WeakMap<DrawBlock, Uint8Array>();

/** For each cell, whether its footprint hangs together with that of the next column and of the next row. */
export function joinsOf(block: DrawBlock): Uint8Array {
  const known = knownJoins.get(block);
  if (known) return known;
  const joins = new Uint8Array(block.cells);
  for (let cell = 0; cell < block.cells; cell++) {
    const isLastColumn = cell % block.columns === block.columns - 1;
    if (!isLastColumn && areJoined(block, cell, cell + 1, 2)) joins[cell] |= JOINS_COLUMN;
    if (cell + block.columns < block.cells && areJoined(block, cell, cell + block.columns, 0)) joins[cell] |= JOINS_ROW;
  }
  knownJoins.set(block, joins);
  return joins;
}

/** Compares the step between two centres with the sum of their half-sides along it (`side` 0 along track, 2 across). */
function areJoined(block: DrawBlock, from: number, to: number, side: number): boolean {
  const sides = block.halfSidesM;
  const sideEast = sides[from * 4 + side] + sides[to * 4 + side];
  const sideNorth = sides[from * 4 + side + 1] + sides[to * 4 + side + 1];
  const cosLat = Math.cos((((block.latE5[from] + block.latE5[to]) / 2e5) * Math.PI) / 180);
  let lonE5 = block.lonE5[to] - block.lonE5[from];
  lonE5 -= Math.round(lonE5 / 360e5) * 360e5;
  const east = (lonE5 / 1e5) * METRES_PER_DEGREE * cosLat;
  const north = ((block.latE5[to] - block.latE5[from]) / 1e5) * METRES_PER_DEGREE;
  return Math.hypot(east - sideEast, north - sideNorth) < JOIN_SLACK * Math.hypot(sideEast, sideNorth);
}

const knownBounds = new WeakMap<DrawBlock, Reach>();
/** Cells reach past their centres by less than so much of the world. */
const BOUNDS_MARGIN = 0.01;

/** The box of a block in Web Mercator; all the way round where it crosses the date line or comes near a pole. */
export function boundsOf(block: DrawBlock): Reach {
  const known = knownBounds.get(block);
  if (known) return known;
  const bounds = { west: Infinity, east: -Infinity, north: Infinity, south: -Infinity };
  for (let cell = 0; cell < block.cells; cell++) {
    if (block.state[cell] === NEVER_LOOKED) continue;
    const x = mercatorX(block.lonE5[cell] / 1e5);
    const y = mercatorY(clampLat(block.latE5[cell] / 1e5));
    bounds.west = Math.min(bounds.west, x - BOUNDS_MARGIN);
    bounds.east = Math.max(bounds.east, x + BOUNDS_MARGIN);
    bounds.north = Math.min(bounds.north, y - BOUNDS_MARGIN);
    bounds.south = Math.max(bounds.south, y + BOUNDS_MARGIN);
  }
  if (bounds.east - bounds.west > 0.5) Object.assign(bounds, { west: 0, east: 1 });
  knownBounds.set(block, bounds);
  return bounds;
}

/** Whether two boxes touch in some copy of the world. */
export function touches(box: Reach, reach: Reach): boolean {
  if (box.south < reach.north || box.north > reach.south) return false;
  const past = box.east - reach.west;
  return past - Math.floor(past) <= reach.east - reach.west + (box.east - box.west);
}

function clampLat(lat: number): number {
  return Math.max(-NEAREST_POLE, Math.min(NEAREST_POLE, lat));
}
