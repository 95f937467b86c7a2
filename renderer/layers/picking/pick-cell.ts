import { EARTH_RADIUS_KM, longitudeDifference } from '../../../src/geometry/sphere.ts';
import { latOfMercator, lonOfMercator } from '../../map/mercator.ts';
import { toMercator, toScreen, type View } from '../../map/view.ts';
import { barbSizeAt, SHAFT_PX } from '../shared/barb-size.ts';
import { type Cells, directionOf } from '../shared/cells.ts';
import { NOT_SHOWN, SHOWN_WITHOUT_WIND } from '../shared/shown.ts';

/** How far from a drawn barb's shaft a point may lie to mean it, CSS pixels. */
const NEAR_PX = 9;

/**
 * The cell meant by a point of the screen: the drawn wind whose shaft lies nearest, within reach; else the shown cell
 * whose footprint holds the point, of several the newest. Null where nobody looked.
 */
export function pickCell(
  cells: Cells,
  kinds: Uint8Array,
  drawn: readonly number[],
  view: View,
  point: { xPx: number; yPx: number },
): number | null {
  return nearestDrawn(cells, drawn, view, point) ?? newestAround(cells, kinds, view, point);
}

function nearestDrawn(
  cells: Cells,
  drawn: readonly number[],
  view: View,
  point: { xPx: number; yPx: number },
): number | null {
  const [pointX] = toMercator(view, point.xPx, point.yPx);
  const shaftPx = SHAFT_PX * barbSizeAt(view.zoom);
  let nearest: number | null = null;
  let nearestPx = NEAR_PX;
  for (const cell of drawn) {
    const x = cells.x[cell] + Math.round(pointX - cells.x[cell]);
    const [xPx, yPx] = toScreen(view, x, cells.y[cell]);
    const px = fromShaftPx(point.xPx - xPx, point.yPx - yPx, directionOf(cells, cell) - view.bearing, shaftPx);
    if (px >= nearestPx) continue;
    nearest = cell;
    nearestPx = px;
  }
  return nearest;
}

/** Distance of a point, given from the foot of a shaft, to the shaft; to the foot alone where the direction is not known. */
function fromShaftPx(rightPx: number, downPx: number, screenDirection: number, shaftPx: number): number {
  if (Number.isNaN(screenDirection)) return Math.hypot(rightPx, downPx);
  const upX = Math.sin((screenDirection * Math.PI) / 180);
  const upY = -Math.cos((screenDirection * Math.PI) / 180);
  const along = Math.max(0, Math.min(shaftPx, rightPx * upX + downPx * upY));
  return Math.hypot(rightPx - along * upX, downPx - along * upY);
}

function newestAround(cells: Cells, kinds: Uint8Array, view: View, point: { xPx: number; yPx: number }): number | null {
  const [x, y] = toMercator(view, point.xPx, point.yPx);
  const [lon, lat] = [lonOfMercator(x), latOfMercator(y)];
  let newest: number | null = null;
  cells.blocks.forEach((block, b) => {
    for (let i = 0; i < block.cells; i++) {
      const cell = cells.firstCell[b] + i;
      if (kinds[cell] === NOT_SHOWN || !holds(block, i, lon, lat)) continue;
      if (newest === null || isBefore(cells, kinds, newest, cell)) newest = cell;
    }
  });
  return newest;
}

/** Whether one cell gives way to another that holds the same point: the newer wins, and of equals the one with a wind. */
function isBefore(cells: Cells, kinds: Uint8Array, cell: number, other: number): boolean {
  const laterS = cells.timeS[other] - cells.timeS[cell];
  return laterS > 0 || (laterS === 0 && kinds[cell] === SHOWN_WITHOUT_WIND && kinds[other] > SHOWN_WITHOUT_WIND);
}

const METRES_PER_DEGREE = (Math.PI / 180) * EARTH_RADIUS_KM * 1000;
/** No footprint reaches further from its centre: two half-sides of 32,767 m. */
const FURTHEST_DEG = 65_534 / METRES_PER_DEGREE;

type Block = Cells['blocks'][number];

/** Whether the footprint of a block's cell, a parallelogram of two half-sides about its centre, holds a position. */
function holds(block: Block, i: number, lon: number, lat: number): boolean {
  const northDeg = lat - block.latE5[i] / 1e5;
  if (Math.abs(northDeg) > FURTHEST_DEG) return false;
  const east = longitudeDifference(block.lonE5[i] / 1e5, lon) * METRES_PER_DEGREE * Math.cos((lat * Math.PI) / 180);
  const north = northDeg * METRES_PER_DEGREE;
  const [alongEast, alongNorth, acrossEast, acrossNorth] = block.halfSidesM.subarray(i * 4, i * 4 + 4);
  const area = alongEast * acrossNorth - alongNorth * acrossEast;
  const along = (east * acrossNorth - north * acrossEast) / area;
  const across = (alongEast * north - alongNorth * east) / area;
  return Math.abs(along) <= 1 && Math.abs(across) <= 1;
}
