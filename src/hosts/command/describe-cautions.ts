import { standingCautions } from '../../wind/cautions.ts';

/** The standing cautions as a list, for the end of any output that speaks of winds. */
export function describeCautions(): string {
  return ['Before you rely on any of this:', ...standingCautions.map((caution) => `  - ${caution}`)].join('\n');
}
