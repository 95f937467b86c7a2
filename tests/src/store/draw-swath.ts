import { createSwath, LOOKED_NO_WIND, type Swath, WIND } from '../../../src/swath/swath.ts';

/** Where and when a drawn swath lies. Cells stand a quarter of a degree apart, rows 4 s apart. */
export interface Place {
  west?: number;
  south?: number;
  timeMs?: number;
}

export const drawnTimeMs = Date.UTC(2031, 0, 17, 6);

/**
 * A swath drawn as rows, southernmost first: a digit is a wind of that many times 5 m/s from 200 degrees, 'o' looked at
 * without a wind, '.' never looked at.
 */
export function drawSwath(rows: string[], { west = 10, south = 40, timeMs = drawnTimeMs }: Place = {}): Swath {
  const swath = createSwath(rows.length, rows[0].length);
  swath.cellSizeM = 25_000;
  swath.band = 'C';
  swath.isDirectionStated = true;
  swath.flagReading = 'as-table';
  for (const [row, line] of rows.entries()) {
    for (const [column, sign] of [...line].entries()) {
      if (sign === '.') continue;
      const cell = row * swath.columns + column;
      swath.state[cell] = sign === 'o' ? LOOKED_NO_WIND : WIND;
      swath.lon[cell] = ((west + column * 0.25 + 540) % 360) - 180;
      swath.lat[cell] = south + row * 0.25;
      swath.timeMs[cell] = timeMs + row * 4000;
      if (sign === 'o') continue;
      swath.speedMs[cell] = Number(sign) * 5;
      swath.directionFrom[cell] = 200;
    }
  }
  return swath;
}
