/** Knots in one metre per second: 3600 s / 1852 m (the international nautical mile). */
export const KNOTS_PER_MS = 3600 / 1852;

/** Metres per second to knots, unrounded. */
export function toKnots(speedMs: number): number {
  return speedMs * KNOTS_PER_MS;
}

/** Knots rounded to whole knots: the one number that classes, barbs, counts and words all use. NaN stays NaN. */
export function toWholeKnots(speedMs: number): number {
  return Math.floor(speedMs * KNOTS_PER_MS + 0.5);
}

/** A direction in degrees brought into 0 <= d < 360; NaN stays NaN. */
export function normaliseDegrees(degrees: number): number {
  const within = degrees % 360;
  return within < 0 ? within + 360 : within;
}

/** A longitude in degrees brought into -180 <= lon < 180; NaN stays NaN. */
export function normaliseLongitude(lon: number): number {
  return normaliseDegrees(lon + 180) - 180;
}
