import { LARGEST_FILE_BYTES, MOST_BLOCKS_PER_REQUEST, routes } from '../contract/routes.ts';
import type { Desk } from '../operations/desk.ts';
import { Problem, toProblem } from '../problems/problem.ts';
import { answerAsk } from './answer-ask.ts';
import { streamNews } from './answer-news.ts';
import { answerStatic } from './answer-static.ts';
import { readBody } from './read-body.ts';
import { respond, respondJson, respondProblem, respondTooLong } from './responses.ts';

/** What a host mounts: the whole application as one function. Never rejects. */
export type Answer = (request: Request) => Promise<Response>;

/** Answers the routes of the contract from a desk, and everything else from a folder of static files. */
export function createAnswer(desk: Desk, options: { staticFolder: string }): Answer {
  return async (request) => {
    try {
      return await route(desk, options.staticFolder, request);
    } catch (thrown) {
      return respondProblem(toProblem(thrown));
    }
  };
}

async function route(desk: Desk, staticFolder: string, request: Request): Promise<Response> {
  const url = new URL(request.url);
  if (url.pathname.startsWith(routes.ask)) {
    return onlyBy(request, 'POST', () => answerAsk(desk, url.pathname.slice(routes.ask.length), request));
  }
  if (url.pathname === routes.blocks) return onlyBy(request, 'GET', () => answerBlocks(desk, url));
  if (url.pathname === routes.news) return onlyBy(request, 'GET', () => streamNews(desk, request.signal));
  if (url.pathname === routes.give) return onlyBy(request, 'POST', () => answerGive(desk, url, request));
  return onlyBy(request, 'GET', () => answerStatic(staticFolder, url.pathname));
}

async function onlyBy(request: Request, method: string, act: () => Response | Promise<Response>): Promise<Response> {
  if (request.method === method) return act();
  const problem = new Problem('refused', `This address is asked by ${method} only, not ${request.method}.`);
  return respondProblem(problem, 405, { allow: method });
}

function answerBlocks(desk: Desk, url: URL): Response {
  const text = url.searchParams.get('ids') ?? '';
  if (!/^\d{1,15}(,\d{1,15})*$/.test(text)) {
    throw new Problem('bad-input', 'Block ids are whole numbers with commas between.', { part: 'ids' });
  }
  const ids = text.split(',').map(Number);
  if (ids.length > MOST_BLOCKS_PER_REQUEST) {
    throw new Problem('bad-input', `No more than ${MOST_BLOCKS_PER_REQUEST} blocks are given at once.`, {
      part: 'ids',
    });
  }
  return respond(desk.readBlocks(ids), 200, { 'content-type': 'application/octet-stream' });
}

async function answerGive(desk: Desk, url: URL, request: Request): Promise<Response> {
  const name = url.searchParams.get('name') ?? '';
  if (name === '' || name.length > 255) {
    throw new Problem('bad-input', 'A given file needs a name of 1 to 255 characters.', { part: 'name' });
  }
  const bytes = await readBody(request, LARGEST_FILE_BYTES);
  if (bytes === null) return respondTooLong(LARGEST_FILE_BYTES);
  return respondJson({ answer: await desk.give(name, bytes) });
}
