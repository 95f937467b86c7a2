import { beaufortLowestKnots } from '../../../src/wind/beaufort.ts';
import { inkOfBeaufort, inkWeightsPx } from '../../state/lights.ts';
import { draw } from './make.ts';

const SHAFT_PX = 21;
const FEATHER_PX = 8;
const STEP_PX = 3.6;
const CALM_CIRCLE = 'M 8 0 a 3 3 0 1 0 6 0 a 3 3 0 1 0 -6 0';

/** A barb as keys show it: wind from the west at a northern latitude, in the ink and weight of its class. */
export function barbPicture(beaufort: number): SVGSVGElement {
  const ink = inkOfBeaufort[beaufort];
  const knots = Math.round(typicalKnots(beaufort) / 5) * 5;
  const { lines, pennants } = beaufort === 0 ? { lines: CALM_CIRCLE, pennants: '' } : barbLines(knots);
  return draw(
    'svg',
    { class: 'barb-picture', viewBox: '-2 -10 28 14', width: 28, height: 14, 'aria-hidden': 'true' },
    draw('path', { d: lines, fill: 'none', stroke: `var(--wind-${ink})`, 'stroke-width': inkWeightsPx[ink] }),
    draw('path', { d: pennants, fill: `var(--wind-${ink})` }),
  );
}

/**
 * Strokes and pennants of so many knots, a multiple of 5: shaft along x from the position at (SHAFT_PX, 0) to the end the
 * wind comes from at 0, bare for 1 and 2 kt; feathers on the low-pressure side of a northern west wind, which is up (north).
 */
export function barbLines(knots: number): { lines: string; pennants: string } {
  let lines = `M ${SHAFT_PX} 0 H 0`;
  let pennants = '';
  let left = knots;
  // A lone half feather is set in from the end, so that it is not taken for a full one.
  let x = knots === 5 ? STEP_PX : 0;
  for (; left >= 50; left -= 50) {
    pennants += `M ${x} 0 L ${x} ${-FEATHER_PX} L ${x + 5} 0 Z `;
    x += 6.5;
  }
  for (; left >= 10; left -= 10) {
    lines += ` M ${x} 0 l -2.5 ${-FEATHER_PX}`;
    x += STEP_PX;
  }
  if (left === 5) lines += ` M ${x} 0 l -1.25 ${-FEATHER_PX / 2}`;
  return { lines, pennants };
}

function typicalKnots(beaufort: number): number {
  if (beaufort === 12) return 65;
  return (beaufortLowestKnots[beaufort] + beaufortLowestKnots[beaufort + 1] - 1) / 2;
}
