import { type BufrValue, encodeBufrMessage } from '../../../../../src/demo/encode-bufr-message.ts';

/** A cell of 3 12 061 as a test wants it; what is left out is an ordinary wind of 8 m/s from 250 degrees. */
export interface CellWanted {
  platform?: number | null;
  /** Seconds after 2031-01-17 06:00 UTC. */
  seconds?: number;
  month?: number;
  day?: number;
  hour?: number | null;
  lat?: number | null;
  lon?: number;
  cellSizeM?: number;
  number?: number | null;
  word?: number | null;
  selected?: number | null;
  /** Speed, direction from, likelihood of each solution. */
  winds?: [speedMs: number | null, directionFrom: number | null, likelihood: number | null][];
  azimuth?: number;
  iceProbability?: number;
}

/** One compressed message of these cells; every cell has as many slots as the one with most winds. */
export function buildMessage(cells: CellWanted[], isCompressed = true): Uint8Array {
  const slots = Math.max(...cells.map(({ winds = [[8, 250, 0]] }) => winds.length));
  const subsets = cells.map((cell) => listValues(cell, slots));
  return encodeBufrMessage({ edition: 4, isCompressed, descriptors: [312061], subsets, timeMs: 0 });
}

/** Values in the order of 3 12 061 (WMO-No. 306, FM 94 table D). */
function listValues(cell: CellWanted, slots: number): BufrValue[] {
  const { platform = 904, seconds = 0, month = 1, day = 17, hour = 6, lat = -50, lon = 170, cellSizeM = 25_000 } = cell;
  const { number = 1, word = 0, selected = 1, winds = [[8, 250, 0]], azimuth = 45, iceProbability = 0 } = cell;
  const hourOf = hour === null ? null : hour + Math.floor(seconds / 3600);
  const slotted = Array.from({ length: slots }, (_, n) => winds[n] ?? [null, null, null]);
  return [
    ...[null, null, null, platform, null, null],
    ...[2031, month, day, hourOf, Math.floor(seconds / 60) % 60, seconds % 60],
    ...[lat, lon, cellSizeM, null, number, null, null, null],
    ...[1, 2, 3].flatMap((beam) => [beam, 40, azimuth, -12, 4, ...new Array(9).fill(null)]),
    ...new Array(20).fill(null),
    ...[null, null, 7, 245, iceProbability, null, word, winds.length, selected, slots],
    ...slotted.flatMap(([speedMs, directionFrom, likelihood]) => [speedMs, directionFrom, 0.5, likelihood]),
  ];
}

/** Messages one behind the other. */
export function joinBytes(...parts: Uint8Array[]): Uint8Array {
  return Uint8Array.from(parts.flatMap((part) => [...part]));
}
