import { encodeFanBeamBufr } from '../../../src/demo/encode-fan-beam-bufr.ts';
import { createSolutions, createSwath, LOOKED_NO_WIND, NEVER_LOOKED, WIND } from '../../../src/swath/swath.ts';
import { flagBit } from '../../../src/wind/flags.ts';

/** Where and when a drawn swath lies: its first row and column, degrees and UTC. */
export interface Corner {
  lon: number;
  lat: number;
  timeMs: number;
}

/** Steps between cells of a drawn swath, degrees: about 25 km near 40 degrees north. */
export const CELL_LON_DEG = 0.3;
export const CELL_LAT_DEG = 0.225;

/** What each letter of a drawn swath is. All winds are from 270 degrees. */
const winds: Record<string, { speedMs: number; flags: number }> = {
  c: { speedMs: 2, flags: flagBit.atMost3Ms },
  b: { speedMs: 10, flags: 0 },
  g: { speedMs: 20, flags: 0 },
  l: { speedMs: 20, flags: flagBit.landInCell },
  s: { speedMs: 28, flags: 0 },
};

/**
 * The bytes of a C-band BUFR file (3 12 061) drawn as rows of letters, north to south and west to east: c 2 m/s, b 10,
 * g 20, l 20 with land in the cell, s 28, o looked at without a wind, . never looked. Each wind has two solutions; the
 * second, from 270 degrees, is the chosen one, the first is its reverse.
 */
export function drawSwathFile(rows: readonly string[], corner: Corner): Buffer {
  const columns = rows[0].length;
  const swath = createSwath(rows.length, columns);
  swath.cellSizeM = 25_000;
  const solutions = createSolutions(rows.length * columns, 2);
  swath.solutions = solutions;
  rows.forEach((row, r) => {
    [...row].forEach((letter, c) => {
      const cell = r * columns + c;
      if (letter === '.') {
        swath.state[cell] = NEVER_LOOKED;
        return;
      }
      swath.lon[cell] = ((corner.lon + c * CELL_LON_DEG + 540) % 360) - 180;
      swath.lat[cell] = corner.lat - r * CELL_LAT_DEG;
      swath.timeMs[cell] = corner.timeMs + r * 4_000;
      swath.state[cell] = letter === 'o' ? LOOKED_NO_WIND : WIND;
      if (letter === 'o') return;
      const { speedMs, flags } = winds[letter];
      swath.flags[cell] = flags;
      swath.chosenSolution[cell] = 2;
      solutions.speedMs.set([speedMs, speedMs], cell * 2);
      solutions.directionFrom.set([90, 270], cell * 2);
      solutions.probability.set([0.25, 0.75], cell * 2);
    });
  });
  return Buffer.from(encodeFanBeamBufr(swath, { platformCode: 904 }));
}

/** The position of a cell of a drawn swath; row and column counted from 1. */
export function placeOf(corner: Corner, row: number, column: number): { lon: number; lat: number } {
  return { lon: corner.lon + (column - 1) * CELL_LON_DEG, lat: corner.lat - (row - 1) * CELL_LAT_DEG };
}
