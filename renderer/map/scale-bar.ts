import { latOfMercator } from './mercator.ts';
import { type View, worldPx } from './view.ts';

/** Metres round the equator of the map's sphere, and in one nautical mile: EPSG:3857 (radius 6,378,137 m); SI brochure table 8. */
const METRES_ROUND_EQUATOR = 2 * Math.PI * 6_378_137;
const METRES_PER_NAUTICAL_MILE = 1852;

/** A bar of a round number of nautical miles, true at the latitude of the view's centre, and no longer than asked for. */
export function scaleBar(view: View, longestPx: number): { nauticalMiles: number; lengthPx: number } {
  const cosLat = Math.cos((latOfMercator(view.y) * Math.PI) / 180);
  const pxPerMile = (worldPx(view) / METRES_ROUND_EQUATOR / cosLat) * METRES_PER_NAUTICAL_MILE;
  const most = longestPx / pxPerMile;
  const power = 10 ** Math.floor(Math.log10(most));
  const nauticalMiles = ([5, 2, 1].find((digit) => digit * power <= most) ?? 1) * power;
  return { nauticalMiles, lengthPx: nauticalMiles * pxPerMile };
}
