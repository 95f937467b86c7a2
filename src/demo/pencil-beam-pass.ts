import { destination } from '../geometry/sphere.ts';
import { createBackground, createSwath, LOOKED_NO_WIND, type Swath, WIND } from '../swath/swath.ts';
import { flagBit } from '../wind/flags.ts';
import { normaliseDegrees } from '../wind/units.ts';
import { roundTo } from './fan-beam-geometry.ts';
import type { WindField } from './fan-beam-looks.ts';
import { type Crossing, findTrackPoint, type Orbit } from './orbit.ts';
import { createRandom, type Random } from './random.ts';
import { speedAndDirection } from './storm.ts';
import { measureCover, type Surface } from './surface.ts';

export interface PencilBeamPassOptions {
  /** Where and when the track crosses the middle row. */
  crossing: Crossing;
  rows: number;
  /** The wind that is there. */
  windAt: WindField;
  /** The wind that a model believes is there. */
  modelWindAt: WindField;
  /** Rain at a place and time, mm/h. */
  rainAt: (lon: number, lat: number, timeMs: number) => number;
  surface: Surface;
  seed: number;
  platformCode: number;
}

/** The orbit of a Ku-band pencil-beam scatterometer. */
const pencilBeamOrbit: Orbit = { periodS: 100.94 * 60, inclinationDeg: 98.6, heightKm: 803 };

const COLUMNS = 76;
const CELL_KM = 25;

/** Half width of the wider of the two cones on the ground, km: beyond it a cell is never looked at. */
const HALF_WIDTH_KM = 897.6;

/** Columns at each edge that operational practice drops, for their poor look geometry. */
const DROPPED_COLUMNS = 8;

const ROW_INTERVAL_S = 3.75;
const FOOTPRINT_HALF_KM = 25;
const MOST_LAND = 0.2;
const MOST_ICE = 0.05;

const SPEED_NOISE_MS = 0.6;
const DIRECTION_NOISE_DEG = 7;

/** Near the track the looks lie almost in line, and the direction is the less sure. */
const NADIR_KM = 150;
const NADIR_NOISE_DEG = 16;

/**
 * The wind that heavy rain alone would feign, m/s, and the rain rate, mm/h, at which it outweighs the sea: weak winds come
 * out too high and the strongest too low, as Brennan, Hennon and Knabb 2009 found. The numbers are invented.
 */
const RAIN_FEIGNED_MS = 16;
const RAIN_SCALE_MM_PER_HOUR = 7;

/** Rain that the check can see at all, and the share of it that the check finds. */
const LEAST_RAIN_MM_PER_HOUR = 1.5;
const RAIN_FOUND_SHARE = 0.85;

/** Share of rainless cells in strong wind that the check takes for rain. */
const FALSE_RAIN_SHARE = 0.01;

/**
 * A pass of an invented Ku-band pencil-beam scatterometer: the wind with noise, and with the errors that rain makes. No
 * nadir gap; outer columns looked at but dropped. The winds are not inverted: Ku-band model functions are tables.
 */
export function makePencilBeamPass(options: PencilBeamPassOptions): Swath {
  const { crossing, rows, seed } = options;
  const swath = createSwath(rows, COLUMNS);
  swath.background = createBackground(swath.lon.length);
  swath.cellSizeM = CELL_KM * 1000;
  swath.band = 'Ku';
  swath.viewing = 'pencil-beam';
  swath.platformCode = options.platformCode;
  swath.isDirectionStated = true;
  swath.flagReading = 'as-file-states';
  const random = createRandom(seed);
  for (let row = 0; row < rows; row++) {
    const seconds = (row - (rows - 1) / 2) * ROW_INTERVAL_S;
    const track = findTrackPoint(pencilBeamOrbit, crossing, seconds);
    const rowTimeMs = Math.round((crossing.timeMs + seconds * 1000) / 1000) * 1000;
    for (let column = 0; column < COLUMNS; column++) {
      const crossKm = (column - (COLUMNS - 1) / 2) * CELL_KM;
      if (Math.abs(crossKm) > HALF_WIDTH_KM) continue;
      const cell = row * COLUMNS + column;
      const [lon, lat] = destination(track.lon, track.lat, track.headingDeg + 90, crossKm);
      swath.state[cell] = LOOKED_NO_WIND;
      swath.lon[cell] = roundTo(lon, 5);
      swath.lat[cell] = roundTo(lat, 5);
      swath.timeMs[cell] = rowTimeMs;
      addModelWind(swath, cell, options);
      observe(swath, cell, crossKm, options, random);
    }
  }
  return swath;
}

function addModelWind({ background, lon, lat, timeMs }: Swath, cell: number, options: PencilBeamPassOptions): void {
  if (background === null) return;
  const wind = speedAndDirection(options.modelWindAt(lon[cell], lat[cell], timeMs[cell]));
  background.speedMs[cell] = roundTo(wind.speedMs, 2);
  background.directionFrom[cell] = roundTo(wind.directionFrom, 1) % 360;
}

/** Flags and, where nothing stands in the way, the wind of a cell. */
function observe(
  swath: Swath,
  cell: number,
  crossKm: number,
  { surface, windAt, rainAt }: PencilBeamPassOptions,
  random: Random,
): void {
  const lon = swath.lon[cell];
  const lat = swath.lat[cell];
  const timeMs = swath.timeMs[cell];
  const cover = measureCover(surface, lon, lat, FOOTPRINT_HALF_KM);
  if (cover.land > 0) swath.flags[cell] |= flagBit.landInCell;
  if (cover.ice > 0) swath.flags[cell] |= flagBit.iceInCell;
  const column = cell % COLUMNS;
  if (column < DROPPED_COLUMNS || column >= COLUMNS - DROPPED_COLUMNS) {
    swath.flags[cell] |= flagBit.poorLookGeometry | flagBit.noWindSolution | flagBit.rainCheckNotUsable;
    return;
  }
  if (cover.land > MOST_LAND || cover.ice > MOST_ICE) {
    swath.flags[cell] |= flagBit.tooFewLooks | flagBit.noWindSolution | flagBit.rainCheckNotUsable;
    return;
  }
  const truth = speedAndDirection(windAt(lon, lat, timeMs));
  const rain = rainAt(lon, lat, timeMs);
  const rainWeight = 1 - Math.exp(-rain / RAIN_SCALE_MM_PER_HOUR);
  const feigned = truth.speedMs + rainWeight * (RAIN_FEIGNED_MS - truth.speedMs);
  const speedMs = roundTo(Math.max(0.2, feigned + SPEED_NOISE_MS * random.gaussian()), 2);
  const directionNoise = (Math.abs(crossKm) < NADIR_KM ? NADIR_NOISE_DEG : DIRECTION_NOISE_DEG) * (1 + 2 * rainWeight);
  swath.state[cell] = WIND;
  swath.speedMs[cell] = speedMs;
  swath.directionFrom[cell] =
    roundTo(normaliseDegrees(truth.directionFrom + directionNoise * random.gaussian()), 1) % 360;
  if (isRainFound(rain, truth.speedMs, random)) swath.flags[cell] |= flagBit.rain;
  if (speedMs <= 3) swath.flags[cell] |= flagBit.atMost3Ms;
  if (speedMs > 30) swath.flags[cell] |= flagBit.above30Ms;
}

function isRainFound(rainMmPerHour: number, speedMs: number, random: Random): boolean {
  const chance = random.next();
  if (rainMmPerHour >= LEAST_RAIN_MM_PER_HOUR) return chance < RAIN_FOUND_SHARE;
  return speedMs > 15 && chance < FALSE_RAIN_SHARE;
}
