import type { z } from 'zod';
import {
  type OperationAnswer,
  type OperationInput,
  type OperationName,
  operations,
} from '../../src/contract/operations.ts';
import { routes } from '../../src/contract/routes.ts';
import { Problem } from '../../src/problems/problem.ts';
import type { Door } from './door.ts';
import { noAnswer, toToldProblem } from './told-problem.ts';

/** How a question is asked: it can be called off, and it can outlive the page that asks it. */
export interface AskOptions {
  signal?: AbortSignal;
  keepalive?: boolean;
}

/** Asks one question of the contract; the answer is checked. Throws a Problem, or the signal's reason when called off. */
export async function ask<Name extends OperationName>(
  door: Door,
  name: Name,
  input: OperationInput<Name>,
  options: AskOptions = {},
): Promise<OperationAnswer<Name>> {
  const { status, body } = await post(door, name, input, options);
  if (status < 200 || status > 299) throw toToldProblem(body, status);
  const check: z.ZodType = operations[name].answer;
  const answer = check.safeParse((body as { answer?: unknown } | null)?.answer);
  if (!answer.success) throw new Problem('internal', `the answer to ${name} is not what the contract says`);
  return answer.data as OperationAnswer<Name>;
}

async function post(door: Door, name: string, input: unknown, options: AskOptions) {
  try {
    const response = await fetch(`${door.origin}${routes.ask}${name}`, {
      method: 'POST',
      headers: { ...door.headers, 'content-type': 'application/json' },
      body: JSON.stringify(input),
      ...options,
    });
    return { status: response.status, body: (await response.json()) as unknown };
  } catch (thrown) {
    options.signal?.throwIfAborted();
    throw noAnswer(thrown);
  }
}
