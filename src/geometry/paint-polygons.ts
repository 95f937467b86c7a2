import type { EqualAreaGrid } from './equal-area-grid.ts';
import { longitudeDifference } from './sphere.ts';

/** Edges of closed rings: lon1, lat1, lon2, lat2 of each, degrees, straight in longitude and latitude (RFC 7946 3.1.1). */
export type Edges = Float64Array;

/** The edges of rings as they stand, cut at the date line where they cross it. A ring need not repeat its first position. */
export function edgesOfRings(rings: readonly (readonly (readonly number[])[])[]): Edges {
  const edges = new Float64Array(4 * rings.reduce((positions, ring) => positions + ring.length, 0));
  let filled = 0;
  for (const ring of rings) {
    for (let i = 0; i < ring.length; i++) {
      const [lon1, lat1] = ring[i];
      const [lon2, lat2] = ring[i + 1 < ring.length ? i + 1 : 0];
      if (lon1 === lon2 && lat1 === lat2) continue;
      edges[filled++] = lon1;
      edges[filled++] = lat1;
      edges[filled++] = lon2;
      edges[filled++] = lat2;
    }
  }
  return edges.subarray(0, filled);
}

/** A ring whose longitudes run on past 180 instead of jumping, each step the short way round. */
export function unwrapRing(ring: readonly (readonly number[])[]): [lon: number, lat: number][] {
  let lon = ring[0]?.[0] ?? 0;
  return ring.map(([nextLon, lat]) => {
    lon += longitudeDifference(lon, nextLon);
    return [lon, lat];
  });
}

/** The grid's points inside the rings, as 1, by the even-odd rule along each row; a ring round a pole is closed along it. */
export function paintPolygons(grid: EqualAreaGrid, edges: Edges): Uint8Array {
  const inside = new Uint8Array(grid.columns * grid.rows);
  const crossings = crossRows(grid, edges);
  for (let row = 0; row < grid.rows; row++) {
    const lons = crossings[row].sort((a, b) => a - b);
    for (let i = 0; i + 1 < lons.length; i += 2) paintSpan(grid, inside, row, lons[i], lons[i + 1]);
  }
  return inside;
}

/** Where edges cross each row's latitude: longitudes, unsorted. An edge holds its lower end, not its upper. */
function crossRows(grid: EqualAreaGrid, edges: Edges): number[][] {
  const crossings: number[][] = Array.from({ length: grid.rows }, () => []);
  for (let i = 0; i < edges.length; i += 4) {
    const lat1 = edges[i + 1];
    const lat2 = edges[i + 3];
    const low = Math.min(lat1, lat2);
    const high = Math.max(lat1, lat2);
    for (let row = firstRowFrom(grid.rowLat, low); row < grid.rows && grid.rowLat[row] < high; row++) {
      const share = (grid.rowLat[row] - lat1) / (lat2 - lat1);
      crossings[row].push(edges[i] + share * (edges[i + 2] - edges[i]));
    }
  }
  return crossings;
}

function firstRowFrom(rowLat: Float64Array, lat: number): number {
  let low = 0;
  let high = rowLat.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (rowLat[middle] < lat) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** Flips the points of a row whose longitude lies in a span, in every turn of the globe the grid's columns may mean. */
function paintSpan(grid: EqualAreaGrid, inside: Uint8Array, row: number, fromLon: number, toLon: number): void {
  const step = grid.widthDeg / grid.columns;
  for (let turn = -720; turn <= 720; turn += 360) {
    const first = Math.max(0, Math.ceil((fromLon + turn - grid.west) / step - 0.5));
    const last = Math.min(grid.columns - 1, Math.ceil((toLon + turn - grid.west) / step - 0.5) - 1);
    for (let column = first; column <= last; column++) inside[row * grid.columns + column] ^= 1;
  }
}

/** Whether a position lies inside the rings, by the even-odd rule along its parallel, whatever turn its longitude is given in. */
export function isInside(edges: Edges, lon: number, lat: number): boolean {
  return [-360, 0, 360].some((turn) => isInsidePlane(edges, lon + turn, lat));
}

function isInsidePlane(edges: Edges, lon: number, lat: number): boolean {
  let isIn = false;
  for (let i = 0; i < edges.length; i += 4) {
    const lat1 = edges[i + 1];
    const lat2 = edges[i + 3];
    if (lat1 <= lat === lat2 <= lat) continue;
    if (edges[i] + ((lat - lat1) / (lat2 - lat1)) * (edges[i + 2] - edges[i]) > lon) isIn = !isIn;
  }
  return isIn;
}
