import type { DrawBlock } from '../../../src/contract/packed-swath.ts';
import { copiesTouching, type Reach } from '../../map/view.ts';
import type { Cells } from '../shared/cells.ts';
import { NOT_SHOWN, SHOWN_WITHOUT_WIND } from '../shared/shown.ts';
import { FloatList } from './float-list.ts';
import { boundsOf, JOINS_COLUMN, JOINS_ROW, joinsOf, touches, writeCorner } from './footprint-geometry.ts';

/** Footprints as quads, four corners of x and y in Web Mercator each. */
export interface FootprintTiles {
  noWind: Float32Array;
  wind: Float32Array;
}

/** Cells of a block, from a first one so many rows on and so many columns across. */
interface Patch {
  first: number;
  rows: number;
  columns: number;
}

/** Footprints are drawn so much longer than they are, from the middle out, so that no hairline opens between two. */
const ENLARGED = 1.02;

/**
 * The footprints of all shown cells that lie in reach. Up to `most` by `most` neighbours that were seen alike become one
 * quad; where they differ, or are no neighbours, they are taken apart, so nothing unseen is covered.
 * Each lies in every copy of the world that is in reach.
 */
export function tileFootprints(cells: Cells, kinds: Uint8Array, most: number, reach: Reach): FootprintTiles {
  const noWind = new FloatList();
  const wind = new FloatList();
  cells.blocks.forEach((block, b) => {
    if (!touches(boundsOf(block), reach)) return;
    const blockKinds = kinds.subarray(cells.firstCell[b], cells.firstCell[b + 1]);
    const joins = joinsOf(block);

    function addPatch(patch: Patch): void {
      if (!areAlike(blockKinds, joins, block.columns, patch)) {
        for (const half of halve(patch, block.columns)) addPatch(half);
        return;
      }
      const kind = blockKinds[patch.first];
      if (kind !== NOT_SHOWN) addQuad(block, patch, reach, kind === SHOWN_WITHOUT_WIND ? noWind : wind);
    }

    for (let row = 0; row < block.rows; row += most) {
      const rows = Math.min(most, block.rows - row);
      for (const patch of cutBand(joins, row * block.columns, rows, block.columns, most)) addPatch(patch);
    }
  });
  return { noWind: noWind.taken(), wind: wind.taken() };
}

/** Cuts a band of rows into patches no wider than `most`, and at columns that are no neighbours, such as a nadir gap. */
function cutBand(joins: Uint8Array, first: number, rows: number, columns: number, most: number): Patch[] {
  const patches: Patch[] = [];
  let start = 0;
  for (let column = 1; column <= columns; column++) {
    const isJoined = column < columns && (joins[first + column - 1] & JOINS_COLUMN) !== 0;
    if (isJoined && column - start < most) continue;
    patches.push({ first: first + start, rows, columns: column - start });
    start = column;
  }
  return patches;
}

/** Cuts a patch of more than one cell in two, across its longer side. */
function halve({ first, rows, columns }: Patch, stride: number): [Patch, Patch] {
  if (rows > columns) {
    const half = rows >> 1;
    return [
      { first, rows: half, columns },
      { first: first + half * stride, rows: rows - half, columns },
    ];
  }
  const half = columns >> 1;
  return [
    { first, rows, columns: half },
    { first: first + half, rows, columns: columns - half },
  ];
}

/** Whether cells were all seen alike and, unless none is shown, hang together. */
function areAlike(kinds: Uint8Array, joins: Uint8Array, stride: number, { first, rows, columns }: Patch): boolean {
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
  return kind > SHOWN_WITHOUT_WIND ? SHOWN_WITHOUT_WIND + 1 : kind;
}

const corners = new Float64Array(8);

function addQuad(block: DrawBlock, { first, rows, columns }: Patch, reach: Reach, quads: FloatList): void {
  const lastRow = first + (rows - 1) * block.columns;
  writeCorner(block, first, -1, -1, corners, 0);
  writeCorner(block, first + columns - 1, -1, 1, corners, 2);
  writeCorner(block, lastRow, 1, -1, corners, 4);
  writeCorner(block, lastRow + columns - 1, 1, 1, corners, 6);
  for (let i = 2; i < 8; i += 2) corners[i] -= Math.round(corners[i] - corners[0]);
  const bounds = boundsOfCorners();
  if (bounds.south < reach.north || bounds.north > reach.south) return;
  const { first: firstCopy, last: lastCopy } = copiesTouching(reach, bounds.west, bounds.east);
  const middleX = (corners[0] + corners[2] + corners[4] + corners[6]) / 4;
  const middleY = (corners[1] + corners[3] + corners[5] + corners[7]) / 4;
  for (let copy = firstCopy; copy <= lastCopy; copy++) {
    for (let i = 0; i < 8; i += 2) {
      quads.add(copy + middleX + (corners[i] - middleX) * ENLARGED, middleY + (corners[i + 1] - middleY) * ENLARGED);
    }
  }
}

function boundsOfCorners(): Reach {
  return {
    west: Math.min(corners[0], corners[2], corners[4], corners[6]),
    east: Math.max(corners[0], corners[2], corners[4], corners[6]),
    north: Math.min(corners[1], corners[3], corners[5], corners[7]),
    south: Math.max(corners[1], corners[3], corners[5], corners[7]),
  };
}
