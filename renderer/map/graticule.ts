import { latOfMercator, lonOfMercator, mercatorX, mercatorY } from './mercator.ts';
import { reachOf, toMercator, type View, worldPx } from './view.ts';

/** Steps between lines of the graticule, degrees, coarse to fine. */
const STEPS_DEG = [30, 20, 10, 5, 2, 1, 0.5, 0.25] as const;

/** Lines stand no closer than so many CSS pixels (of longitude). */
const CLOSEST_PX = 110;

/** The step between lines of the graticule for a zoom, degrees. */
export function graticuleStep(zoom: number): number {
  const pxPerDegree = worldPx({ zoom }) / 360;
  return [...STEPS_DEG].reverse().find((step) => step * pxPerDegree >= CLOSEST_PX) ?? STEPS_DEG[0];
}

/** The meridians and parallels that cross a view, degrees; longitudes are not wrapped. */
export function linesIn(view: View, stepDeg: number, growPx = 0): { meridians: number[]; parallels: number[] } {
  const reach = reachOf(view, growPx);
  return {
    meridians: multiplesBetween(lonOfMercator(reach.west), lonOfMercator(reach.east), stepDeg),
    parallels: multiplesBetween(latOfMercator(reach.south), latOfMercator(reach.north), stepDeg).filter(
      (lat) => Math.abs(lat) < 90,
    ),
  };
}

/** Where a line of the graticule meets the edge of the view. */
export interface EdgeLabel {
  text: string;
  edge: 'top' | 'left';
  /** CSS pixels along that edge, from the top left. */
  atPx: number;
}

/** The labels of a view's graticule: each line is named where it meets the top or the left edge, whichever it meets squarely. */
export function edgeLabels(view: View, stepDeg: number): EdgeLabel[] {
  const { meridians, parallels } = linesIn(view, stepDeg);
  const corner = toMercator(view, 0, 0);
  const alongTop = toMercator(view, view.widthPx, 0);
  const alongLeft = toMercator(view, 0, view.heightPx);
  const isUpright = Math.abs(alongTop[0] - corner[0]) * worldPx(view) >= view.widthPx * Math.SQRT1_2;
  const [acrossMeridians, acrossParallels] = isUpright ? (['top', 'left'] as const) : (['left', 'top'] as const);

  function place(edge: EdgeLabel['edge'], axis: 0 | 1, value: number, text: string): EdgeLabel[] {
    const end = edge === 'top' ? alongTop : alongLeft;
    const share = (value - corner[axis]) / (end[axis] - corner[axis]);
    const atPx = share * (edge === 'top' ? view.widthPx : view.heightPx);
    return share >= 0 && share <= 1 ? [{ text, edge, atPx }] : [];
  }

  return [
    ...meridians.flatMap((lon) => place(acrossMeridians, 0, mercatorX(lon), formatMeridian(lon))),
    ...parallels.flatMap((lat) => place(acrossParallels, 1, mercatorY(lat), formatParallel(lat))),
  ];
}

/** '60°E', '179°30′W', '0°', '180°'. */
export function formatMeridian(lon: number): string {
  const wrapped = ((((lon + 180) % 360) + 360) % 360) - 180;
  if (wrapped === 0 || wrapped === -180) return `${Math.abs(wrapped)}°`;
  return formatAngle(Math.abs(wrapped)) + (wrapped > 0 ? 'E' : 'W');
}

/** '45°S', '52°30′N', '0°'. */
export function formatParallel(lat: number): string {
  if (lat === 0) return '0°';
  return formatAngle(Math.abs(lat)) + (lat > 0 ? 'N' : 'S');
}

function formatAngle(degrees: number): string {
  const minutes = Math.round((degrees % 1) * 60);
  return minutes === 0 ? `${Math.floor(degrees)}°` : `${Math.floor(degrees)}°${String(minutes).padStart(2, '0')}′`;
}

function multiplesBetween(from: number, to: number, step: number): number[] {
  const multiples: number[] = [];
  for (let n = Math.ceil(from / step); n * step <= to; n++) multiples.push(n * step);
  return multiples;
}
