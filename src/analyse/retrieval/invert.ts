import { FASTEST_MS, findModelTable, type ModelTable, SLOWEST_MS, tabulatedBackscatter } from './model-table.ts';

/** One radar look at a cell. */
export interface RadarLook {
  incidenceDeg: number;
  /** Degrees true from the cell to the satellite. */
  azimuthDeg: number;
  /** Normalised radar cross-section, linear units. */
  backscatter: number;
  /** Radiometric noise Kp as a fraction: 0.05 for 5 percent. */
  noise: number;
}

/** A wind that could have made the looks: a local minimum of the cost over direction. */
export interface WindSolution {
  speedMs: number;
  /** Degrees true the wind blows from. */
  directionFrom: number;
  /** Mean squared distance of the looks to the model function, in units of their noise. */
  cost: number;
}

export interface InversionChoices {
  /** Solutions with a cost above this many times the best are left out as spurious. Not given: none is left out. */
  spuriousRatio?: number;
}

/** At most this many solutions are kept, as the files hold. */
const MOST_SOLUTIONS = 4;

const SCAN_STEP_DEG = 2.5;
const SCAN_DIRECTIONS = 360 / SCAN_STEP_DEG;
const GRID_STEP_MS = 0.5;
const GRID_SPEEDS = Math.floor((FASTEST_MS - SLOWEST_MS) / GRID_STEP_MS) + 1;
const SCAN_TOLERANCE_MS = 0.05;
const SPEED_TOLERANCE_MS = 0.001;
const DIRECTION_TOLERANCE_DEG = 0.02;
const GOLDEN = (Math.sqrt(5) - 1) / 2;
const RADIANS = Math.PI / 180;

/**
 * The possible winds of a cell from its radar looks by CMOD5.N, lowest cost first, at most four. For each direction the
 * best speed is found (grid, then golden section); the minima over direction are refined by golden section. The cost is
 * the mean over the looks of (measured - model)^2 / (Kp model)^2: the noise-normalised form of Stoffelen and Portabella
 * 2006, IEEE TGRS 44, 1523-1533. Needs two looks or more for a direction; with fewer it gives none.
 */
export function invertCell(looks: readonly RadarLook[], choices: InversionChoices = {}): WindSolution[] {
  if (looks.length < 2) return [];
  const prepared = looks.map(prepareLook);
  const solutions = scanDirections(prepared)
    .map((start) => refineSolution(prepared, start))
    .sort((a, b) => a.cost - b.cost)
    .slice(0, MOST_SOLUTIONS);
  const highestCost = (choices.spuriousRatio ?? Number.POSITIVE_INFINITY) * Math.max(solutions[0].cost, 1);
  return solutions.filter(({ cost }) => cost <= highestCost);
}

/** The cost of one wind for a cell's looks: see `invertCell`. Speed in m/s from 0.2 to 50, direction from, degrees true. */
export function measureCost(looks: readonly RadarLook[], speedMs: number, directionFrom: number): number {
  const prepared = looks.map(prepareLook);
  aim(prepared, directionFrom);
  return costOfSpeed(prepared, speedMs);
}

/**
 * The probability of each solution, adding up to 1: proportional to exp(-n cost / 2), the likelihood of n looks with
 * independent Gaussian noise. Nothing is known before: solutions left out have none.
 */
export function solutionProbabilities(solutions: readonly WindSolution[], lookCount: number): number[] {
  const lowest = Math.min(...solutions.map(({ cost }) => cost));
  const weights = solutions.map(({ cost }) => Math.exp((-lookCount * (cost - lowest)) / 2));
  const sum = weights.reduce((total, weight) => total + weight, 0);
  return weights.map((weight) => weight / sum);
}

interface PreparedLook {
  table: ModelTable;
  /** Degrees true from the satellite to the cell: a wind from there is upwind. */
  upwindDeg: number;
  backscatter: number;
  weight: number;
  /** Cosine of the wind's direction relative to the look, of the direction last aimed at. */
  cosPhi: number;
}

function prepareLook({ incidenceDeg, azimuthDeg, backscatter, noise }: RadarLook): PreparedLook {
  return {
    table: findModelTable(incidenceDeg),
    upwindDeg: azimuthDeg + 180,
    backscatter,
    weight: 1 / (noise * noise),
    cosPhi: 1,
  };
}

/** Turns the looks to a direction; the costs of many speeds follow, and a cosine costs as much as the rest. */
function aim(looks: readonly PreparedLook[], directionFrom: number): void {
  for (const look of looks) look.cosPhi = Math.cos((directionFrom - look.upwindDeg) * RADIANS);
}

