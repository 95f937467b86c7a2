import type { GeoBox, WatchArea, WatchWater } from '../contract/values.ts';
import { type EqualAreaGrid, layEqualAreaGrid } from '../geometry/equal-area-grid.ts';
import { type Edges, edgesOfRings, isInside, paintPolygons, unwrapRing } from '../geometry/paint-polygons.ts';
import { EARTH_RADIUS_KM, longitudeDifference } from '../geometry/sphere.ts';
import type { Archive } from '../store/archive.ts';
import { readWatchArea } from '../store/watch-areas.ts';
import type { SeenBlock } from '../swath/seen-block.ts';
import { normaliseLongitude } from '../wind/units.ts';
import type { Coastline } from './coastline.ts';

/** The water a watch report speaks of: its box, its ring where it is a kept area, and its sea as points of equal area. */
export interface Water {
  areaName: string | null;
  box: GeoBox;
  ring: Edges | null;
  grid: EqualAreaGrid;
  isSea: Uint8Array;
}

/** Points the water is measured on: shares are good to about a third of a percent. */
const GRID_POINTS = 120_000;

/** Boxes narrower than this are measured against the finer coastline, degrees. */
const FINE_COAST_WIDTH_DEG = 25;

/** Lays the water out. Throws 'not-stored' for an area that is not kept. */
export function layWater(archive: Archive, coastline: Coastline, asked: WatchWater): Water {
  const area = asked.kind === 'area' ? readWatchArea(archive, asked.areaId) : null;
  const box = asked.kind === 'view' ? asked.box : boxOfRing((area as WatchArea).ring);
  const grid = layEqualAreaGrid(box, GRID_POINTS);
  const land = grid.widthDeg < FINE_COAST_WIDTH_DEG ? coastline.fine() : coastline.coarse();
  const isSea = paintPolygons(grid, land.edges).map((isLand) => 1 - isLand);
  const ring = area === null ? null : edgesOfRings([unwrapRing(area.ring)]);
  if (ring !== null) {
    const isInRing = paintPolygons(grid, ring);
    for (let point = 0; point < isSea.length; point++) isSea[point] &= isInRing[point];
  }
  return { areaName: area?.name ?? null, box, ring, grid, isSea };
}

function boxOfRing(positions: WatchArea['ring']): GeoBox {
  const ring = unwrapRing(positions);
  const lons = ring.map(([lon]) => lon);
  const lats = ring.map(([, lat]) => lat);
  const isWhole = Math.max(...lons) - Math.min(...lons) >= 360;
  return {
    west: isWhole ? -180 : normaliseLongitude(Math.min(...lons)),
    south: Math.min(...lats),
    east: isWhole ? 180 : normaliseLongitude(Math.max(...lons)),
    north: Math.max(...lats),
  };
}

const METRES_PER_DEGREE = (Math.PI / 180) * EARTH_RADIUS_KM * 1000;

/** No footprint reaches farther from its centre than this, degrees of latitude (two half-sides of 32,767 m). */
const FARTHEST_REACH_DEG = 0.6;

/** Whether a cell counts: in a view by its centre, in an area also when only a corner of its footprint reaches in. */
export function isCellInWater({ box, ring }: Water, block: SeenBlock, cell: number): boolean {
  const lon = block.lonE5[cell] / 1e5;
  const lat = block.latE5[cell] / 1e5;
  if (ring === null) return isInBox(box, lon, lat, 0);
  if (!isInBox(box, lon, lat, FARTHEST_REACH_DEG)) return false;
  if (isInside(ring, lon, lat)) return true;
  const metresPerDegreeEast = METRES_PER_DEGREE * Math.max(1e-6, Math.cos((lat * Math.PI) / 180));
  const [aEast, aNorth, bEast, bNorth] = block.halfSidesM.subarray(cell * 4, cell * 4 + 4);
  return corners.some(([a, b]) =>
    isInside(
      ring,
      lon + (a * aEast + b * bEast) / metresPerDegreeEast,
      lat + (a * aNorth + b * bNorth) / METRES_PER_DEGREE,
    ),
  );
}

const corners = [
  [1, 1],
  [1, -1],
  [-1, 1],
  [-1, -1],
] as const;

function isInBox(box: GeoBox, lon: number, lat: number, reachDeg: number): boolean {
  if (lat < box.south - reachDeg || lat > box.north + reachDeg) return false;
  const reachLon = reachDeg === 0 ? 0 : reachDeg / Math.max(0.01, Math.cos((lat * Math.PI) / 180));
  const width = box.west === -180 && box.east === 180 ? 360 : (box.east - box.west + 360) % 360;
  const fromMiddle = longitudeDifference(box.west + width / 2, lon);
  return Math.abs(fromMiddle) <= width / 2 + reachLon;
}
