import { toWholeKnots } from './units.ts';

/**
 * The Beaufort scale. Lowest whole knots of each class, 0 to 12: WMO-No. 306, code table 1100.
 * The class of a speed is decided on knots rounded to whole knots, everywhere: gale begins at 33.5 kt,
 * and 17.2 m/s (33.43 kt) is still Beaufort 7.
 */
export const beaufortLowestKnots = [0, 1, 4, 7, 11, 17, 22, 28, 34, 41, 48, 56, 64] as const;

/** The names of the classes, 0 to 12. */
export const beaufortNames = [
  'calm',
  'light air',
  'light breeze',
  'gentle breeze',
  'moderate breeze',
  'fresh breeze',
  'strong breeze',
  'near gale',
  'gale',
  'strong gale',
  'storm',
  'violent storm',
  'hurricane force',
] as const;

/** The lowest Beaufort class that counts as gale force or more. */
export const GALE_BEAUFORT = 8;

/** Beaufort class, 0 to 12, of whole knots. NaN gives -1. */
export function beaufortOfKnots(wholeKnots: number): number {
  if (!(wholeKnots >= 0)) return -1;
  let beaufort = 12;
  while (wholeKnots < beaufortLowestKnots[beaufort]) beaufort--;
  return beaufort;
}

/** Beaufort class, 0 to 12, of a speed in m/s by the one rule above. NaN gives -1. */
export function beaufortOfSpeed(speedMs: number): number {
  return beaufortOfKnots(toWholeKnots(speedMs));
}

/** Whether a speed in m/s is of gale force or more by the one rule above. */
export function isGale(speedMs: number): boolean {
  return beaufortOfSpeed(speedMs) >= GALE_BEAUFORT;
}

/** The knots of a class in words: 'under 1', '34 to 40', '64 and over'. */
export function describeBeaufortKnots(beaufort: number): string {
  if (beaufort === 0) return 'under 1';
  if (beaufort === 12) return `${beaufortLowestKnots[12]} and over`;
  return `${beaufortLowestKnots[beaufort]} to ${beaufortLowestKnots[beaufort + 1] - 1}`;
}
