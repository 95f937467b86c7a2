import { bearingDeg, destination, distanceKm, longitudeDifference } from '../geometry/sphere.ts';

/** A wind as its motion's eastward and northward parts, m/s. */
export interface WindVector {
  eastMs: number;
  northMs: number;
}

/**
 * An invented winter low of the northern hemisphere that moves and deepens, with a cold front, in a weak flow beside a
 * high. It is a drawing of such a storm by simple formulas, with no physics of the air in it.
 */
export interface Storm {
  start: { timeMs: number; lon: number; lat: number };
  /** Where the centre moves to. */
  courseDeg: number;
  speedKmPerHour: number;
  /** Strongest wind of the round vortex, before asymmetry and flow are added, at the start; and its growth. */
  vortexMs: number;
  vortexGrowthMsPerHour: number;
  /** Distance of the strongest wind from the centre. */
  radiusKm: number;
  /** Half of the wind's turn across the cold front. */
  frontTurnDeg: number;
  high: { lon: number; lat: number };
  /** A small low in the cold air, of the kind that models miss; null where one does. */
  smallLow: { lon: number; lat: number; strongestMs: number; radiusKm: number } | null;
}

/** Angle by which the wind blows in towards the low, and out from the high: usual over sea, value from memory. */
const INFLOW_DEG = 20;
const OUTFLOW_DEG = 15;

/** The wind falls as a power of the distance, and to nothing far out. */
const DECAY_POWER = 0.75;
const REACH_KM = 1500;

/** The strongest winds lie in the cold air to the south-south-west of the centre. */
const STRONG_SIDE_DEG = 205;
const STRONG_SIDE_SHARE = 0.2;

/** How far a small low's wind reaches, in its radii. */
const SMALL_LOW_REACH = 2.5;

const HIGH_MS = 8;
const HIGH_RADIUS_KM = 800;

const RADIANS = Math.PI / 180;

/** The 10-m wind of the storm at a place (degrees) and time. */
export function windAt(storm: Storm, lon: number, lat: number, timeMs: number): WindVector {
  const low = lowWind(storm, lon, lat, timeMs);
  const parts = [low, highWind(storm, lon, lat), smallLowWind(storm, lon, lat), steeringFlow(lat)];
  return {
    eastMs: parts.reduce((sum, { eastMs }) => sum + eastMs, 0),
    northMs: parts.reduce((sum, { northMs }) => sum + northMs, 0),
  };
}

/** Rain at a place and time, mm/h: a band along the cold front and one wound round the north of the centre. */
export function rainAt(storm: Storm, lon: number, lat: number, timeMs: number): number {
  const { distance, bearing } = fromCentre(storm, lon, lat, timeMs);
  const front = frontAt(distance, bearing);
  const showers = 0.65 + 0.35 * Math.sin(distance / 55) * Math.sin(bearing / 9);
  const frontRain = 10 * front.presence * bell((front.behindKm + 25) / 50) * showers;
  // The band starts to the east of the centre, and winds inward through north to the south-west.
  const wound = (450 - bearing) % 360;
  const bandKm = 430 - 1.15 * wound;
  const bandRain = 8 * bell((distance - bandKm) / 60) * smoothStep(250, 190, wound) * showers;
  return Math.max(frontRain, bandRain);
}

/** Where the centre of the low is: [lon, lat] in degrees. */
export function stormCentre({ start, courseDeg, speedKmPerHour }: Storm, timeMs: number): [lon: number, lat: number] {
  return destination(start.lon, start.lat, courseDeg, speedKmPerHour * hoursSince(start.timeMs, timeMs));
}

/** Speed in m/s and direction the wind blows from, degrees true 0 <= d < 360. */
export function speedAndDirection({ eastMs, northMs }: WindVector): { speedMs: number; directionFrom: number } {
  const directionFrom = (Math.atan2(-eastMs, -northMs) / RADIANS + 360) % 360;
  return { speedMs: Math.hypot(eastMs, northMs), directionFrom };
}

