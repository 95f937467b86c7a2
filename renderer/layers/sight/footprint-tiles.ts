import type { DrawBlock } from '../../../src/contract/packed-swath.ts';
import { EARTH_RADIUS_KM } from '../../../src/geometry/sphere.ts';
import { mercatorX, mercatorY } from '../../map/mercator.ts';
import type { Reach } from '../../map/view.ts';
import type { Cells } from '../shared/cells.ts';
import { NOT_SHOWN, SHOWN_WITHOUT_WIND } from '../shared/shown.ts';

/** Footprints as quads, four corners of x and y in Web Mercator each. */
export interface FootprintTiles {
  noWind: number[];
  wind: number[];
}

/** Footprints are drawn so much longer than they are, from the middle out, so that no hairline opens between two. */
const ENLARGED = 1.02;

/**
 * The footprints of all shown cells that lie in reach. Up to `most` by `most` neighbours (a power of two) that were seen
 * alike become one quad; where they differ, or are no neighbours, each stands for itself, so nothing unseen is covered.
 */
export function tileFootprints(cells: Cells, kinds: Uint8Array, most: number, reach: Reach): FootprintTiles {
  const tiles: FootprintTiles = { noWind: [], wind: [] };
  cells.blocks.forEach((block, b) => {
    if (!touches(boundsOf(block), reach)) return;
    const firstCell = cells.firstCell[b];
    const blockKinds = kinds.subarray(firstCell, firstCell + block.cells);
    for (let row = 0; row < block.rows; row += most) {
      for (let column = 0; column < block.columns; column += most) {
        addTile(block, blockKinds, row, column, most, reach, tiles);
      }
    }
  });
  return tiles;
}

function addTile(
  block: DrawBlock,
  kinds: Uint8Array,
  row: number,
  column: number,
  size: number,
  reach: Reach,
  tiles: FootprintTiles,
): void {
  if (row >= block.rows || column >= block.columns) return;
  const rows = Math.min(size, block.rows - row);
  const columns = Math.min(size, block.columns - column);
  const first = row * block.columns + column;
  if (isAlike(kinds, joinsOf(block), block.columns, first, rows, columns)) {
    if (kinds[first] === NOT_SHOWN) return;
    addQuad(block, first, rows, columns, reach, kinds[first] === SHOWN_WITHOUT_WIND ? tiles.noWind : tiles.wind);
    return;
  }
  const half = size / 2;
  addTile(block, kinds, row, column, half, reach, tiles);
  addTile(block, kinds, row, column + half, half, reach, tiles);
  addTile(block, kinds, row + half, column, half, reach, tiles);
  addTile(block, kinds, row + half, column + half, half, reach, tiles);
}

/** Whether cells were all seen alike and, unless none is shown, hang together. */
function isAlike(
  kinds: Uint8Array,
  joins: Uint8Array,
  stride: number,
  first: number,
  rows: number,
  columns: number,
): boolean {
  const sight = sightOf(kinds[first]);
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      const cell = first + row * stride + column;
      if (sightOf(kinds[cell]) !== sight) return false;
      if (sight === NOT_SHOWN) continue;
      if (column + 1 < columns && (joins[cell] & JOINS_COLUMN) === 0) return false;
      if (row + 1 < rows && (joins[cell] & JOINS_ROW) === 0) return false;
    }
  }
  return true;
}

/** A hidden wind was seen as well as a shown one. */
function sightOf(kind: number): number {
  return Math.min(kind, SHOWN_WITHOUT_WIND + 1);
}

function addQuad(block: DrawBlock, first: number, rows: number, columns: number, reach: Reach, quads: number[]): void {
  const lastRow = first + (rows - 1) * block.columns;
  const lastColumn = columns - 1;
  const corners = [
    cornerOf(block, first, -1, -1),
    cornerOf(block, first + lastColumn, -1, 1),
    cornerOf(block, lastRow, 1, -1),
    cornerOf(block, lastRow + lastColumn, 1, 1),
  ];
  const x0 = corners[0][0];
  for (const corner of corners) corner[0] -= Math.round(corner[0] - x0);
  const middleX = (corners[0][0] + corners[1][0] + corners[2][0] + corners[3][0]) / 4;
  const middleY = (corners[0][1] + corners[1][1] + corners[2][1] + corners[3][1]) / 4;
  const wide = Math.max(...corners.map(([x]) => Math.abs(x - middleX)));
  const high = Math.max(...corners.map(([, y]) => Math.abs(y - middleY)));
  const bounds = { west: middleX - wide, east: middleX + wide, north: middleY - high, south: middleY + high };
  if (!touches(bounds, reach)) return;
  for (const [x, y] of corners) quads.push(middleX + (x - middleX) * ENLARGED, middleY + (y - middleY) * ENLARGED);
}

const METRES_PER_DEGREE = (Math.PI / 180) * EARTH_RADIUS_KM * 1000;
/** Web Mercator has no poles. */
const NEAREST_POLE = 89;

/** A corner of a cell's footprint: its centre plus or minus the along-track and cross-track half-sides. */
function cornerOf(block: DrawBlock, cell: number, along: number, across: number): [x: number, y: number] {
  const sides = block.halfSidesM;
  const east = along * sides[cell * 4] + across * sides[cell * 4 + 2];
  const north = along * sides[cell * 4 + 1] + across * sides[cell * 4 + 3];
  const lat = clampLat(block.latE5[cell] / 1e5 + north / METRES_PER_DEGREE);
  const lon = block.lonE5[cell] / 1e5 + east / METRES_PER_DEGREE / Math.cos((lat * Math.PI) / 180);
  return [mercatorX(lon), mercatorY(lat)];
}

function clampLat(lat: number): number {
  return Math.max(-NEAREST_POLE, Math.min(NEAREST_POLE, lat));
}

const JOINS_COLUMN = 1;
const JOINS_ROW = 2;
/** Two footprints hang together when their facing edges lie within this share of a side of each other. */
const JOIN_SLACK = 0.4;

const knownJoins = new WeakMap<DrawBlock, Uint8Array>();

/** For each cell, whether its footprint hangs together with that of the next column and of the next row. */
function joinsOf(block: DrawBlock): Uint8Array {
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
const BOUNDS_MARGIN = 0.004;

/** The box of a block in Web Mercator; all the way round where it crosses the date line or comes near a pole. */
function boundsOf(block: DrawBlock): Reach {
  const known = knownBounds.get(block);
  if (known) return known;
  const bounds = { west: Infinity, east: -Infinity, north: Infinity, south: -Infinity };
  for (let cell = 0; cell < block.cells; cell++) {
    if (block.state[cell] === 0) continue;
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
function touches(box: Reach, reach: Reach): boolean {
  if (box.south < reach.north || box.north > reach.south) return false;
  const past = box.east - reach.west;
  return past - Math.floor(past) <= reach.east - reach.west + (box.east - box.west);
}
