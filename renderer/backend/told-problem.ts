import { toldProblem } from '../../src/contract/values.ts';
import { Problem, type ProblemCode, problemCodes } from '../../src/problems/problem.ts';

/** The Problem that a refusal's JSON body tells of; a body that tells of none becomes 'internal' with the status named. */
export function toToldProblem(body: unknown, status: number): Problem {
  const told = toldProblem.safeParse((body as { problem?: unknown } | null)?.problem);
  if (!told.success) return new Problem('internal', `the host answered with status ${status} and no reason`);
  const { code, message, where } = told.data;
  return new Problem(isProblemCode(code) ? code : 'internal', message, where ? { part: where } : {});
}

/** The Problem of a host that cannot be reached or whose answer cannot be read. */
export function noAnswer(thrown: unknown): Problem {
  const reason = thrown instanceof Error ? thrown.message : String(thrown);
  return new Problem('not-readable', `Crosstrack does not answer (${reason})`);
}

function isProblemCode(code: string): code is ProblemCode {
  return (problemCodes as readonly string[]).includes(code);
}
