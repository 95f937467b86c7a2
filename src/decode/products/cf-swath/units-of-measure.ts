import { KNOTS_PER_MS } from '../../../wind/units.ts';

/** Factor from a speed unit, as UDUNITS and common practice spell it, to m/s; undefined for a unit we do not know. */
export function speedFactor(unit: string): number | undefined {
  const words = unit
    .toLowerCase()
    .replace(/\bmet(re|er)s?\b/, 'm')
    .replace(/\bsec(ond)?s?\b/, 's');
  const spelling = words.replace(/\s+|\*\*|\^|\./g, '');
  if (['ms-1', 'm/s', 'mpers'].includes(spelling)) return 1;
  if (['knot', 'knots', 'kt', 'kts'].includes(spelling)) return 1 / KNOTS_PER_MS;
  if (['kmh-1', 'km/h', 'kmhr-1', 'km/hr'].includes(spelling)) return 1 / 3.6;
  if (['cms-1', 'cm/s'].includes(spelling)) return 0.01;
  return undefined;
}

/** Factor from an angle unit to degrees; undefined for a unit we do not know. */
export function angleFactor(unit: string): number | undefined {
  if (/^(deg|degrees?|degrees?_(true|t|north|n|east|e)|degrees? true|°)$/i.test(unit)) return 1;
  return /^rad(ian)?s?$/i.test(unit) ? 180 / Math.PI : undefined;
}

/** Factor from a share's unit to the range 0 to 1: CF writes 1, others per cent or nothing. */
export function shareFactor(unit: string): number {
  return /^(%|percent|per cent)$/i.test(unit) ? 0.01 : 1;
}
