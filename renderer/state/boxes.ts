import type { GeoBox } from '../../src/contract/values.ts';

/** The box that goes all the way round. */
export const wholeEarth: GeoBox = { west: -180, south: -90, east: 180, north: 90 };

/** Degrees of longitude from a box's west to its east; 360 for one that goes round. */
export function boxWidthDeg(box: GeoBox): number {
  if (box.west === -180 && box.east === 180) return 360;
  return (box.east - box.west + 360) % 360;
}

/** A box grown on every side by a share of its own size, cut at the poles; one wide enough to go round does so. */
export function growBox(box: GeoBox, share: number): GeoBox {
  const width = boxWidthDeg(box);
  const height = box.north - box.south;
  const south = Math.max(-90, box.south - height * share);
  const north = Math.min(90, box.north + height * share);
  if (width * (1 + 2 * share) >= 360) return { west: -180, south, east: 180, north };
  return { west: wrap(box.west - width * share), south, east: wrap(box.east + width * share), north };
}

/** Whether one box lies in another, edges included. */
export function isBoxInside(inner: GeoBox, outer: GeoBox): boolean {
  if (inner.south < outer.south || inner.north > outer.north) return false;
  const outerWidth = boxWidthDeg(outer);
  if (outerWidth === 360) return true;
  return ((inner.west - outer.west + 360) % 360) + boxWidthDeg(inner) <= outerWidth;
}

/** The smallest box round positions, degrees; null of none. Longitudes are met at their widest gap. */
export function boxRound(positions: readonly (readonly [lon: number, lat: number])[]): GeoBox | null {
  if (positions.length === 0) return null;
  const lons = positions.map(([lon]) => wrap(lon)).sort((a, b) => a - b);
  const lats = positions.map(([, lat]) => lat);
  let west = lons[0];
  let widestGap = lons[0] + 360 - lons[lons.length - 1];
  let east = lons[lons.length - 1];
  for (let i = 1; i < lons.length; i++) {
    if (lons[i] - lons[i - 1] <= widestGap) continue;
    widestGap = lons[i] - lons[i - 1];
    west = lons[i];
    east = lons[i - 1];
  }
  return { west, south: Math.min(...lats), east, north: Math.max(...lats) };
}

function wrap(lon: number): number {
  return ((((lon + 180) % 360) + 360) % 360) - 180;
}
