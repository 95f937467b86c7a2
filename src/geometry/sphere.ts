/** Mean radius of the earth, km: IUGG R1 = (2a + b)/3 of WGS 84. */
export const EARTH_RADIUS_KM = 6371.0088;

/** Kilometres in one international nautical mile. */
export const KM_PER_NAUTICAL_MILE = 1.852;

const RADIANS = Math.PI / 180;

/** Great-circle distance in km between two positions in degrees (half-angle form, exact for near and far points). */
export function distanceKm(lon1: number, lat1: number, lon2: number, lat2: number): number {
  const sinHalfLat = Math.sin(((lat2 - lat1) * RADIANS) / 2);
  const sinHalfLon = Math.sin(((lon2 - lon1) * RADIANS) / 2);
  const h = sinHalfLat * sinHalfLat + Math.cos(lat1 * RADIANS) * Math.cos(lat2 * RADIANS) * sinHalfLon * sinHalfLon;
  return 2 * EARTH_RADIUS_KM * Math.asin(Math.min(1, Math.sqrt(h)));
}

/** Initial great-circle bearing from the first position to the second, degrees true, 0 <= b < 360; 0 where they are one. */
export function bearingDeg(lon1: number, lat1: number, lon2: number, lat2: number): number {
  const deltaLon = (lon2 - lon1) * RADIANS;
  const cosLat2 = Math.cos(lat2 * RADIANS);
  const y = Math.sin(deltaLon) * cosLat2;
  const x =
    Math.cos(lat1 * RADIANS) * Math.sin(lat2 * RADIANS) - Math.sin(lat1 * RADIANS) * cosLat2 * Math.cos(deltaLon);
  return (Math.atan2(y, x) / RADIANS + 360) % 360;
}

/** The position reached from one along a great circle: [lon, lat] in degrees, -180 <= lon < 180. */
export function destination(lon: number, lat: number, bearing: number, distance: number): [lon: number, lat: number] {
  const angle = distance / EARTH_RADIUS_KM;
  const sinLat = Math.sin(lat * RADIANS);
  const cosLat = Math.cos(lat * RADIANS);
  const sinLat2 = sinLat * Math.cos(angle) + cosLat * Math.sin(angle) * Math.cos(bearing * RADIANS);
  const deltaLon = Math.atan2(
    Math.sin(bearing * RADIANS) * Math.sin(angle) * cosLat,
    Math.cos(angle) - sinLat * sinLat2,
  );
  const lon2 = lon + deltaLon / RADIANS;
  return [((((lon2 + 180) % 360) + 360) % 360) - 180, Math.asin(Math.max(-1, Math.min(1, sinLat2))) / RADIANS];
}

/** The shorter way round from one longitude to another, degrees, -180 <= d < 180. */
export function longitudeDifference(from: number, to: number): number {
  return ((((to - from + 180) % 360) + 360) % 360) - 180;
}
