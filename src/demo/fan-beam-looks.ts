import { modelBackscatter } from '../analyse/retrieval/cmod5n.ts';
import { destination } from '../geometry/sphere.ts';
import type { Beams, Swath } from '../swath/swath.ts';
import { roundTo } from './fan-beam-geometry.ts';
import type { Random } from './random.ts';
import { speedAndDirection, type WindVector } from './storm.ts';

/** A wind for every place and time. */
export type WindField = (lon: number, lat: number, timeMs: number) => WindVector;

/** Half of the spacing between the nine points whose backscatter a look averages, km. */
const SAMPLE_KM = 9;

/** Noise of a strong echo, and the part that grows as the echo fades, fractions: chosen to give the few percent of real files. */
const LEAST_NOISE = 0.018;
const FAINT_ECHO = 6e-5;

/** Scatter of the sea itself about the model function, which no noise figure of the file holds. */
const SEA_SCATTER = 0.035;

/** Backscatter of land at any angle, linear: a few times that of a rough sea. */
const LAND_BACKSCATTER = 0.12;

/** How much of the land's echo is left after the producer's correction of coastal cells. */
const LAND_LEFT_OVER = 0.15;

/**
 * Fills in the backscatter and noise of a cell's looks, rounded as the file holds them. Each look averages nine points of
 * the sea with weights of its own, since no two looks cover quite the same water: in a front or a centre they disagree.
 */
export function measureLooks(
  swath: Swath,
  beams: Beams,
  cell: number,
  windAt: WindField,
  landShare: number,
  random: Random,
): void {
  const winds = sampleWinds(swath.lon[cell], swath.lat[cell], swath.timeMs[cell], windAt);
  for (let look = cell * beams.count; look < (cell + 1) * beams.count; look++) {
    const upwind = beams.azimuthDeg[look] + 180;
    let sum = 0;
    let weights = 0;
    for (const { speedMs, directionFrom } of winds) {
      const weight = 0.5 + random.next();
      sum += weight * modelBackscatter(speedMs, directionFrom - upwind, beams.incidenceDeg[look]);
      weights += weight;
    }
    const land = landShare * LAND_LEFT_OVER;
    const echo = (1 - land) * (sum / weights) + land * LAND_BACKSCATTER;
    const noise = Math.hypot(LEAST_NOISE, FAINT_ECHO / echo);
    const measured = echo * (1 + Math.hypot(noise, SEA_SCATTER) * random.gaussian());
    beams.noisePercent[look] = roundTo(Math.min(100, noise * 100), 1);
    if (measured > 0) beams.backscatterDb[look] = roundTo(10 * Math.log10(measured), 2);
  }
}

function sampleWinds(lon: number, lat: number, timeMs: number, windAt: WindField) {
  const winds = [speedAndDirection(windAt(lon, lat, timeMs))];
  for (let bearing = 0; bearing < 360; bearing += 45) {
    const distanceKm = bearing % 90 === 0 ? SAMPLE_KM : SAMPLE_KM * Math.SQRT2;
    const [sampleLon, sampleLat] = destination(lon, lat, bearing, distanceKm);
    winds.push(speedAndDirection(windAt(sampleLon, sampleLat, timeMs)));
  }
  return winds;
}
