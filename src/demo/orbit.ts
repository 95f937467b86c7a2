import { bearingDeg, longitudeDifference } from '../geometry/sphere.ts';
import { normaliseLongitude } from '../wind/units.ts';

/** A circular orbit whose plane keeps its angle to the sun. */
export interface Orbit {
  periodS: number;
  inclinationDeg: number;
  heightKm: number;
}

/** Where and when the track crosses the middle of a pass. */
export interface Crossing {
  lon: number;
  lat: number;
  timeMs: number;
  isAscending: boolean;
}

/** A point under the satellite, with the bearing it moves to over the ground, degrees true. */
export interface TrackPoint {
  lon: number;
  lat: number;
  headingDeg: number;
}

const RADIANS = Math.PI / 180;

/** The earth turns once a day under a plane that keeps its angle to the sun, degrees a second. */
const TURN_DEG_PER_S = 360 / 86_400;

/** The point under the satellite so many seconds after (before, if negative) the crossing. */
export function findTrackPoint(orbit: Orbit, crossing: Crossing, seconds: number): TrackPoint {
  const [lon, lat] = subPoint(orbit, crossing, seconds);
  const [beforeLon, beforeLat] = subPoint(orbit, crossing, seconds - 1);
  const [afterLon, afterLat] = subPoint(orbit, crossing, seconds + 1);
  return { lon, lat, headingDeg: bearingDeg(beforeLon, beforeLat, afterLon, afterLat) };
}

/** Spherical triangle of node, equator and satellite: sin lat = sin i sin u, tan dlon = cos i tan u, u from the node. */
function subPoint(orbit: Orbit, crossing: Crossing, seconds: number): [lon: number, lat: number] {
  const inclination = orbit.inclinationDeg * RADIANS;
  const rising = Math.asin(Math.sin(crossing.lat * RADIANS) / Math.sin(inclination));
  const start = crossing.isAscending ? rising : Math.PI - rising;
  const argument = start + (seconds / orbit.periodS) * 2 * Math.PI;
  const turn = longitudeDifference(fromNode(inclination, start), fromNode(inclination, argument));
  return [
    normaliseLongitude(crossing.lon + turn - TURN_DEG_PER_S * seconds),
    Math.asin(Math.sin(inclination) * Math.sin(argument)) / RADIANS,
  ];
}

function fromNode(inclination: number, argument: number): number {
  return Math.atan2(Math.cos(inclination) * Math.sin(argument), Math.cos(argument)) / RADIANS;
}
