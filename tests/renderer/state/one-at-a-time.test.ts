import { expect, test } from 'vitest';
import { oneAtATime } from '../../../renderer/state/one-at-a-time.ts';

test('runs once at once, and once more for all calls that came meanwhile', async () => {
  let runs = 0;
  let running = 0;
  let mostRunning = 0;
  const release: (() => void)[] = [];
  const ask = oneAtATime(async () => {
    runs++;
    mostRunning = Math.max(mostRunning, ++running);
    await new Promise<void>((resolve) => release.push(resolve));
    running--;
  }, 0);
  ask();
  ask();
  ask();
  expect(runs).toBe(1);
  release[0]();
  await expect.poll(() => runs).toBe(2);
  release[1]();
  await expect.poll(() => running).toBe(0);
  expect([runs, mostRunning]).toEqual([2, 1]);
});
