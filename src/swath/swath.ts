/** The three things a place in a swath can be. They are never merged. */
export const NEVER_LOOKED = 0;
export const LOOKED_NO_WIND = 1;
export const WIND = 2;

/** Radar band and viewing, in neutral words. */
export type Band = 'C' | 'Ku';
export type Viewing = 'fan-beam' | 'pencil-beam';

/** How the file's flag word was read. 'one-bit-lower': each bit stood one place lower than its table says. */
export type FlagReading = 'as-table' | 'one-bit-lower' | 'as-file-states' | 'unknown' | 'absent';

/** All possible winds of each cell. Entry (cell * slots + n) is solution n + 1 of a cell; NaN where there is none. */
export interface Solutions {
  slots: number;
  speedMs: Float32Array;
  /** Degrees true the wind blows from. */
  directionFrom: Float32Array;
  /** Probability that this solution is the true one, 0 to 1. */
  probability: Float32Array;
  /** Signed normalised distance of the looks to the model function; large is a bad fit. */
  fitDistance: Float32Array;
}

/** The radar looks behind each cell. Entry (cell * count + n) is look n of a cell, in the file's order; NaN where missing. */
export interface Beams {
  count: number;
  incidenceDeg: Float32Array;
  /** Degrees true from the cell to the satellite. */
  azimuthDeg: Float32Array;
  backscatterDb: Float32Array;
  /** Radiometric noise, Kp, percent. */
  noisePercent: Float32Array;
}

/** A model's wind carried in the file. Never the observation. */
export interface Background {
  speedMs: Float32Array;
  directionFrom: Float32Array;
}

/**
 * One pass over the sea: rows of cells along the satellite's track, row-major (cell = row * columns + column).
 * Every array but those of solutions and beams has rows * columns entries. The array index is no geometry:
 * neighbours in a row may be the width of the nadir gap apart.
 */
export interface Swath {
  rows: number;
  columns: number;
  /** NEVER_LOOKED, LOOKED_NO_WIND or WIND. Where NEVER_LOOKED, every other value is NaN or 0. */
  state: Uint8Array;
  /** Degrees east, -180 <= lon < 180. */
  lon: Float64Array;
  /** Degrees north. */
  lat: Float64Array;
  /** Milliseconds since 1970-01-01 UTC. */
  timeMs: Float64Array;
  /** 10-m wind speed, m/s, of the chosen solution; NaN unless WIND. */
  speedMs: Float32Array;
  /** Degrees true the wind blows from, 0 <= d < 360; NaN unless WIND and known. */
  directionFrom: Float32Array;
  /** Our own flags: see wind/flags. */
  flags: Uint32Array;
  /** The flag word as the file holds it; 0xffffffff where missing or where the file has none. */
  rawFlags: Uint32Array;
  /** Which solution was chosen, counted from 1 as in the file; 0 where none. */
  chosenSolution: Uint8Array;
  solutions: Solutions | null;
  beams: Beams | null;
  background: Background | null;
  /** Probability of ice, 0 to 1; NaN where missing. */
  iceProbability: Float32Array | null;
  /** Distance between neighbouring cells, metres; NaN when the file does not say and it could not be measured. */
  cellSizeM: number;
  band: Band | null;
  viewing: Viewing | null;
  /** WMO common code C-5 of the platform, when the file gives one. */
  platformCode: number | null;
  /** A name the user's own file carries for its source; shown as read, never made up. */
  sourceAsRead: string | null;
  /** Whether the file, or the standard it follows, says which way its directions point. */
  isDirectionStated: boolean;
  flagReading: FlagReading;
  /** What a reader should know about how this file was read, in plain sentences. */
  notes: string[];
}

/** An empty swath of a size: never looked anywhere, no solutions, beams or background. */
export function createSwath(rows: number, columns: number): Swath {
  const cells = rows * columns;
  return {
    rows,
    columns,
    state: new Uint8Array(cells),
    lon: new Float64Array(cells).fill(Number.NaN),
    lat: new Float64Array(cells).fill(Number.NaN),
    timeMs: new Float64Array(cells).fill(Number.NaN),
    speedMs: new Float32Array(cells).fill(Number.NaN),
    directionFrom: new Float32Array(cells).fill(Number.NaN),
    flags: new Uint32Array(cells),
    rawFlags: new Uint32Array(cells).fill(0xffffffff),
    chosenSolution: new Uint8Array(cells),
    solutions: null,
    beams: null,
    background: null,
    iceProbability: null,
    cellSizeM: Number.NaN,
    band: null,
    viewing: null,
    platformCode: null,
    sourceAsRead: null,
    isDirectionStated: false,
    flagReading: 'absent',
    notes: [],
  };
}

/** Solutions of a size, none of them filled. */
export function createSolutions(cells: number, slots: number): Solutions {
  const empty = () => new Float32Array(cells * slots).fill(Number.NaN);
  return { slots, speedMs: empty(), directionFrom: empty(), probability: empty(), fitDistance: empty() };
}

/** Beams of a size, none of them filled. */
export function createBeams(cells: number, count: number): Beams {
  const empty = () => new Float32Array(cells * count).fill(Number.NaN);
  return { count, incidenceDeg: empty(), azimuthDeg: empty(), backscatterDb: empty(), noisePercent: empty() };
}

/** A background wind of a size, not filled. */
export function createBackground(cells: number): Background {
  return {
    speedMs: new Float32Array(cells).fill(Number.NaN),
    directionFrom: new Float32Array(cells).fill(Number.NaN),
  };
}
