import { EARTH_RADIUS_KM } from './sphere.ts';

const RADIANS = Math.PI / 180;

/** A box in degrees; west > east when it crosses the date line. */
export interface LonLatBox {
  west: number;
  south: number;
  east: number;
  north: number;
}

/**
 * Points spread over a box so that each stands for the same area of the sphere: even steps in longitude and in the sine of
 * latitude (Archimedes: a zone's area is 2 pi R times its height). Point i is column i % columns, row floor(i / columns),
 * rows from south to north; each point lies in the middle of its patch.
 */
export interface EqualAreaGrid {
  columns: number;
  rows: number;
  /** Western edge, degrees, and width going east, degrees, at most 360. */
  west: number;
  widthDeg: number;
  sinSouth: number;
  sinHeight: number;
  /** Area each point stands for. */
  pointKm2: number;
  /** Longitude of each column, degrees, west <= lon < west + width (so it may pass 180). */
  columnLon: Float64Array;
  /** Latitude of each row, degrees. */
  rowLat: Float64Array;
}

/** A grid of about so many points over a box, its patches near square in the middle of the box. */
export function layEqualAreaGrid(box: LonLatBox, points: number): EqualAreaGrid {
  const whole = box.west === box.east || (box.west === -180 && box.east === 180);
  const widthDeg = whole ? 360 : (box.east - box.west + 360) % 360;
  const sinSouth = Math.sin(box.south * RADIANS);
  const sinHeight = Math.sin(box.north * RADIANS) - sinSouth;
  const midCos = Math.max(0.05, Math.cos(((box.south + box.north) / 2) * RADIANS));
  const shape = (widthDeg * midCos) / Math.max(1e-6, box.north - box.south);
  const rows = Math.max(1, Math.min(points, Math.round(Math.sqrt(points / Math.max(1e-6, shape)))));
  const columns = Math.max(1, Math.round(points / rows));
  return {
    columns,
    rows,
    west: box.west,
    widthDeg,
    sinSouth,
    sinHeight,
    pointKm2: (EARTH_RADIUS_KM ** 2 * (widthDeg * RADIANS) * sinHeight) / (columns * rows),
    columnLon: Float64Array.from({ length: columns }, (_, column) => box.west + ((column + 0.5) * widthDeg) / columns),
    rowLat: Float64Array.from(
      { length: rows },
      (_, row) => Math.asin(sinSouth + ((row + 0.5) * sinHeight) / rows) / RADIANS,
    ),
  };
}

/** The row whose patch holds a latitude; below 0 or at least `rows` outside the grid. */
export function gridRowAt(grid: EqualAreaGrid, lat: number): number {
  return Math.floor(((Math.sin(lat * RADIANS) - grid.sinSouth) / grid.sinHeight) * grid.rows);
}

/** The column whose patch holds a longitude; at least `columns` outside the grid. */
export function gridColumnAt(grid: EqualAreaGrid, lon: number): number {
  const east = (((lon - grid.west) % 360) + 360) % 360;
  return Math.floor((east / grid.widthDeg) * grid.columns);
}