function lowWind(storm: Storm, lon: number, lat: number, timeMs: number): WindVector {
  const { distance, bearing } = fromCentre(storm, lon, lat, timeMs);
  const front = frontAt(distance, bearing);
  const strongest = storm.vortexMs + storm.vortexGrowthMsPerHour * hoursSince(storm.start.timeMs, timeMs);
  const x = distance / storm.radiusKm;
  const round = strongest * ((2 * x) / (1 + x * x)) ** DECAY_POWER * Math.exp(-((distance / REACH_KM) ** 2));
  const side = 1 + STRONG_SIDE_SHARE * Math.cos((bearing - STRONG_SIDE_DEG) * RADIANS);
  const jet = 1 + 0.2 * front.presence * bell((front.behindKm + 90) / 90);
  // Counter-clockwise in the north: east of the centre the air moves north, and in towards the centre.
  const turn = storm.frontTurnDeg * front.presence * Math.tanh(front.behindKm / 25) * fade(front.behindKm, 450);
  return vectorTowards(bearing - 90 - INFLOW_DEG + turn, round * side * jet);
}

/** Clockwise round the high, and out of it. */
function highWind({ high }: Storm, lon: number, lat: number): WindVector {
  const x = distanceKm(high.lon, high.lat, lon, lat) / HIGH_RADIUS_KM;
  const bearing = bearingDeg(high.lon, high.lat, lon, lat);
  return vectorTowards(bearing + 90 - OUTFLOW_DEG, (HIGH_MS * 2 * x) / (1 + x * x) ** 2);
}

function smallLowWind({ smallLow }: Storm, lon: number, lat: number): WindVector {
  if (smallLow === null) return { eastMs: 0, northMs: 0 };
  const x = distanceKm(smallLow.lon, smallLow.lat, lon, lat) / smallLow.radiusKm;
  const bearing = bearingDeg(smallLow.lon, smallLow.lat, lon, lat);
  const speedMs = smallLow.strongestMs * ((2 * x) / (1 + x * x)) * bell(x / SMALL_LOW_REACH);
  return vectorTowards(bearing - 90 - INFLOW_DEG, speedMs);
}

/** Westerly in the south, easterly in the north. */
function steeringFlow(lat: number): WindVector {
  return { eastMs: 5 * Math.tanh((54 - lat) / 6), northMs: 1 };
}

/** The cold front leaves the centre to the south-east and curves to the south. */
function frontAt(distance: number, bearing: number): { behindKm: number; presence: number } {
  const frontBearing = 122 + 48 * (distance / 1000) ** 0.8;
  const behindKm = distance * longitudeDifference(frontBearing, bearing) * RADIANS;
  return { behindKm, presence: smoothStep(90, 260, distance) * smoothStep(1500, 1000, distance) };
}

function fromCentre(storm: Storm, lon: number, lat: number, timeMs: number): { distance: number; bearing: number } {
  const [centreLon, centreLat] = stormCentre(storm, timeMs);
  return {
    distance: distanceKm(centreLon, centreLat, lon, lat),
    bearing: bearingDeg(centreLon, centreLat, lon, lat),
  };
}

function vectorTowards(degrees: number, speedMs: number): WindVector {
  return { eastMs: speedMs * Math.sin(degrees * RADIANS), northMs: speedMs * Math.cos(degrees * RADIANS) };
}

function hoursSince(startMs: number, timeMs: number): number {
  return (timeMs - startMs) / 3_600_000;
}

function bell(x: number): number {
  return Math.exp(-x * x);
}

function fade(distance: number, scale: number): number {
  return Math.exp(-Math.abs(distance) / scale);
}

/** 0 at `from` and beyond, 1 at `to` and beyond, smooth between. */
function smoothStep(from: number, to: number, x: number): number {
  const t = Math.max(0, Math.min(1, (x - from) / (to - from)));
  return t * t * (3 - 2 * t);
}
