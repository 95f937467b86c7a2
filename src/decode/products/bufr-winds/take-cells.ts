import { createBackground, createBeams, createSolutions, createSwath, type Swath } from '../../../swath/swath.ts';
import type { PassPlan } from './arrange-passes.ts';

/**
 * A pass out of one long row of cells, put in its rows and columns. Where the cells are all of it and already in that
 * order, their arrays are taken as they are.
 */
export function takeCells(cells: Swath, { rows, columns, cellAt }: PassPlan): Swath {
  const isAsItStands = cellAt.length === cells.state.length && cellAt.every((cell, index) => cell === index);
  if (isAsItStands) return { ...cells, rows, columns };
  const swath = createSwath(rows, columns);
  gather(cells.state, swath.state, 1, cellAt);
  gather(cells.lon, swath.lon, 1, cellAt);
  gather(cells.lat, swath.lat, 1, cellAt);
  gather(cells.timeMs, swath.timeMs, 1, cellAt);
  gather(cells.speedMs, swath.speedMs, 1, cellAt);
  gather(cells.directionFrom, swath.directionFrom, 1, cellAt);
  gather(cells.flags, swath.flags, 1, cellAt);
  gather(cells.rawFlags, swath.rawFlags, 1, cellAt);
  gather(cells.chosenSolution, swath.chosenSolution, 1, cellAt);
  const size = cellAt.length;
  if (cells.solutions) {
    const { slots } = cells.solutions;
    swath.solutions = createSolutions(size, slots);
    gather(cells.solutions.speedMs, swath.solutions.speedMs, slots, cellAt);
    gather(cells.solutions.directionFrom, swath.solutions.directionFrom, slots, cellAt);
    gather(cells.solutions.probability, swath.solutions.probability, slots, cellAt);
    gather(cells.solutions.fitDistance, swath.solutions.fitDistance, slots, cellAt);
  }
  if (cells.beams) {
    const { count } = cells.beams;
    swath.beams = createBeams(size, count);
    gather(cells.beams.incidenceDeg, swath.beams.incidenceDeg, count, cellAt);
    gather(cells.beams.azimuthDeg, swath.beams.azimuthDeg, count, cellAt);
    gather(cells.beams.backscatterDb, swath.beams.backscatterDb, count, cellAt);
    gather(cells.beams.noisePercent, swath.beams.noisePercent, count, cellAt);
  }
  if (cells.background) {
    swath.background = createBackground(size);
    gather(cells.background.speedMs, swath.background.speedMs, 1, cellAt);
    gather(cells.background.directionFrom, swath.background.directionFrom, 1, cellAt);
  }
  if (cells.iceProbability) {
    swath.iceProbability = new Float32Array(size).fill(Number.NaN);
    gather(cells.iceProbability, swath.iceProbability, 1, cellAt);
  }
  return swath;
}

/** Copies the values of each placed cell; places never looked at keep what `into` holds. */
function gather<A extends { [index: number]: number }>(from: A, into: A, perCell: number, cellAt: Int32Array): void {
  for (let place = 0; place < cellAt.length; place++) {
    if (cellAt[place] < 0) continue;
    for (let n = 0; n < perCell; n++) into[place * perCell + n] = from[cellAt[place] * perCell + n];
  }
}
