import { toWholeKnots } from '../../../src/wind/units.ts';
import { holdsReach, nearTo, type Reach, reachOf, type View, worldPx } from '../../map/view.ts';
import { barbSizeAt } from '../shared/barb-size.ts';
import { type Cells, directionOf, isInReach, isSouth } from '../shared/cells.ts';
import { levelFor, NO_LEVEL } from './bins.ts';
import { type DrawingList, listDrawing } from './drawing-list.ts';
import { type Footing, findRoom } from './elbow-room.ts';
import { isStronger, type ThinnedWinds } from './thinning.ts';

/** The winds to draw: the cells they are in, those shown and those the switches hide. */
export interface Winds {
  cells: Cells;
  shown: ThinnedWinds;
  hidden: ThinnedWinds;
}

/** The winds drawn in and round a view. */
export interface Layout {
  winds: Winds;
  scale: Scale;
  reach: Reach;
  /** Cells whose wind is drawn, in no order. */
  drawn: number[];
  list: DrawingList;
}

/** How closely winds may stand: settled for steps of the zoom, so that neither a pan nor a small zoom changes it. */
interface Scale {
  /** The level whose bins are used (bins). */
  level: number;
  /** The width of the world, in pixels of a barb of plain size, at which barbs are kept off each other; 0 where every wind is drawn. */
  worldPx: number;
}

const ZOOM_STEP = 0.25;

/** Winds are laid out this far past the view, CSS pixels. */
const LAID_OUT_PX = 512;
/**
 * A layout is used while it reaches this far past the view: who stands in whose way is handed on from barb to barb, and
 * at the rim of a layout it may come out otherwise than in the middle of the next.
 */
const USED_PX = 256;

/**
 * Lays out the winds for a view: of each bin the strongest, and of barbs that would lie on each other the stronger.
 */
export function layOutWinds(winds: Winds, view: View, isThinned: boolean): Layout {
  const { cells, shown, hidden } = winds;
  const scale = scaleFor(view, isThinned);
  const reach = reachOf(view, LAID_OUT_PX);
  const strongest = drawnAt(cells, shown, scale.level, reach);
  const drawn = scale.worldPx === 0 ? strongest : keepClear(cells, strongest, scale.worldPx);
  const list = listDrawing(cells, drawn, drawnAt(cells, hidden, scale.level, reach), reach);
  return { winds, scale, reach, drawn, list };
}

/** Whether a layout still serves for these winds in this view. */
export function isLaidOutFor(layout: Layout, winds: Winds, view: View, isThinned: boolean): boolean {
  const scale = scaleFor(view, isThinned);
  if (layout.winds !== winds || layout.scale.level !== scale.level || layout.scale.worldPx !== scale.worldPx) {
    return false;
  }
  return holdsReach(layout.reach, reachOf(nearTo(layout.reach, view), USED_PX));
}

function scaleFor(view: View, isThinned: boolean): Scale {
  const zoom = Math.floor(view.zoom / ZOOM_STEP) * ZOOM_STEP;
  const level = isThinned ? levelFor(worldPx({ zoom })) : NO_LEVEL;
  return { level, worldPx: level === NO_LEVEL ? 0 : worldPx({ zoom }) / barbSizeAt(zoom) };
}

function drawnAt(cells: Cells, winds: ThinnedWinds, level: number, reach: Reach): number[] {
  const drawn: number[] = [];
  for (let i = 0; i < winds.cells.length; i++) {
    if (winds.firstLevels[i] <= level && isInReach(cells, winds.cells[i], reach)) drawn.push(winds.cells[i]);
  }
  return drawn;
}

function keepClear(cells: Cells, drawn: number[], scalePx: number): number[] {
  const byStrength = drawn.toSorted((a, b) => (isStronger(cells, a, b) ? -1 : 1));
  const hasRoom = findRoom(
    byStrength.map((cell) => footingOf(cells, cell, scalePx)),
    scalePx,
  );
  return byStrength.filter((_, i) => hasRoom[i]);
}

function footingOf(cells: Cells, cell: number, scalePx: number): Footing {
  const from = (directionOf(cells, cell) * Math.PI) / 180;
  const hasShaft = !Number.isNaN(from) && toWholeKnots(cells.speedMs[cell]) > 0;
  return {
    xPx: cells.x[cell] * scalePx,
    yPx: cells.y[cell] * scalePx,
    upX: hasShaft ? Math.sin(from) : 0,
    upY: hasShaft ? -Math.cos(from) : 0,
    side: isSouth(cells, cell) ? -1 : 1,
  };
}
