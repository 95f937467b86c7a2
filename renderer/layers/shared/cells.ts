import type { DrawBlock } from '../../../src/contract/packed-swath.ts';
import { flagBit } from '../../../src/wind/flags.ts';
import { mercatorX, mercatorY } from '../../map/mercator.ts';
import type { Reach } from '../../map/view.ts';

/** Values of a block's `state` column (contract/packed-swath). */
export const NEVER_LOOKED = 0;
export const NO_WIND = 1;
export const WIND = 2;

/** The cells of all blocks held, numbered through: cell n of block b is number `firstCell[b] + n`. */
export interface Cells {
  blocks: readonly DrawBlock[];
  /** The number of each block's first cell, and at the end the count of all. */
  firstCell: Uint32Array;
  count: number;
  /** The block each cell is in, as an index into `blocks`. */
  blockAt: Uint32Array;
  /** Web Mercator 0..1, y down. */
  x: Float32Array;
  y: Float32Array;
  speedMs: Float32Array;
  timeS: Uint32Array;
}

/** Joins blocks into one run of cells. Costs a copy of a few columns; positions are worked out once for each block. */
export function joinBlocks(blocks: readonly DrawBlock[]): Cells {
  const firstCell = new Uint32Array(blocks.length + 1);
  blocks.forEach((block, b) => {
    firstCell[b + 1] = firstCell[b] + block.cells;
  });
  const count = firstCell[blocks.length];
  const cells: Cells = {
    blocks,
    firstCell,
    count,
    blockAt: new Uint32Array(count),
    x: new Float32Array(count),
    y: new Float32Array(count),
    speedMs: new Float32Array(count),
    timeS: new Uint32Array(count),
  };
  blocks.forEach((block, b) => {
    const places = placesOf(block);
    cells.blockAt.fill(b, firstCell[b], firstCell[b + 1]);
    cells.x.set(places.x, firstCell[b]);
    cells.y.set(places.y, firstCell[b]);
    cells.speedMs.set(block.speedMs, firstCell[b]);
    cells.timeS.set(block.timeS, firstCell[b]);
  });
  return cells;
}

/** Whether a cell lies in reach, in whatever copy of the world. */
export function isInReach(cells: Cells, cell: number, reach: Reach): boolean {
  const y = cells.y[cell];
  if (y < reach.north || y > reach.south) return false;
  const past = cells.x[cell] - reach.west;
  return past - Math.floor(past) <= reach.east - reach.west;
}

/** Where a cell is found in its pass, row and column counted from 1, and its position in degrees. */
export function placeOf(cells: Cells, cell: number) {
  const b = cells.blockAt[cell];
  const block = cells.blocks[b];
  const inBlock = cell - cells.firstCell[b];
  return {
    passId: block.passId,
    row: block.firstRow + Math.floor(inBlock / block.columns) + 1,
    column: (inBlock % block.columns) + 1,
    lon: block.lonE5[inBlock] / 1e5,
    lat: block.latE5[inBlock] / 1e5,
  };
}

/** The flag word of a cell. */
export function flagsOf(cells: Cells, cell: number): number {
  const b = cells.blockAt[cell];
  return cells.blocks[b].flags[cell - cells.firstCell[b]];
}

/** The direction a cell's wind blows from, degrees; NaN where it is not known, whatever number the file holds. */
export function directionOf(cells: Cells, cell: number): number {
  if ((flagsOf(cells, cell) & flagBit.directionUnknown) !== 0) return NaN;
  const b = cells.blockAt[cell];
  return cells.blocks[b].directionFrom[cell - cells.firstCell[b]];
}

/** Whether a cell lies south of the equator; on it the northern rule holds (a choice: WMO-No. 485 gives none). */
export function isSouth(cells: Cells, cell: number): boolean {
  const b = cells.blockAt[cell];
  return cells.blocks[b].latE5[cell - cells.firstCell[b]] < 0;
}

const knownPlaces = new WeakMap<DrawBlock, { x: Float32Array; y: Float32Array }>();

function placesOf(block: DrawBlock): { x: Float32Array; y: Float32Array } {
  const known = knownPlaces.get(block);
  if (known) return known;
  const places = { x: new Float32Array(block.cells), y: new Float32Array(block.cells) };
  for (let cell = 0; cell < block.cells; cell++) {
    places.x[cell] = mercatorX(block.lonE5[cell] / 1e5);
    places.y[cell] = mercatorY(block.latE5[cell] / 1e5);
  }
  knownPlaces.set(block, places);
  return places;
}
