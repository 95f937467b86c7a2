/** Length of a barb's shaft in CSS pixels, before it grows. */
export const SHAFT_PX = 22;

/** How much a barb is enlarged at a zoom, once cells stand far apart: 1 up to zoom 6, 1.35 from zoom 8. */
export function barbSizeAt(zoom: number): number {
  return 1 + 0.35 * Math.max(0, Math.min(1, (zoom - 6) / 2));
}
