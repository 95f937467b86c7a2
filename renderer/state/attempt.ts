import { reasonOf } from './reasons.ts';
import type { SeenStore } from './seen.ts';

/** Waits for some work and tells the user when it could not be done: 'The pass could not be removed: why.' True when it could. */
export async function attempt(seen: SeenStore, what: string, work: Promise<unknown>): Promise<boolean> {
  try {
    await work;
    return true;
  } catch (thrown) {
    seen.change({ trouble: `${what}: ${reasonOf(thrown)}.` });
    return false;
  }
}
