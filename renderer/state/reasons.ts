import { describePlace, toProblem } from '../../src/problems/problem.ts';

/** Why something failed, as one sentence part: 'the file ends too early (storm.bufr, message 3)'. */
export function reasonOf(thrown: unknown): string {
  const problem = toProblem(thrown);
  const place = describePlace(problem.place);
  return place ? `${problem.message} (${place})` : problem.message;
}

/** Whether a wait ended because it was called off, so that nobody is waiting for its outcome. */
export function isCalledOff(thrown: unknown, signal: AbortSignal): boolean {
  return signal.aborted && (thrown === signal.reason || (thrown as { name?: string } | null)?.name === 'AbortError');
}
