import { CONTRACT_VERSION } from '../../src/contract/operations.ts';
import { Problem } from '../../src/problems/problem.ts';
import type { Backend } from '../backend/backend.ts';
import { readAreas } from './areas.ts';
import { standAtDemonstration } from './demonstration.ts';
import { readPasses } from './passes.ts';
import type { SeenStore } from './seen.ts';

/** Finds the watch as it was left: settings, passes and areas. A first sitting stands at the demonstration where it is loaded. */
export async function openWatch(seen: SeenStore, backend: Backend): Promise<void> {
  const [status, { settings }] = await Promise.all([backend.ask('readStatus', {}), backend.ask('readSettings', {})]);
  if (status.contractVersion !== CONTRACT_VERSION) {
    throw new Problem('refused', 'this page and the program that serves it are of different versions: reload the page');
  }
  seen.change({ status });
  if (settings) seen.change({ settings });
  else if (status.demonstration) standAtDemonstration(seen, status.demonstration);
  await Promise.all([readPasses(seen, backend), readAreas(seen, backend)]);
}
