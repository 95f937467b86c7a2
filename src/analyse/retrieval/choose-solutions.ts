import type { Background, Solutions } from '../../swath/swath.ts';

/** The lattice that ambiguity removal works on: rows x columns cells, row-major, each with its possible winds. */
export interface SolutionField {
  rows: number;
  columns: number;
  solutions: Solutions;
  /** A model's wind to start from. Null: start from each cell's most probable solution. */
  background: Background | null;
}

export interface ChoiceRules {
  /** Column ranges [first, end) that are looked at by one side of the radar; a window never reaches into another. */
  sides: readonly (readonly [first: number, end: number])[];
  /** Cells to each side of the middle of the window: 3 is a window of 7 x 7. */
  reach?: number;
}

/** The window of the baseline filter, 7 x 7 cells: value from memory. */
const USUAL_REACH = 3;

/** The filter settles in a few passes or, rarely, swaps for ever between equals. */
const MOST_PASSES = 60;

/**
 * Which solution of each cell fits its neighbours, counted from 1; 0 where a cell has none. A vector median filter: in
 * every cell the solution whose vector differences from the winds chosen in its window add up to least, repeated until
 * nothing changes (Shaffer, Dunbar, Hsiao and Long 1991, IEEE TGRS 29(1), 167-174). The start is nudged: the solution
 * nearest to the background wind. The result therefore leans on that model where the looks leave it open.
 */
export function chooseSolutions(field: SolutionField, rules: ChoiceRules): Uint8Array {
  const { rows, columns } = field;
  const vectors = toVectors(field.solutions);
  const chosen = startChoice(field, vectors);
  const reach = rules.reach ?? USUAL_REACH;
  for (let pass = 0; pass < MOST_PASSES; pass++) {
    const before = chosen.slice();
    for (const [first, end] of rules.sides) {
      for (let row = 0; row < rows; row++) {
        for (let column = first; column < end; column++) {
          const cell = row * columns + column;
          if (before[cell] === 0) continue;
          chosen[cell] = bestOfWindow(field, vectors, before, { row, column, first, end, reach });
        }
      }
    }
    if (chosen.every((solution, cell) => solution === before[cell])) break;
  }
  return chosen;
}

/**
 * How far each chosen wind lies from the middle of its window, m/s: the mean vector difference to the other winds chosen
 * there. Large where the choice, or the sea, is disturbed. NaN where nothing is chosen or the cell stands alone.
 */
export function measureDisagreement(field: SolutionField, chosen: Uint8Array, rules: ChoiceRules): Float32Array {
  const vectors = toVectors(field.solutions);
  const reach = rules.reach ?? USUAL_REACH;
  const disagreement = new Float32Array(chosen.length).fill(Number.NaN);
  for (const [first, end] of rules.sides) {
    for (let row = 0; row < field.rows; row++) {
      for (let column = first; column < end; column++) {
        const cell = row * field.columns + column;
        if (chosen[cell] === 0) continue;
        const slot = cell * field.solutions.slots + chosen[cell] - 1;
        const window = { row, column, first, end, reach };
        const { sum, count } = sumDifferences(field, vectors, chosen, window, vectors.east[slot], vectors.north[slot]);
        if (count > 0) disagreement[cell] = sum / count;
      }
    }
  }
  return disagreement;
}

interface Vectors {
  east: Float64Array;
  north: Float64Array;
}

interface Window {
  row: number;
  column: number;
  first: number;
  end: number;
  reach: number;
}

function toVectors({ speedMs, directionFrom }: { speedMs: Float32Array; directionFrom: Float32Array }): Vectors {
  const east = new Float64Array(speedMs.length);
  const north = new Float64Array(speedMs.length);
  for (let i = 0; i < speedMs.length; i++) {
    const radians = (directionFrom[i] * Math.PI) / 180;
    east[i] = -speedMs[i] * Math.sin(radians);
    north[i] = -speedMs[i] * Math.cos(radians);
  }
  return { east, north };
}

function startChoice({ rows, columns, solutions, background }: SolutionField, vectors: Vectors): Uint8Array {
  const model = background === null ? null : toVectors(background);
  const chosen = new Uint8Array(rows * columns);
  for (let cell = 0; cell < chosen.length; cell++) {
    const isModelKnown = model !== null && !Number.isNaN(model.east[cell]);
    chosen[cell] = leastOfCell(solutions, vectors, cell, (slot) =>
      isModelKnown
        ? Math.hypot(vectors.east[slot] - model.east[cell], vectors.north[slot] - model.north[cell])
        : -solutions.probability[slot],
    );
  }
  return chosen;
}

function bestOfWindow(field: SolutionField, vectors: Vectors, chosen: Uint8Array, window: Window): number {
  const cell = window.row * field.columns + window.column;
  return leastOfCell(
    field.solutions,
    vectors,
    cell,
    (slot) => sumDifferences(field, vectors, chosen, window, vectors.east[slot], vectors.north[slot]).sum,
  );
}

/** The solution of a cell with the least value, counted from 1; the earlier of equals; 0 where the cell has none. */
function leastOfCell({ slots }: Solutions, { east }: Vectors, cell: number, measure: (slot: number) => number): number {
  let best = 0;
  let least = Number.POSITIVE_INFINITY;
  for (let n = 0; n < slots; n++) {
    const slot = cell * slots + n;
    if (Number.isNaN(east[slot])) continue;
    const value = measure(slot);
    if (value < least) {
      least = value;
      best = n + 1;
    }
  }
  return best;
}

/** Sum of the vector differences between one wind and those chosen in a window, its middle left out, and their count. */
function sumDifferences(
  { rows, columns, solutions }: SolutionField,
  { east, north }: Vectors,
  chosen: Uint8Array,
  { row, column, first, end, reach }: Window,
  windEast: number,
  windNorth: number,
): { sum: number; count: number } {
  let sum = 0;
  let count = 0;
  for (let r = Math.max(0, row - reach); r <= Math.min(rows - 1, row + reach); r++) {
    for (let c = Math.max(first, column - reach); c <= Math.min(end - 1, column + reach); c++) {
      const neighbour = r * columns + c;
      if (chosen[neighbour] === 0 || (r === row && c === column)) continue;
      const slot = neighbour * solutions.slots + chosen[neighbour] - 1;
      sum += Math.hypot(east[slot] - windEast, north[slot] - windNorth);
      count++;
    }
  }
  return { sum, count };
}
