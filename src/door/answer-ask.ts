import { type Desk, isOperationName } from '../operations/desk.ts';
import { Problem } from '../problems/problem.ts';
import { readBody } from './read-body.ts';
import { respondJson, respondTooLong } from './responses.ts';

/** The longest question, bytes: room for 10,000 paths of common length. */
const LONGEST_QUESTION_BYTES = 4 * 1024 * 1024;

/** Answers one question of the contract. Throws 'not-found' for an unknown name and 'bad-input' for what is no JSON. */
export async function answerAsk(desk: Desk, name: string, request: Request): Promise<Response> {
  if (!isOperationName(name)) throw new Problem('not-found', `There is no operation called '${name.slice(0, 80)}'.`);
  const bytes = await readBody(request, LONGEST_QUESTION_BYTES);
  if (bytes === null) return respondTooLong(LONGEST_QUESTION_BYTES);
  return respondJson({ answer: await desk.perform(name, parseQuestion(bytes)) });
}

function parseQuestion(bytes: ArrayBuffer): unknown {
  try {
    return JSON.parse(new TextDecoder('utf-8', { fatal: true }).decode(bytes));
  } catch {
    throw new Problem('bad-input', 'The question is not written in JSON.');
  }
}
