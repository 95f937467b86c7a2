import { beaufortOfKnots } from '../../../src/wind/beaufort.ts';
import { doubtKinds, doubtMask } from '../../../src/wind/flags.ts';
import { toWholeKnots } from '../../../src/wind/units.ts';
import { copiesTouching, type Reach } from '../../map/view.ts';
import { inkOfBeaufort } from '../../state/lights.ts';
import { type Cells, directionOf, flagsOf, isSouth } from '../shared/cells.ts';
import { fivesOf } from './barb-shape.ts';

/** The marks that are not barbs, in the order they are drawn; the shader knows them by these numbers. */
export const marks = { hidden: 0, land: 1, quality: 2, rain: 3, ice: 4, calm: 5, noDirection: 6 } as const;
const FIRST_BARB = 7;

/**
 * Words of 32 bits for each thing drawn: Web Mercator x and y as float bits; the direction the wind comes from as two
 * signed 16-bit shares of one, east and north; ink in bits 0 to 2 and the southern hemisphere in bit 3.
 */
export const WORDS_PER_ENTRY = 4;

/** A run of entries that share one shape: a mark's number, or a barb of so many times five knots. */
export interface Run {
  shape: { mark: number } | { fives: number };
  first: number;
  count: number;
}

/** What the graphics card is given: entries run by run, in the order they are drawn. */
export interface DrawingList {
  words: Uint32Array<ArrayBuffer>;
  runs: Run[];
}

/**
 * Lays out winds to draw: marks first, then barbs from weak to strong, so that the strongest lies on top. `drawn` and
 * `hidden` are cells; a hidden wind leaves a dot in the ink of its class, since it is neither calm nor unseen water.
 * Each is laid out once in every copy of the world that lies in reach.
 */
export function listDrawing(
  cells: Cells,
  drawn: readonly number[],
  hidden: readonly number[],
  reach: Reach,
): DrawingList {
  const entries: Entries = { cells: [], xs: [], shapes: [] };
  for (const cell of hidden) addEntry(entries, cells, cell, marks.hidden, reach);
  for (const cell of drawn) {
    const flags = flagsOf(cells, cell);
    for (const kind of doubtKinds) if (flags & doubtMask[kind]) addEntry(entries, cells, cell, marks[kind], reach);
    addEntry(entries, cells, cell, shapeOf(cells, cell), reach);
  }
  return layOut(cells, entries);
}

/** Things to draw, column by column: the cell, its x in the copy of the world it is drawn in, and its shape. */
interface Entries {
  cells: number[];
  xs: number[];
  shapes: number[];
}

function addEntry(entries: Entries, cells: Cells, cell: number, shape: number, reach: Reach): void {
  const x = cells.x[cell];
  const { first, last } = copiesTouching(reach, x, x);
  for (let copy = first; copy <= last; copy++) {
    entries.cells.push(cell);
    entries.xs.push(x + copy);
    entries.shapes.push(shape);
  }
}

function shapeOf(cells: Cells, cell: number): number {
  const wholeKnots = toWholeKnots(cells.speedMs[cell]);
  if (wholeKnots === 0) return marks.calm;
  return Number.isNaN(directionOf(cells, cell)) ? marks.noDirection : FIRST_BARB + fivesOf(wholeKnots);
}

function layOut(cells: Cells, { cells: cellOf, xs, shapes }: Entries): DrawingList {
  const counts: number[] = [];
  for (const shape of shapes) counts[shape] = (counts[shape] ?? 0) + 1;
  const runs: Run[] = [];
  const nextOf: number[] = [];
  let first = 0;
  counts.forEach((count, shape) => {
    runs.push({ shape: shape < FIRST_BARB ? { mark: shape } : { fives: shape - FIRST_BARB }, first, count });
    nextOf[shape] = first;
    first += count;
  });
  const words = new Uint32Array(shapes.length * WORDS_PER_ENTRY);
  const floats = new Float32Array(words.buffer);
  shapes.forEach((shape, i) => {
    const cell = cellOf[i];
    const at = nextOf[shape]++ * WORDS_PER_ENTRY;
    floats[at] = xs[i];
    floats[at + 1] = cells.y[cell];
    words[at + 2] = packDirection(directionOf(cells, cell));
    words[at + 3] = inkOfBeaufort[beaufortOfKnots(toWholeKnots(cells.speedMs[cell]))] | (isSouth(cells, cell) ? 8 : 0);
  });
  return { words, runs };
}

/** East and north of a direction as GLSL's unpackSnorm2x16 reads them; nothing for one that is not known. */
function packDirection(degrees: number): number {
  if (Number.isNaN(degrees)) return 0;
  const east = Math.round(Math.sin((degrees * Math.PI) / 180) * 32767);
  const north = Math.round(Math.cos((degrees * Math.PI) / 180) * 32767);
  return ((north & 0xffff) << 16) | (east & 0xffff);
}
