/**
 * Some rows of a pass as everything that draws or measures sees them: what was looked at, when, and what wind it showed.
 * Cell i is row firstRow + floor(i / columns), column i % columns, both counted from 0.
 */
export interface SeenBlock {
  passId: number;
  firstRow: number;
  columns: number;
  cells: number;
  /** 1e-5 degrees. */
  lonE5: Int32Array;
  latE5: Int32Array;
  /** Whole seconds since 1970-01-01 UTC. */
  timeS: Uint32Array;
  flags: Uint32Array;
  speedMs: Float32Array;
  directionFrom: Float32Array;
  /** See footprints.ts. */
  halfSidesM: Int16Array;
  state: Uint8Array;
}
