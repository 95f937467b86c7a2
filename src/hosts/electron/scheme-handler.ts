import type { Answer } from '../../door/answer.ts';
import { respondProblem } from '../../door/responses.ts';
import { Problem } from '../../problems/problem.ts';
import { isOwnAddress } from './own-address.ts';
import { isOwnOrigin } from './sender-check.ts';

/** Mounts a door under our scheme. A request to another host of it, or from another origin or site, is refused. */
export function createSchemeHandler(answer: Answer): Answer {
  return async (request) => {
    const isAsked = isOwnAddress(request.url);
    if (isAsked && isOwnOrigin(request.headers.get('origin')) && isOwnSite(request)) return answer(request);
    return respondProblem(new Problem('refused', 'Only the page itself may ask here.'), 403);
  };
}

function isOwnSite(request: Request): boolean {
  const site = request.headers.get('sec-fetch-site');
  return site === null || site === 'same-origin' || site === 'none';
}
