import { expect, test } from 'vitest';
import { makeFanBeamPass } from '../../../src/demo/fan-beam-pass.ts';
import { makePencilBeamPass } from '../../../src/demo/pencil-beam-pass.ts';
import { LOOKED_NO_WIND, NEVER_LOOKED, WIND } from '../../../src/swath/swath.ts';
import { flagBit } from '../../../src/wind/flags.ts';

const southWest = (speedMs: number) => () => ({ eastMs: speedMs * Math.SQRT1_2, northMs: speedMs * Math.SQRT1_2 });
const crossing = { lon: 180, lat: 50, timeMs: Date.UTC(2031, 0, 17, 12), isAscending: true };
const openSea = { isLand: () => false, isIce: () => false };

function makeFan(speedMs: number, isLand = openSea.isLand as (lon: number, lat: number) => boolean) {
  return makeFanBeamPass({
    crossing,
    rows: 8,
    windAt: southWest(speedMs),
    modelWindAt: southWest(speedMs),
    surface: { ...openSea, isLand },
    rowsWithoutForeLook: [6, 8],
    seed: 1,
    platformCode: 901,
  });
}

test('retrieves a steady wind from its own noisy looks', () => {
  const swath = makeFan(12);
  const winds = [...swath.speedMs.keys()].filter((cell) => swath.state[cell] === WIND);
  const errors = winds.map((cell) => swath.speedMs[cell] - 12);
  expect(Math.sqrt(errors.reduce((sum, error) => sum + error * error, 0) / errors.length)).toBeLessThan(0.5);
  expect(winds.every((cell) => Math.abs(swath.directionFrom[cell] - 225) < 20)).toBe(true);
});

test('keeps in each cell the wind of the chosen solution', () => {
  const { speedMs, directionFrom, chosenSolution, solutions } = makeFan(12);
  const slots = solutions?.slots ?? 0;
  for (let cell = 0; cell < speedMs.length; cell++) {
    if (chosenSolution[cell] === 0) continue;
    const slot = cell * slots + chosenSolution[cell] - 1;
    expect([speedMs[cell], directionFrom[cell]]).toEqual([solutions?.speedMs[slot], solutions?.directionFrom[slot]]);
  }
  expect(chosenSolution.some((solution) => solution > 1)).toBe(true);
});

test('looks without a wind where the fore look was lost, and only on that side', () => {
  const { state, flags } = makeFan(12);
  const lostRow = 7 * 42;
  expect(state[lostRow]).toBe(LOOKED_NO_WIND);
  expect(flags[lostRow] & flagBit.tooFewLooks).not.toBe(0);
  expect(state[lostRow + 21]).toBe(WIND);
});

test('flags 3 m/s or less exactly where the wind is so', () => {
  const { speedMs, flags, state } = makeFan(3);
  const light = [...state.keys()].filter((cell) => state[cell] === WIND && speedMs[cell] <= 3);
  expect(light.length).toBeGreaterThan(20);
  for (let cell = 0; cell < state.length; cell++) {
    expect((flags[cell] & flagBit.atMost3Ms) !== 0).toBe(state[cell] === WIND && speedMs[cell] <= 3);
  }
});

test('gives land no wind and the cells of its coast a flag with their wind', () => {
  const { state, flags, lon } = makeFan(12, (where) => where > 170 && where < 175);
  const land = [...lon.keys()].filter((cell) => lon[cell] > 171 && lon[cell] < 174);
  const coast = [...lon.keys()].filter((cell) => (flags[cell] & flagBit.landInCell) !== 0 && state[cell] === WIND);
  expect(land.length).toBeGreaterThan(10);
  expect(land.every((cell) => state[cell] === LOOKED_NO_WIND)).toBe(true);
  expect(coast.length).toBeGreaterThan(0);
});

function makePencil(speedMs: number, rainMmPerHour: number) {
  return makePencilBeamPass({
    crossing,
    rows: 6,
    windAt: southWest(speedMs),
    modelWindAt: southWest(speedMs),
    rainAt: () => rainMmPerHour,
    surface: openSea,
    seed: 2,
    platformCode: 903,
  });
}

function meanSpeed({ speedMs, state }: ReturnType<typeof makePencil>): number {
  const winds = [...speedMs].filter((_, cell) => state[cell] === WIND);
  return winds.reduce((sum, speed) => sum + speed, 0) / winds.length;
}

// Brennan, Hennon and Knabb 2009, Wea. Forecasting 24: rain makes weak Ku winds too high and the strongest too low.
test('makes weak wind too high and the strongest too low in rain, and flags most of it', () => {
  expect(meanSpeed(makePencil(6, 0))).toBeCloseTo(6, 0);
  expect(meanSpeed(makePencil(6, 8))).toBeGreaterThan(10);
  expect(meanSpeed(makePencil(30, 8))).toBeLessThan(24);
  const wet = makePencil(6, 8);
  const winds = [...wet.state.keys()].filter((cell) => wet.state[cell] === WIND);
  const flagged = winds.filter((cell) => (wet.flags[cell] & flagBit.rain) !== 0).length / winds.length;
  expect(flagged).toBeGreaterThan(0.7);
  expect(flagged).toBeLessThan(1);
});

test('has a wind under its track, drops its edge columns and never looks beyond its cone', () => {
  const { state } = makePencil(6, 0);
  const show = (column: number) => state[3 * 76 + column];
  expect([show(0), show(1), show(2), show(7), show(8), show(37), show(38), show(67), show(68)]).toEqual([
    NEVER_LOOKED,
    NEVER_LOOKED,
    LOOKED_NO_WIND,
    LOOKED_NO_WIND,
    WIND,
    WIND,
    WIND,
    WIND,
    LOOKED_NO_WIND,
  ]);
});
