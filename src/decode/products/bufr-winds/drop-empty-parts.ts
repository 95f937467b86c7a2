import type { Solutions, Swath } from '../../../swath/swath.ts';

/** Takes away, in place, the parts of a swath that hold no value at all, and the last slots of solutions no cell uses. */
export function dropEmptyParts(cells: Swath): void {
  const isEmpty = (values: Float32Array) => values.every(Number.isNaN);
  if (cells.solutions) cells.solutions = dropEmptySlots(cells.solutions);
  if (cells.beams && isEmpty(cells.beams.backscatterDb)) cells.beams = null;
  if (cells.background && isEmpty(cells.background.speedMs)) cells.background = null;
  if (cells.iceProbability && isEmpty(cells.iceProbability)) cells.iceProbability = null;
}

/** Solutions without the last slots that no cell uses; null where none is used. */
function dropEmptySlots(solutions: Solutions): Solutions | null {
  const { slots, speedMs } = solutions;
  let used = slots;
  const isUsed = (slot: number) => {
    for (let i = slot; i < speedMs.length; i += slots) if (!Number.isNaN(speedMs[i])) return true;
    return false;
  };
  while (used > 0 && !isUsed(used - 1)) used--;
  if (used === slots) return solutions;
  const keep = (values: Float32Array) => values.filter((_, i) => i % slots < used);
  return used === 0
    ? null
    : {
        slots: used,
        speedMs: keep(speedMs),
        directionFrom: keep(solutions.directionFrom),
        probability: keep(solutions.probability),
        fitDistance: keep(solutions.fitDistance),
      };
}
