import { blockBytes, type DrawBlock, layOutBlock } from '../../../src/contract/packed-swath.ts';

/** What a test says of a cell; the rest is filled in. A speed makes it a wind. */
export interface DrawnCell {
  lon: number;
  lat: number;
  speedMs?: number;
  directionFrom?: number;
  flags?: number;
  timeS?: number;
  state?: number;
  /** Half-sides in metres: along east, along north, across east, across north. */
  halfSidesM?: [number, number, number, number];
}

/** A block of given cells, row by row; each a square of 25 km set square to the north unless it says otherwise. */
export function drawBlock(cells: readonly DrawnCell[], header: Partial<DrawBlock> = {}): DrawBlock {
  const columns = header.columns ?? cells.length;
  const block = layOutBlock(new ArrayBuffer(blockBytes(cells.length)), 0, {
    blockId: header.blockId ?? 1,
    passId: header.passId ?? 1,
    firstRow: header.firstRow ?? 0,
    rows: cells.length / columns,
    columns,
  });
  cells.forEach((cell, i) => {
    block.lonE5[i] = Math.round(cell.lon * 1e5);
    block.latE5[i] = Math.round(cell.lat * 1e5);
    block.timeS[i] = cell.timeS ?? 1_000;
    block.flags[i] = cell.flags ?? 0;
    block.speedMs[i] = cell.speedMs ?? Number.NaN;
    block.directionFrom[i] = cell.directionFrom ?? (cell.speedMs === undefined ? Number.NaN : 0);
    block.state[i] = cell.state ?? (cell.speedMs === undefined ? 1 : 2);
    block.halfSidesM.set(cell.halfSidesM ?? [0, -12_500, 12_500, 0], i * 4);
  });
  return block;
}
