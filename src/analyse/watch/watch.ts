import type { SeenBlock } from '../../swath/seen-block.ts';
import { WIND } from '../../swath/swath.ts';
import { isGale } from '../../wind/beaufort.ts';

/** Where a wind stands: its pass, and its row and column in it, counted from 1. */
export interface WindPlace {
  passId: number;
  row: number;
  column: number;
  lon: number;
  lat: number;
  timeMs: number;
  speedMs: number;
  /** Degrees true, null when not known. */
  directionFrom: number | null;
  isHidden: boolean;
}

/** The winds of some water in a time window. Hidden winds count like all others, and are counted apart as well. */
export interface WatchFigures {
  winds: number;
  galeWinds: number;
  hiddenGaleWinds: number;
  /** The strongest wind, hidden or not; of equals the newest. */
  strongest: WindPlace | null;
  /** Times of the oldest and newest cell looked at, with or without a wind. */
  oldestMs: number | null;
  newestMs: number | null;
}

/** Counts what was seen in the cells that pass `isInWater`; `isHidden` tells which of their winds the user's switches hide. */
export function countWatch(
  blocks: readonly SeenBlock[],
  isInWater: (block: SeenBlock, cell: number) => boolean,
  isHidden: (block: SeenBlock, cell: number) => boolean,
): WatchFigures {
  const figures = { winds: 0, galeWinds: 0, hiddenGaleWinds: 0 };
  let oldestS = Number.POSITIVE_INFINITY;
  let newestS = Number.NEGATIVE_INFINITY;
  let best: { block: SeenBlock; cell: number } | null = null;
  for (const block of blocks) {
    for (let cell = 0; cell < block.cells; cell++) {
      if (block.state[cell] === 0 || !isInWater(block, cell)) continue;
      oldestS = Math.min(oldestS, block.timeS[cell]);
      newestS = Math.max(newestS, block.timeS[cell]);
      if (block.state[cell] !== WIND) continue;
      figures.winds++;
      if (best === null || isStronger(block, cell, best.block, best.cell)) best = { block, cell };
      if (!isGale(block.speedMs[cell])) continue;
      figures.galeWinds++;
      if (isHidden(block, cell)) figures.hiddenGaleWinds++;
    }
  }
  return {
    ...figures,
    strongest: best && placeOf(best.block, best.cell, isHidden(best.block, best.cell)),
    oldestMs: Number.isFinite(oldestS) ? oldestS * 1000 : null,
    newestMs: Number.isFinite(newestS) ? newestS * 1000 : null,
  };
}

function isStronger(block: SeenBlock, cell: number, other: SeenBlock, otherCell: number): boolean {
  const difference = block.speedMs[cell] - other.speedMs[otherCell];
  return difference > 0 || (difference === 0 && block.timeS[cell] > other.timeS[otherCell]);
}

function placeOf(block: SeenBlock, cell: number, isHidden: boolean): WindPlace {
  const direction = block.directionFrom[cell];
  return {
    passId: block.passId,
    row: block.firstRow + Math.floor(cell / block.columns) + 1,
    column: (cell % block.columns) + 1,
    lon: block.lonE5[cell] / 1e5,
    lat: block.latE5[cell] / 1e5,
    timeMs: block.timeS[cell] * 1000,
    speedMs: block.speedMs[cell],
    directionFrom: Number.isNaN(direction) ? null : direction,
    isHidden,
  };
}
