import type { MarkName } from '../shared/mark-picture.ts';

/** The words of the legend. */
export const legendWords = {
  title: 'Ink by Beaufort',
  marks: 'Marks',
  calm: 'calm',
  open: 'Legend',
  close: 'Hide',
} as const;

/** The six inks: the class whose barb stands for them, and their words. */
export const inks = [
  { beaufort: 3, text: '0–3' },
  { beaufort: 5, text: '4–5' },
  { beaufort: 7, text: '6–7' },
  { beaufort: 9, text: '8–9 gale' },
  { beaufort: 11, text: '10–11 storm' },
  { beaufort: 12, text: '12 hurricane force' },
] as const;

/** The marks of the chart and what each says. */
export const marks: readonly { mark: MarkName; text: string }[] = [
  { mark: 'unseen', text: 'not looked at' },
  { mark: 'noWind', text: 'looked at, no wind' },
  { mark: 'land', text: 'land in cell' },
  { mark: 'quality', text: 'doubted by the producer' },
  { mark: 'rain', text: 'rain' },
  { mark: 'ice', text: 'ice' },
  { mark: 'noDirection', text: 'direction not known' },
  { mark: 'hidden', text: 'hidden by a switch' },
];
