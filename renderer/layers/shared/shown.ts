import { beaufortOfSpeed } from '../../../src/wind/beaufort.ts';
import { hiddenFlagMask, type Switches } from '../../../src/wind/switches.ts';
import { type Cells, NEVER_LOOKED, WIND } from './cells.ts';

/** What the user chose to see. */
export interface Shown {
  switches: Switches;
  hiddenPassIds: readonly number[];
  /** The span of time, both ends included, milliseconds. */
  window: { fromMs: number; toMs: number };
}

/** What the chart makes of a cell. */
export const NOT_SHOWN = 0;
/** Looked at without a wind. */
export const SHOWN_WITHOUT_WIND = 1;
/** A wind was seen, and a switch or its hidden pass keeps it off the chart: the water stays seen. */
export const WIND_HIDDEN = 2;
export const WIND_SHOWN = 3;

/**
 * Sorts all cells into the four kinds above. Cells outside the window are not shown at all, so that their water counts as
 * not looked at; hiding a pass hides its winds, but does not unsee its water.
 */
export function sortCells(cells: Cells, shown: Shown): Uint8Array<ArrayBuffer> {
  const kinds = new Uint8Array(cells.count);
  const mask = hiddenFlagMask(shown.switches);
  const { beaufortShown } = shown.switches;
  const hiddenPasses = new Set(shown.hiddenPassIds);
  const fromS = shown.window.fromMs / 1000;
  const toS = shown.window.toMs / 1000;
  cells.blocks.forEach((block, b) => {
    const isHiddenPass = hiddenPasses.has(block.passId);
    const { state, timeS, flags, speedMs } = block;
    const first = cells.firstCell[b];
    for (let cell = 0; cell < block.cells; cell++) {
      if (state[cell] === NEVER_LOOKED || timeS[cell] < fromS || timeS[cell] > toS) continue;
      if (state[cell] !== WIND) kinds[first + cell] = SHOWN_WITHOUT_WIND;
      else if (isHiddenPass || (flags[cell] & mask) !== 0 || !beaufortShown[beaufortOfSpeed(speedMs[cell])]) {
        kinds[first + cell] = WIND_HIDDEN;
      } else kinds[first + cell] = WIND_SHOWN;
    }
  });
  return kinds;
}
