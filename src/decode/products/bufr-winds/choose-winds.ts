import { LOOKED_NO_WIND, WIND } from '../../../swath/swath.ts';
import { flagBit } from '../../../wind/flags.ts';
import type { CellTable } from './cell-table.ts';

/** Cells whose wind is not simply the one the file selects. */
export interface ChoiceCounts {
  /** Solutions but none selected: the most probable one's speed is shown, its direction is left unknown. */
  unselected: number;
  /** A speed but no direction in the selected solution. */
  withoutDirection: number;
}

/**
 * Gives each cell its state and wind: the solution the file selects by its index, counted from 1, which often is not the
 * first. A cell with winds of which none is selected keeps the speed of the most probable one, so that no strong wind
 * is lost, but no direction, since which way it blows is what the selection decides.
 */
export function chooseWinds(table: CellTable): ChoiceCounts {
  const { cells, selected } = table;
  const { solutions } = cells;
  const counts: ChoiceCounts = { unselected: 0, withoutDirection: 0 };
  cells.state.fill(LOOKED_NO_WIND);
  if (cells.background) turnNorthToZero(cells.background.directionFrom);
  if (!solutions) return counts;
  const { slots, speedMs, directionFrom } = solutions;
  turnNorthToZero(directionFrom);
  for (let cell = 0; cell < selected.length; cell++) {
    const first = cell * slots;
    const isSelected = selected[cell] >= 1 && selected[cell] <= slots && speedMs[first + selected[cell] - 1] >= 0;
    const number = isSelected ? selected[cell] : mostProbable(speedMs, solutions.probability, first, slots);
    if (number === 0) continue;
    const chosen = first + number - 1;
    cells.state[cell] = WIND;
    cells.speedMs[cell] = speedMs[chosen];
    if (isSelected) {
      cells.chosenSolution[cell] = number;
      cells.directionFrom[cell] = directionFrom[chosen];
    } else counts.unselected++;
    if (Number.isNaN(cells.directionFrom[cell])) {
      cells.flags[cell] |= flagBit.directionUnknown;
      if (isSelected) counts.withoutDirection++;
    }
  }
  return counts;
}

/** The file's 360 is our 0: directions are 0 <= d < 360. Others have been found to be within 0 to 360. */
function turnNorthToZero(directionFrom: Float32Array): void {
  for (let i = 0; i < directionFrom.length; i++) if (directionFrom[i] === 360) directionFrom[i] = 0;
}

/** The number of the most probable solution with a speed, counted from 1; 0 where there is none. */
function mostProbable(speedMs: Float32Array, likelihood: Float32Array, first: number, slots: number): number {
  let best = 0;
  for (let n = 1; n <= slots; n++) {
    if (!(speedMs[first + n - 1] >= 0)) continue;
    if (best === 0 || likelihood[first + n - 1] > likelihood[first + best - 1]) best = n;
  }
  return best;
}
