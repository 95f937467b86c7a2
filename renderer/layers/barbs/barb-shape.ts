import { SHAFT_PX } from '../shared/barb-size.ts';

/**
 * A barb in CSS pixels about its position: x across the shaft, positive towards the side that carries the feathers;
 * y along the shaft, from the position (0) out to where the wind comes from.
 *
 * Sources: Glossary of Meteorology, 'wind barb' (half barb 5 kt, barb 10 kt, pennant 50 kt, to the nearest 5 kt; the
 * shaft ends at the position); WMO-No. 485, appendix II-4 (the side). Sizes are our own.
 */
export interface BarbShape {
  /** Strokes from point to point, the shaft first. */
  strokes: Stroke[];
  /** Solid triangles, each from the middle of its base on the shaft to its tip. */
  pennants: Stroke[];
}

export interface Stroke {
  from: [x: number, y: number];
  to: [x: number, y: number];
}

export const PENNANT_BASE_PX = 6;

const FEATHER_PX = 9.5;
/** Feathers lean out from the shaft's end: degrees from square. */
const LEAN_DEG = 22;
const FEATHER_STEP_PX = 3.9;
const PENNANT_STEP_PX = 6.4;
/** How much bare shaft is left at the position. */
const FOOT_PX = 4;

/** Past this the barb stays the same: 600 kt, far outside what any file can hold to be a wind. */
export const MOST_FIVES = 120;

/** Knots in the nearest five; whole knots have no ties. */
export function fivesOf(wholeKnots: number): number {
  return Math.floor((wholeKnots + 2.5) / 5);
}

/** The barb of a wind of five knots so many times; 0 is a bare shaft, for winds of 1 and 2 kt. */
export function barbShape(fives: number): BarbShape {
  const pennantCount = Math.floor(fives / 10);
  const fullCount = Math.floor((fives % 10) / 2);
  const hasHalf = fives % 2 === 1;
  const isLoneHalf = fives === 1;
  const featherCount = fullCount + (hasHalf ? 1 : 0);
  const needed = FOOT_PX + pennantCount * PENNANT_STEP_PX + featherCount * FEATHER_STEP_PX;
  const length = Math.max(SHAFT_PX, needed);
  const strokes: Stroke[] = [{ from: [0, 0], to: [0, length] }];
  const pennants: Stroke[] = [];
  let at = length;
  for (let i = 0; i < pennantCount; i++) {
    const middle = at - PENNANT_BASE_PX / 2;
    pennants.push({ from: [0, middle], to: [FEATHER_PX, middle] });
    at -= PENNANT_STEP_PX;
  }
  if (pennantCount > 0) at -= PENNANT_GAP_PX;
  if (isLoneHalf) at -= FEATHER_STEP_PX;
  for (let i = 0; i < featherCount; i++) {
    strokes.push(feather(at, hasHalf && i === featherCount - 1 ? FEATHER_PX / 2 : FEATHER_PX));
    at -= FEATHER_STEP_PX;
  }
  return { strokes, pennants };
}

/** Clear water between the last pennant and the first feather. */
const PENNANT_GAP_PX = 2;

function feather(at: number, lengthPx: number): Stroke {
  const lean = (LEAN_DEG * Math.PI) / 180;
  return { from: [0, at], to: [lengthPx * Math.cos(lean), at + lengthPx * Math.sin(lean)] };
}
