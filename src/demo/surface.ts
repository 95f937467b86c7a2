import { normaliseDegrees } from '../wind/units.ts';

/** What the water's surface is at a place, degrees. */
export interface Surface {
  isLand(lon: number, lat: number): boolean;
  isIce(lon: number, lat: number): boolean;
}

/** Part of a square footprint, 0 to 1. */
export interface Cover {
  land: number;
  ice: number;
}

/** Outer rings and holes of polygons, [lon, lat] in degrees, as in GeoJSON: none crosses the date line. */
export type Polygons = readonly (readonly (readonly (readonly number[])[])[])[];

/** West and south edge in degrees and how far to the east and north of them; it may cross the date line. */
export interface Box {
  west: number;
  south: number;
  widthDeg: number;
  heightDeg: number;
}

/** Points to each side of the square that samples a footprint. */
const SAMPLES = 7;
const KM_PER_DEGREE = 111.195;

/** Land as a fine raster of a box, asked by position; outside the box there is none. */
export function rasterLand(polygons: Polygons, box: Box, stepDeg: number): Surface['isLand'] {
  const columns = Math.ceil(box.widthDeg / stepDeg);
  const rows = Math.ceil(box.heightDeg / stepDeg);
  const crossings = findCrossings(polygons, box.south, rows, stepDeg);
  const raster = new Uint8Array(rows * columns);
  for (let row = 0; row < rows; row++) {
    const places = crossings[row].sort((a, b) => a - b);
    for (let i = 0; i + 1 < places.length; i += 2) {
      // Beyond the date line the same land stands 360 degrees farther east of the box's edge.
      for (const west of [box.west, box.west - 360]) {
        const first = Math.max(0, Math.ceil((places[i] - west) / stepDeg - 0.5));
        const last = Math.min(columns - 1, Math.floor((places[i + 1] - west) / stepDeg - 0.5));
        if (first <= last) raster.fill(1, row * columns + first, row * columns + last + 1);
      }
    }
  }
  return (lon, lat) => {
    const column = Math.floor(normaliseDegrees(lon - box.west) / stepDeg);
    const row = Math.floor((lat - box.south) / stepDeg);
    return row >= 0 && row < rows && column < columns && raster[row * columns + column] === 1;
  };
}

/** The shares of land and ice in a square of a half side, km, about a place. */
export function measureCover(surface: Surface, lon: number, lat: number, halfSideKm: number): Cover {
  let land = 0;
  let ice = 0;
  for (let j = 0; j < SAMPLES; j++) {
    const sampleLat = lat + ((2 * j + 1 - SAMPLES) / SAMPLES) * (halfSideKm / KM_PER_DEGREE);
    const degreeKm = KM_PER_DEGREE * Math.cos((sampleLat * Math.PI) / 180);
    for (let i = 0; i < SAMPLES; i++) {
      const sampleLon = lon + ((2 * i + 1 - SAMPLES) / SAMPLES) * (halfSideKm / degreeKm);
      if (surface.isLand(sampleLon, sampleLat)) land++;
      else if (surface.isIce(sampleLon, sampleLat)) ice++;
    }
  }
  return { land: land / SAMPLES ** 2, ice: ice / SAMPLES ** 2 };
}

/** For each raster row, the longitudes where the outlines cross the middle of it: land lies between them, two by two. */
function findCrossings(polygons: Polygons, south: number, rows: number, stepDeg: number): number[][] {
  const crossings = Array.from({ length: rows }, (): number[] => []);
  for (const ring of polygons.flat()) {
    for (let i = 0; i + 1 < ring.length; i++) {
      const [lon1, lat1] = ring[i];
      const [lon2, lat2] = ring[i + 1];
      const firstRow = Math.max(0, Math.ceil((Math.min(lat1, lat2) - south) / stepDeg - 0.5));
      const lastRow = Math.min(rows - 1, Math.ceil((Math.max(lat1, lat2) - south) / stepDeg - 0.5) - 1);
      for (let row = firstRow; row <= lastRow; row++) {
        const lat = south + (row + 0.5) * stepDeg;
        crossings[row].push(lon1 + ((lat - lat1) / (lat2 - lat1)) * (lon2 - lon1));
      }
    }
  }
  return crossings;
}
