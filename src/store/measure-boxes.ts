import { EARTH_RADIUS_KM } from '../geometry/sphere.ts';
import { NEVER_LOOKED, type Swath } from '../swath/swath.ts';

/** A box in degrees that does not cross the date line: west <= east. */
export interface Box {
  west: number;
  south: number;
  east: number;
  north: number;
}

const METRES_PER_DEGREE = (Math.PI / 180) * EARTH_RADIUS_KM * 1000;

/**
 * The boxes that hold every footprint of some rows: none where nothing was looked at, one as a rule, two where the rows
 * cross the date line. Rows about a pole hold all longitudes.
 */
export function measureBoxes(swath: Swath, halfSidesM: Int16Array, firstRow: number, rows: number): Box[] {
  const lons: number[] = [];
  let south = 90;
  let north = -90;
  let reachLon = 0;
  for (let cell = firstRow * swath.columns; cell < (firstRow + rows) * swath.columns; cell++) {
    if (swath.state[cell] === NEVER_LOOKED) continue;
    const at = cell * 4;
    const reachEastM = Math.abs(halfSidesM[at]) + Math.abs(halfSidesM[at + 2]);
    const reachLat = (Math.abs(halfSidesM[at + 1]) + Math.abs(halfSidesM[at + 3])) / METRES_PER_DEGREE;
    const farLat = Math.abs(swath.lat[cell]) + reachLat;
    lons.push(swath.lon[cell]);
    south = Math.min(south, swath.lat[cell] - reachLat);
    north = Math.max(north, swath.lat[cell] + reachLat);
    const perDegree = METRES_PER_DEGREE * Math.cos((Math.min(farLat, 90) * Math.PI) / 180);
    reachLon = Math.max(reachLon, farLat >= 90 ? 180 : reachEastM / perDegree);
  }
  if (lons.length === 0) return [];
  south = Math.max(south, -90);
  north = Math.min(north, 90);
  const arc = coverLongitudes(lons);
  const west = arc.west - reachLon;
  const east = arc.west + arc.width + reachLon;
  if (east - west >= 360) return [{ west: -180, south, east: 180, north }];
  if (west < -180)
    return [
      { west: -180, south, east, north },
      { west: west + 360, south, east: 180, north },
    ];
  if (east > 180)
    return [
      { west, south, east: 180, north },
      { west: -180, south, east: east - 360, north },
    ];
  return [{ west, south, east, north }];
}

/** The shortest arc that holds all longitudes: it is what the widest gap between them leaves. */
function coverLongitudes(lons: number[]): { west: number; width: number } {
  const sorted = Float64Array.from(lons).sort();
  let west = sorted[0];
  let widest = sorted[0] + 360 - sorted[sorted.length - 1];
  for (let index = 1; index < sorted.length; index++) {
    const gap = sorted[index] - sorted[index - 1];
    if (gap <= widest) continue;
    widest = gap;
    west = sorted[index];
  }
  return { west, width: 360 - widest };
}
