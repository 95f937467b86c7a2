import { expect, test } from 'vitest';
import { createRandom } from '../../../src/demo/random.ts';

test('gives the same numbers again from the same seed, and others from another', () => {
  const take = (seed: number) => {
    const random = createRandom(seed);
    return Array.from({ length: 5 }, () => random.next());
  };
  expect(take(7)).toEqual(take(7));
  expect(take(7)).not.toEqual(take(8));
});

test('gives Gaussian numbers of mean 0 and standard deviation 1', () => {
  const random = createRandom(1);
  const values = Array.from({ length: 20_000 }, () => random.gaussian());
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  const spread = Math.sqrt(values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / values.length);
  expect(mean).toBeCloseTo(0, 1);
  expect(spread).toBeCloseTo(1, 1);
});
