import { kinks } from '@turf/turf';
import { normaliseLongitude } from '../wind/units.ts';
import { unwrapRing } from './paint-polygons.ts';

/** A position where two edges of a ring cross, so that its inside is in doubt; null for a sound ring. */
export function findCrossing(ring: readonly (readonly number[])[]): [lon: number, lat: number] | null {
  const unwrapped = unwrapRing(ring);
  const crossings = kinks({ type: 'Polygon', coordinates: [[...unwrapped, unwrapped[0]]] });
  const [lon, lat] = crossings.features[0]?.geometry.coordinates ?? [];
  return lon === undefined ? null : [normaliseLongitude(lon), lat];
}
