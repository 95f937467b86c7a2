import { latOfMercator, lonOfMercator } from './mercator.ts';

/** What the chart looks at: Web Mercator, seen straight down. Screen positions are CSS pixels from the top left. */
export interface View {
  /** The centre, Web Mercator 0..1. */
  x: number;
  y: number;
  zoom: number;
  /** Degrees clockwise from north to the top of the screen. */
  bearing: number;
  widthPx: number;
  heightPx: number;
}

/** MapLibre's world is so many pixels wide at zoom 0. */
const WORLD_PX_AT_ZOOM_0 = 512;

/** Width of one world in CSS pixels. */
export function worldPx(view: Pick<View, 'zoom'>): number {
  return WORLD_PX_AT_ZOOM_0 * 2 ** view.zoom;
}

/** The screen position of a Web Mercator position; the copy of the world it lies in is the caller's choice. */
export function toScreen(view: View, x: number, y: number): [xPx: number, yPx: number] {
  const scale = worldPx(view);
  const east = (x - view.x) * scale;
  const south = (y - view.y) * scale;
  const turn = (-view.bearing * Math.PI) / 180;
  return [
    view.widthPx / 2 + east * Math.cos(turn) - south * Math.sin(turn),
    view.heightPx / 2 + east * Math.sin(turn) + south * Math.cos(turn),
  ];
}

/** The Web Mercator position under a screen position; x may lie outside 0..1, in another copy of the world. */
export function toMercator(view: View, xPx: number, yPx: number): [x: number, y: number] {
  const scale = worldPx(view);
  const right = xPx - view.widthPx / 2;
  const down = yPx - view.heightPx / 2;
  const turn = (view.bearing * Math.PI) / 180;
  return [
    view.x + (right * Math.cos(turn) - down * Math.sin(turn)) / scale,
    view.y + (right * Math.sin(turn) + down * Math.cos(turn)) / scale,
  ];
}

/** An upright box in Web Mercator; x runs on past 0..1 into other copies of the world. */
export interface Reach {
  west: number;
  east: number;
  north: number;
  south: number;
}

/** The smallest upright Web Mercator box round the view, grown by some pixels on every side. */
export function reachOf(view: View, growPx = 0): Reach {
  const corners = cornersOf(view, growPx);
  const xs = corners.map(([x]) => x);
  const ys = corners.map(([, y]) => y);
  return { west: Math.min(...xs), east: Math.max(...xs), north: Math.min(...ys), south: Math.max(...ys) };
}

/** Whether one box holds another. */
export function holdsReach(outer: Reach, inner: Reach): boolean {
  const isHeldAcross = inner.west >= outer.west && inner.east <= outer.east;
  return isHeldAcross && inner.north >= outer.north && inner.south <= outer.south;
}

/** The same view in the copy of the world that lies nearest a box. */
export function nearTo(reach: Reach, view: View): View {
  return { ...view, x: view.x + Math.round((reach.west + reach.east) / 2 - view.x) };
}

/** The copies of the world, whole numbers to add to x, in which what lies between two x touches a box. */
export function copiesTouching(reach: Reach, west: number, east: number): { first: number; last: number } {
  return { first: Math.ceil(reach.west - east), last: Math.floor(reach.east - west) };
}

/**
 * The box of the view in degrees. West > east when it crosses the date line; -180 to 180 when it is a world wide or more.
 */
export function boxOf(view: View): { west: number; south: number; east: number; north: number } {
  const reach = reachOf(view);
  const south = Math.max(-90, latOfMercator(reach.south));
  const north = Math.min(90, latOfMercator(reach.north));
  if (reach.east - reach.west >= 1) return { west: -180, south, east: 180, north };
  return { west: wrap(lonOfMercator(reach.west)), south, east: wrap(lonOfMercator(reach.east)), north };
}

function cornersOf(view: View, growPx: number): [number, number][] {
  const right = view.widthPx + growPx;
  const bottom = view.heightPx + growPx;
  return [
    toMercator(view, -growPx, -growPx),
    toMercator(view, right, -growPx),
    toMercator(view, right, bottom),
    toMercator(view, -growPx, bottom),
  ];
}

function wrap(lon: number): number {
  return ((((lon + 180) % 360) + 360) % 360) - 180;
}
