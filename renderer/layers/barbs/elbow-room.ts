import { SHAFT_PX } from '../shared/barb-size.ts';

/** A barb of plain size as it would lie on the screen at some zoom: position, unit vector up its shaft, and side of its feathers. */
export interface Footing {
  xPx: number;
  yPx: number;
  /** Right and down; both 0 for a mark that has no shaft. */
  upX: number;
  upY: number;
  /** 1 where the feathers lie clockwise of the shaft, -1 where they lie the other way. */
  side: number;
}

/** The room a barb takes about its position: along its shaft, and across it towards its feathers and away from them. */
const FEATHERED_SIDE_PX = 10.5;
const BARE_SIDE_PX = 3.5;
const PAST_END_PX = 4.5;
/** The room a mark without a shaft takes on every side. */
const MARK_PX = 6;

/** Barbs that may touch stand in neighbouring squares. */
const GRID_PX = 40;

/**
 * Which of the barbs, given strongest first, have room: one that would lie on a stronger one that is drawn is left out.
 * The world is so many pixels wide and has no edge in the east.
 */
export function findRoom(barbs: readonly Footing[], worldPx: number): boolean[] {
  const columns = Math.max(1, Math.floor(worldPx / GRID_PX));
  const columnPx = worldPx / columns;
  const squares = new Map<number, Footing[]>();

  function hasRoom(barb: Footing, column: number, row: number): boolean {
    for (let down = -1; down <= 1; down++) {
      for (let right = -1; right <= 1; right++) {
        const square = squares.get(squareAt(column + right, row + down, columns));
        if (square?.some((other) => touch(barb, other, worldPx))) return false;
      }
    }
    return true;
  }

  return barbs.map((barb) => {
    const column = Math.floor(barb.xPx / columnPx);
    const row = Math.floor(barb.yPx / GRID_PX);
    if (!hasRoom(barb, column, row)) return false;
    const at = squareAt(column, row, columns);
    const square = squares.get(at);
    if (square) square.push(barb);
    else squares.set(at, [barb]);
    return true;
  });
}

function squareAt(column: number, row: number, columns: number): number {
  return row * columns + ((column + columns) % columns);
}

function touch(a: Footing, b: Footing, worldPx: number): boolean {
  let right = b.xPx - a.xPx;
  right -= Math.round(right / worldPx) * worldPx;
  const down = b.yPx - a.yPx;
  return liesOn(a, right, down, b) || liesOn(b, -right, -down, a);
}

/** Whether the foot, middle or end of another barb, whose foot lies so far off, falls into a barb's room. */
function liesOn(barb: Footing, right: number, down: number, other: Footing): boolean {
  for (const share of [0, 0.5, 1]) {
    const x = right + other.upX * SHAFT_PX * share;
    const y = down + other.upY * SHAFT_PX * share;
    if (isInRoom(barb, x, y)) return true;
  }
  return false;
}

function isInRoom(barb: Footing, right: number, down: number): boolean {
  if (barb.upX === 0 && barb.upY === 0) return Math.hypot(right, down) < MARK_PX;
  const along = right * barb.upX + down * barb.upY;
  const across = (down * barb.upX - right * barb.upY) * barb.side;
  return along > -MARK_PX && along < SHAFT_PX + PAST_END_PX && across > -BARE_SIDE_PX && across < FEATHERED_SIDE_PX;
}
