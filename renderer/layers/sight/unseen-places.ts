import { reachOf, toScreen, type View, worldPx } from '../../map/view.ts';
import { type Cells, isInReach } from '../shared/cells.ts';
import { NOT_SHOWN } from '../shared/shown.ts';

/** A place in Web Mercator 0..1, x in the copy of the world that the view shows. */
export interface Place {
  x: number;
  y: number;
}

/** Sight is looked up on a grid of the screen this coarse, CSS pixels. */
const SQUARE_PX = 16;
/** Half the size of the water that must be unseen about a place. */
const HALF_WIDTH_PX = 80;
const HALF_HEIGHT_PX = 32;
/** Places of the lattice round the world at zoom 0, and the height of its rows as a share of its width. */
const LATTICE_PER_WORLD = 3;
const LATTICE_HEIGHT = 0.7;

/**
 * Places in a view with room for words on water that nobody looked at. They lie on a lattice fixed to the earth, 171 to
 * 341 CSS pixels wide, so a pan moves no word.
 */
export function findUnseenPlaces(cells: Cells, kinds: Uint8Array, view: View): Place[] {
  const seen = markSeen(cells, kinds, view);
  return latticeIn(view).filter(({ x, y }) => {
    const [xPx, yPx] = toScreen(view, x, y);
    return isUnseenAbout(seen, xPx, yPx);
  });
}

/** The screen in squares, one for each that a footprint may touch. */
interface SeenGrid {
  columns: number;
  rows: number;
  seen: Uint8Array;
}

function markSeen(cells: Cells, kinds: Uint8Array, view: View): SeenGrid {
  const columns = Math.ceil(view.widthPx / SQUARE_PX);
  const rows = Math.ceil(view.heightPx / SQUARE_PX);
  const grid = { columns, rows, seen: new Uint8Array(columns * rows) };
  const reach = reachOf(view, SQUARE_PX * 4);
  const middle = (reach.west + reach.east) / 2;
  for (let cell = 0; cell < cells.count; cell++) {
    if (kinds[cell] === NOT_SHOWN || !isInReach(cells, cell, reach)) continue;
    const x = cells.x[cell] + Math.round(middle - cells.x[cell]);
    const [xPx, yPx] = toScreen(view, x, cells.y[cell]);
    markAbout(grid, xPx, yPx, footprintPx(cells, cell, view));
  }
  return grid;
}

function markAbout({ columns, rows, seen }: SeenGrid, xPx: number, yPx: number, radiusPx: number): void {
  const [left, right] = squaresAbout(xPx, radiusPx, columns);
  const [top, bottom] = squaresAbout(yPx, radiusPx, rows);
  for (let row = top; row <= bottom; row++) {
    for (let column = left; column <= right; column++) seen[row * columns + column] = 1;
  }
}

function isUnseenAbout({ columns, rows, seen }: SeenGrid, xPx: number, yPx: number): boolean {
  const [left, right] = squaresAbout(xPx, HALF_WIDTH_PX, columns);
  const [top, bottom] = squaresAbout(yPx, HALF_HEIGHT_PX, rows);
  for (let row = top; row <= bottom; row++) {
    for (let column = left; column <= right; column++) if (seen[row * columns + column]) return false;
  }
  return true;
}

function squaresAbout(atPx: number, radiusPx: number, count: number): [first: number, last: number] {
  const first = Math.max(0, Math.floor((atPx - radiusPx) / SQUARE_PX));
  return [first, Math.min(count - 1, Math.floor((atPx + radiusPx) / SQUARE_PX))];
}

const METRES_ROUND_EQUATOR = 2 * Math.PI * 6_378_137;

/** How far a cell's footprint reaches from its centre on the screen at most. */
function footprintPx(cells: Cells, cell: number, view: View): number {
  const b = cells.blockAt[cell];
  const block = cells.blocks[b];
  const at = (cell - cells.firstCell[b]) * 4;
  const sides = block.halfSidesM;
  const reachM = Math.hypot(sides[at], sides[at + 1]) + Math.hypot(sides[at + 2], sides[at + 3]);
  const cosLat = Math.cos((block.latE5[at / 4] / 1e5) * (Math.PI / 180));
  return (reachM / METRES_ROUND_EQUATOR / Math.max(cosLat, 0.01)) * worldPx(view);
}

function latticeIn(view: View): Place[] {
  const step = 1 / (LATTICE_PER_WORLD * 2 ** Math.floor(view.zoom));
  const rowStep = step * LATTICE_HEIGHT;
  const reach = reachOf(view);
  const places: Place[] = [];
  for (let row = Math.ceil(reach.north / rowStep); row * rowStep <= reach.south; row++) {
    const shift = row % 2 === 0 ? 0 : step / 2;
    for (let column = Math.ceil((reach.west - shift) / step); column * step + shift <= reach.east; column++) {
      const place = { x: column * step + shift, y: row * rowStep };
      if (isWellInside(view, place)) places.push(place);
    }
  }
  return places;
}

function isWellInside(view: View, { x, y }: Place): boolean {
  const [xPx, yPx] = toScreen(view, x, y);
  return (
    xPx > HALF_WIDTH_PX &&
    xPx < view.widthPx - HALF_WIDTH_PX &&
    yPx > HALF_HEIGHT_PX &&
    yPx < view.heightPx - HALF_HEIGHT_PX
  );
}
