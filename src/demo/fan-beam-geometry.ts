import { bearingDeg, destination, EARTH_RADIUS_KM } from '../geometry/sphere.ts';
import { type Beams, createBeams, createSwath, LOOKED_NO_WIND, type Swath } from '../swath/swath.ts';
import { normaliseDegrees } from '../wind/units.ts';
import { type Crossing, findTrackPoint, type Orbit } from './orbit.ts';

/** The orbit of a C-band fan-beam scatterometer: period and inclination as measured on real passes. */
export const fanBeamOrbit: Orbit = { periodS: 6081.7, inclinationDeg: 98.7, heightKm: 822 };

/** Columns of each half swath, outermost first on the left, innermost first on the right. */
export const HALF_COLUMNS = 21;

/** The column ranges of the two half swaths: their innermost cells are the width of the nadir gap apart. */
export const fanBeamSides = [
  [0, HALF_COLUMNS],
  [HALF_COLUMNS, 2 * HALF_COLUMNS],
] as const;

/** Distance of the innermost cells from the track, and of each cell from the next, km: as measured on real passes. */
const INNERMOST_KM = 371.35;
const CELL_STEP_KM = 24.98;

/** Seconds from one row to the next: 25 km over the ground. */
export const ROW_INTERVAL_S = 3.75;

/** Angle at the cell between the mid look and the fore or aft look. */
const SQUINT_DEG = 45;

const RADIANS = Math.PI / 180;

/**
 * The cells of a fan-beam pass with place, time, incidence and azimuth of their three looks (fore, mid, aft), rounded as
 * the file holds them: looked at, without a wind yet. The crossing is at the middle row.
 */
export function locateFanBeamCells(orbit: Orbit, crossing: Crossing, rows: number): { swath: Swath; beams: Beams } {
  const swath = createSwath(rows, 2 * HALF_COLUMNS);
  const beams = createBeams(swath.lon.length, 3);
  for (let row = 0; row < rows; row++) {
    const seconds = (row - (rows - 1) / 2) * ROW_INTERVAL_S;
    const track = findTrackPoint(orbit, crossing, seconds);
    const rowTimeMs = Math.round((crossing.timeMs + seconds * 1000) / 1000) * 1000;
    for (let column = 0; column < swath.columns; column++) {
      const isLeft = column < HALF_COLUMNS;
      const fromInner = isLeft ? HALF_COLUMNS - 1 - column : column - HALF_COLUMNS;
      const crossKm = INNERMOST_KM + fromInner * CELL_STEP_KM;
      const [lon, lat] = destination(track.lon, track.lat, track.headingDeg + (isLeft ? -90 : 90), crossKm);
      const cell = row * swath.columns + column;
      swath.state[cell] = LOOKED_NO_WIND;
      swath.lon[cell] = roundTo(lon, 5);
      swath.lat[cell] = roundTo(lat, 5);
      swath.timeMs[cell] = rowTimeMs;
      const toTrack = bearingDeg(lon, lat, track.lon, track.lat);
      for (const [look, squint] of [SQUINT_DEG, 0, -SQUINT_DEG].entries()) {
        const place = cell * 3 + look;
        beams.incidenceDeg[place] = roundTo(incidenceOf(crossKm, squint, orbit.heightKm), 2);
        beams.azimuthDeg[place] = roundTo(normaliseDegrees(toTrack + (isLeft ? squint : -squint)), 2);
      }
    }
  }
  return { swath, beams };
}

/**
 * Incidence of a look at a cell so far from the track. A fore or aft look comes from where the track is seen from the cell
 * at the squint angle: a right-angled spherical triangle, the earth's turning between the looks left out.
 */
function incidenceOf(crossKm: number, squintDeg: number, heightKm: number): number {
  const cross = crossKm / EARTH_RADIUS_KM;
  const along = Math.atan(Math.tan(squintDeg * RADIANS) * Math.sin(cross));
  const ground = Math.acos(Math.cos(along) * Math.cos(cross));
  const nadirAngle = Math.atan2(
    EARTH_RADIUS_KM * Math.sin(ground),
    EARTH_RADIUS_KM + heightKm - EARTH_RADIUS_KM * Math.cos(ground),
  );
  return (nadirAngle + ground) / RADIANS;
}

/** A number rounded to so many decimals, as a file with that scale holds it. */
export function roundTo(value: number, decimals: number): number {
  return Math.round(value * 10 ** decimals) / 10 ** decimals;
}
