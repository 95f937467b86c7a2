import { beaufortLowestKnots, beaufortNames, describeBeaufortKnots } from '../../../src/wind/beaufort.ts';
import type { DoubtKind } from '../../../src/wind/flags.ts';
import type { Switches } from '../../../src/wind/switches.ts';
import { KNOTS_PER_MS } from '../../../src/wind/units.ts';

/** The words of the wind switches. */
export const windWords = {
  title: 'Winds shown',
  classes: 'By Beaufort class',
  rule: 'Knots are rounded to whole knots first; they decide the class. Gale begins at 33.5 kt.',
  columns: { show: 'show', name: 'name', knots: 'kt', metresPerSecond: 'm/s' },
  doubts: 'With doubt set by the producer',
  doubtNote: 'Switched off, a wind is not drawn. It stays counted, and the watch line says how many are hidden.',
  show: (beaufort: number) => `Show Beaufort ${beaufort}, ${beaufortNames[beaufort]}`,
} as const;

/** Each doubt as its switch says it. */
export const doubtWords: Record<DoubtKind, string> = {
  rain: 'Rain detected',
  land: 'Land in the cell',
  ice: 'Ice in the cell',
  quality: 'Doubted by the producer',
};

/** Sets of classes with a name: every class from the lowest one up. */
export const presets = [
  { text: 'All', lowest: 0 },
  { text: 'Near gale and more', lowest: 7 },
  { text: 'Gale and more', lowest: 8 },
  { text: 'Storm and more', lowest: 10 },
] as const;

/** The classes from a lowest one up. */
export function classesFrom(lowest: number): boolean[] {
  return Array.from({ length: 13 }, (_, beaufort) => beaufort >= lowest);
}

/** The limits of a class in knots: 'under 1', '34 to 40', '64 and over'. */
export function knotsOfClass(beaufort: number): string {
  return describeBeaufortKnots(beaufort);
}

/** The speed a class begins at, m/s, by the rule of whole knots: '17.23'. */
export function lowestMsOfClass(beaufort: number): string {
  if (beaufort === 0) return '0';
  return ((beaufortLowestKnots[beaufort] - 0.5) / KNOTS_PER_MS).toFixed(2);
}

/** What the switches show in a few words: 'all', 'gale and more', '9 of 13 classes; rain hidden'. */
export function summariseSwitches(switches: Switches): string {
  const hiddenDoubts = (Object.keys(doubtWords) as DoubtKind[]).filter((kind) => !switches.doubtShown[kind]);
  const doubts = hiddenDoubts.length > 0 ? `without ${hiddenDoubts.join(', ')}` : '';
  return [summariseClasses(switches.beaufortShown), doubts].filter(Boolean).join('; ');
}

function summariseClasses(shown: readonly boolean[]): string {
  const lowest = shown.indexOf(true);
  if (lowest < 0) return 'no class';
  if (shown.slice(lowest).every(Boolean)) return lowest === 0 ? 'all' : `${beaufortNames[lowest]} and more`;
  return `${shown.filter(Boolean).length} of 13 classes`;
}
