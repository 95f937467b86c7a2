import { describePlace, Problem, type ProblemCode } from '../problems/problem.ts';
import { safeHeaders } from './safe-headers.ts';

/** An answer of any kind with the headers that all carry. */
export function respond(
  body: ConstructorParameters<typeof Response>[0],
  status: number,
  headers: Record<string, string>,
): Response {
  return new Response(body, { status, headers: { ...safeHeaders, ...headers } });
}

/** An answer in JSON. */
export function respondJson(value: unknown, status = 200, headers: Record<string, string> = {}): Response {
  return respond(JSON.stringify(value), status, { 'content-type': 'application/json', ...headers });
}

/** A refusal in JSON: {problem}, with the status that fits its code unless one is given. */
export function respondProblem(problem: Problem, status = statusOf(problem.code), headers = {}): Response {
  const { code, message, place } = problem;
  return respondJson({ problem: { code, message, where: describePlace(place) } }, status, headers);
}

/** A refusal of a body that is longer than a place accepts. */
export function respondTooLong(mostBytes: number): Response {
  return respondProblem(new Problem('refused', `No more than ${mostBytes} bytes are accepted here.`), 413);
}

function statusOf(code: ProblemCode): number {
  if (code === 'bad-input') return 400;
  if (code === 'refused') return 403;
  if (code === 'not-found' || code === 'not-stored') return 404;
  return code === 'internal' ? 500 : 422;
}
