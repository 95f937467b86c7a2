import type { Settings } from '../../src/contract/values.ts';

export type LightName = Settings['light'];

/** Every colour the window draws with, for one light. Six wind inks: Beaufort 0-3, 4-5, 6-7, 8-9, 10-11, 12. */
export interface Light {
  paper: string;
  ink: string;
  soft: string;
  rule: string;
  /** Outline of what can be pressed: at least 3 to 1 against the paper (WCAG 2.2, 1.4.11). */
  edge: string;
  sea: string;
  unseen: string;
  hatch: string;
  land: string;
  coast: string;
  windInks: [string, string, string, string, string, string];
}

/**
 * Day is paper, dusk is slate, night is ember on black. Wind class is weight first, then darkness, then hue: each ink
 * stands further from the sea than the one before in relative luminance (WCAG 2.2, definition of contrast ratio).
 */
export const lights: Record<LightName, Light> = {
  day: {
    paper: '#f6f3ec',
    ink: '#22303a',
    soft: '#5d6b73',
    rule: '#cfc8b8',
    edge: '#857f6f',
    sea: '#eef3f3',
    unseen: '#cfd6d6',
    hatch: '#69757a',
    land: '#e3d9c2',
    coast: '#6d6350',
    windInks: ['#768891', '#506a76', '#1c636d', '#7a3a06', '#74102f', '#35084f'],
  },
  dusk: {
    paper: '#2a3036',
    ink: '#e4dfd2',
    soft: '#b3b6b0',
    rule: '#444c52',
    edge: '#818a90',
    sea: '#333c43',
    unseen: '#1c2024',
    hatch: '#66727b',
    land: '#4a463c',
    coast: '#a39a83',
    windInks: ['#7f8c95', '#9bb0bb', '#7fd0d6', '#ffc684', '#ffd9d2', '#f7ecff'],
  },
  night: {
    paper: '#0c0806',
    ink: '#d4823f',
    soft: '#b06c3d',
    rule: '#2f1d11',
    edge: '#8a5832',
    sea: '#1a110b',
    unseen: '#040302',
    hatch: '#7a4b24',
    land: '#21160d',
    coast: '#86552d',
    windInks: ['#8b5629', '#a36a30', '#bd7b3b', '#dc913f', '#ffa878', '#ffdcc4'],
  },
};

/** The ink's place in `windInks` of each Beaufort class, 0 to 12. */
export const inkOfBeaufort = [0, 0, 0, 0, 1, 1, 2, 2, 3, 3, 4, 4, 5] as const;

/** Stroke of a barb in CSS pixels, for each ink. */
export const inkWeightsPx = [1, 1.15, 1.35, 1.8, 2.1, 2.4] as const;
