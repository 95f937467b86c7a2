import { expect, test } from 'vitest';
import { makeBenchmarkOrbit } from '../../../src/demo/benchmark-orbit.ts';
import { WIND } from '../../../src/swath/swath.ts';

test('makes a whole orbit with beams in every cell and two to four solutions in every wind', () => {
  const { state, lon, beams, solutions, chosenSolution } = makeBenchmarkOrbit();
  expect(lon).toHaveLength(1632 * 42);
  expect(beams?.backscatterDb.every((value) => value > -50 && value < 5)).toBe(true);
  const slots = solutions?.slots ?? 0;
  const counts = new Set<number>();
  for (let cell = 0; cell < state.length; cell++) {
    const given = solutions?.speedMs.slice(cell * slots, (cell + 1) * slots).filter((speed) => speed >= 0).length ?? 0;
    expect(given > 0).toBe(state[cell] === WIND);
    if (given === 0) continue;
    counts.add(given);
    expect(chosenSolution[cell]).toBeLessThanOrEqual(given);
  }
  expect([...counts].sort()).toEqual([2, 3, 4]);
});