function costOfSpeed(looks: readonly PreparedLook[], speedMs: number): number {
  let sum = 0;
  for (let i = 0; i < looks.length; i++) {
    const look = looks[i];
    const miss = look.backscatter / tabulatedBackscatter(look.table, speedMs, look.cosPhi) - 1;
    sum += miss * miss * look.weight;
  }
  return sum / looks.length;
}

/** The lowest points, over direction, of the cost at the best speed. There is always one. */
function scanDirections(looks: readonly PreparedLook[]): WindSolution[] {
  const scan: WindSolution[] = [];
  aim(looks, 0);
  let grid = fullGridMinimum(looks);
  for (let i = 0; i < SCAN_DIRECTIONS; i++) {
    const directionFrom = i * SCAN_STEP_DEG;
    aim(looks, directionFrom);
    grid = walkGrid(looks, grid);
    const [speedMs, cost] = bestSpeed(looks, gridSpeed(grid), SCAN_TOLERANCE_MS);
    scan.push({ speedMs, directionFrom, cost });
  }
  return scan.filter(({ cost }, i) => {
    const before = scan[(i + SCAN_DIRECTIONS - 1) % SCAN_DIRECTIONS].cost;
    const after = scan[(i + 1) % SCAN_DIRECTIONS].cost;
    return cost <= before && cost < after;
  });
}

function gridSpeed(grid: number): number {
  return SLOWEST_MS + grid * GRID_STEP_MS;
}

function fullGridMinimum(looks: readonly PreparedLook[]): number {
  let best = 0;
  let lowest = Number.POSITIVE_INFINITY;
  for (let grid = 0; grid < GRID_SPEEDS; grid++) {
    const cost = costOfSpeed(looks, gridSpeed(grid));
    if (cost < lowest) {
      lowest = cost;
      best = grid;
    }
  }
  return best;
}

/** The best speed changes little from one direction to the next: walk downhill from the last, and the scan is ten times shorter. */
function walkGrid(looks: readonly PreparedLook[], start: number): number {
  let here = start;
  let lowest = costOfSpeed(looks, gridSpeed(here));
  for (const step of [1, -1]) {
    for (let next = here + step; next >= 0 && next < GRID_SPEEDS; next += step) {
      const cost = costOfSpeed(looks, gridSpeed(next));
      if (cost >= lowest) break;
      lowest = cost;
      here = next;
    }
  }
  return here;
}

function bestSpeed(
  looks: readonly PreparedLook[],
  nearMs: number,
  toleranceMs: number,
): [speedMs: number, cost: number] {
  const low = Math.max(SLOWEST_MS, nearMs - GRID_STEP_MS);
  const high = Math.min(FASTEST_MS, nearMs + GRID_STEP_MS);
  return goldenSection((speedMs) => costOfSpeed(looks, speedMs), low, high, toleranceMs);
}

function refineSolution(looks: readonly PreparedLook[], start: WindSolution): WindSolution {
  const bestSpeedAt = (directionFrom: number) => {
    aim(looks, directionFrom);
    return bestSpeed(looks, start.speedMs, SPEED_TOLERANCE_MS);
  };
  const [direction] = goldenSection(
    (directionFrom) => bestSpeedAt(directionFrom)[1],
    start.directionFrom - SCAN_STEP_DEG,
    start.directionFrom + SCAN_STEP_DEG,
    DIRECTION_TOLERANCE_DEG,
  );
  const [speedMs, cost] = bestSpeedAt(direction);
  return { speedMs, directionFrom: (direction + 360) % 360, cost };
}

/** The lowest point of a function with one minimum in an interval, and its value there. */
function goldenSection(
  value: (at: number) => number,
  from: number,
  to: number,
  tolerance: number,
): [at: number, value: number] {
  let low = from;
  let high = to;
  let inner = high - GOLDEN * (high - low);
  let outer = low + GOLDEN * (high - low);
  let innerValue = value(inner);
  let outerValue = value(outer);
  while (high - low > tolerance) {
    if (innerValue < outerValue) {
      high = outer;
      outer = inner;
      outerValue = innerValue;
      inner = high - GOLDEN * (high - low);
      innerValue = value(inner);
    } else {
      low = inner;
      inner = outer;
      innerValue = outerValue;
      outer = low + GOLDEN * (high - low);
      outerValue = value(outer);
    }
  }
  return innerValue < outerValue ? [inner, innerValue] : [outer, outerValue];
}
