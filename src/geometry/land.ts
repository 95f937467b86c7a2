import { type Edges, edgesOfRings, isInside } from './paint-polygons.ts';
import { bearingDeg, distanceKm, EARTH_RADIUS_KM, longitudeDifference } from './sphere.ts';

const RADIANS = Math.PI / 180;
const KM_PER_DEGREE = EARTH_RADIUS_KM * RADIANS;

/** The land of the base map as edges of its rings. */
export interface Land {
  edges: Edges;
}

/** Land from the coordinates of a GeoJSON MultiPolygon that is cut at the date line. */
export function createLand(polygons: readonly (readonly (readonly (readonly number[])[])[])[]): Land {
  return { edges: edgesOfRings(polygons.flat()) };
}

/** Farther than this the nearest land is not sought. */
const FARTHEST_KM = 1000;

/**
 * Great-circle distance and bearing from a position to the nearest land; 0 on land, null beyond 1,000 km. Each edge is taken as
 * straight on a plane about the position to find its nearest point; the distance to that point is measured on the sphere.
 */
export function nearestLand(land: Land, lon: number, lat: number): { distanceKm: number; bearingDeg: number } | null {
  const { edges } = land;
  if (isInside(edges, lon, lat)) return { distanceKm: 0, bearingDeg: 0 };
  const cosLat = Math.cos(lat * RADIANS);
  let nearest = FARTHEST_KM / KM_PER_DEGREE;
  let found: [number, number] | null = null;
  for (let i = 0; i < edges.length; i += 4) {
    const y1 = edges[i + 1] - lat;
    const y2 = edges[i + 3] - lat;
    if ((y1 > nearest && y2 > nearest) || (y1 < -nearest && y2 < -nearest)) continue;
    const x1 = longitudeDifference(lon, edges[i]) * cosLat;
    const x2 = x1 + longitudeDifference(edges[i], edges[i + 2]) * cosLat;
    const length2 = (x2 - x1) ** 2 + (y2 - y1) ** 2;
    const along = length2 === 0 ? 0 : Math.max(0, Math.min(1, -(x1 * (x2 - x1) + y1 * (y2 - y1)) / length2));
    const distance = Math.hypot(x1 + along * (x2 - x1), y1 + along * (y2 - y1));
    if (distance >= nearest) continue;
    nearest = distance;
    found = [
      edges[i] + along * longitudeDifference(edges[i], edges[i + 2]),
      edges[i + 1] + along * (edges[i + 3] - edges[i + 1]),
    ];
  }
  if (found === null) return null;
  return { distanceKm: distanceKm(lon, lat, ...found), bearingDeg: bearingDeg(lon, lat, ...found) };
}
