import { HARMONIC_POWER, harmonicTerms } from './cmod5n.ts';

/** The slowest and fastest wind a table holds, m/s: the range the model function is computed for. */
export const SLOWEST_MS = 0.2;
export const FASTEST_MS = 50;

/** Distance between tabulated speeds, m/s. From 0.4 m/s up, cubic interpolation between them is within 1e-4 of the function. */
const STEP_MS = 0.1;

/** One more entry before and two after the range, so that interpolation always has four. */
const ENTRIES = Math.round((FASTEST_MS - SLOWEST_MS) / STEP_MS) + 4;

/** The model function at one incidence: b0, b1, b2 at every tenth of a metre per second, side by side as they are read. */
export type ModelTable = Float64Array;

const tables = new Map<number, ModelTable>();
const MOST_TABLES = 4096;

/** The table of an incidence, rounded to 0.01 degrees as files hold it; made once and kept. */
export function findModelTable(incidenceDeg: number): ModelTable {
  const key = Math.round(incidenceDeg * 100);
  let table = tables.get(key);
  if (table === undefined) {
    if (tables.size >= MOST_TABLES) tables.clear();
    table = makeModelTable(key / 100);
    tables.set(key, table);
  }
  return table;
}

function makeModelTable(incidenceDeg: number): ModelTable {
  const table = new Float64Array(ENTRIES * 3);
  for (let entry = 0; entry < ENTRIES; entry++) {
    const { b0, b1, b2 } = harmonicTerms(SLOWEST_MS + (entry - 1) * STEP_MS, incidenceDeg);
    table.set([b0, b1, b2], entry * 3);
  }
  return table;
}

/** Backscatter, linear, from a table: speed in m/s within the range, cosine of the relative direction (1 = upwind). */
export function tabulatedBackscatter(table: ModelTable, speedMs: number, cosPhi: number): number {
  const place = (speedMs - SLOWEST_MS) * (1 / STEP_MS) + 1;
  const entry = Math.min(ENTRIES - 3, Math.max(1, Math.floor(place)));
  const t = place - entry;
  // Lagrange's cubic through the entries at -1, 0, 1 and 2.
  const below = t * (t - 2);
  const above = (t + 1) * (t - 1);
  const w0 = (below * (t - 1)) / -6;
  const w1 = (above * (t - 2)) / 2;
  const w2 = (below * (t + 1)) / -2;
  const w3 = (above * t) / 6;
  const at = entry * 3 - 3;
  const b0 = w0 * table[at] + w1 * table[at + 3] + w2 * table[at + 6] + w3 * table[at + 9];
  const b1 = w0 * table[at + 1] + w1 * table[at + 4] + w2 * table[at + 7] + w3 * table[at + 10];
  const b2 = w0 * table[at + 2] + w1 * table[at + 5] + w2 * table[at + 8] + w3 * table[at + 11];
  return b0 * (1 + b1 * cosPhi + b2 * (2 * cosPhi * cosPhi - 1)) ** HARMONIC_POWER;
}
