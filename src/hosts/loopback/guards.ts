import { createHash, timingSafeEqual } from 'node:crypto';
import { LARGEST_FILE_BYTES, routes } from '../../contract/routes.ts';

/** The largest question, bytes: ten thousand long paths still fit. */
const LARGEST_QUESTION_BYTES = 8 * 1024 * 1024;

/** Where this host stands and the secret of this launch. */
export interface OwnAddress {
  /** 'http://127.0.0.1:PORT' */
  origin: string;
  token: string;
}

/** What a request says of itself before its body is read. */
export interface Knock {
  method: string;
  /** The request target as sent. */
  target: string;
  host: string | undefined;
  origin: string | undefined;
  fetchSite: string | undefined;
  token: string | undefined;
  contentLength: string | undefined;
  isChunked: boolean;
}

export interface Refusal {
  status: number;
  message: string;
}

/**
 * Why a request is turned away before the door sees it, or undefined when it may pass. Holds off other sites in the
 * user's browser (Host against DNS rebinding, Origin and Sec-Fetch-Site against requests across sites) and other
 * programs on the machine (the token). Headers as in RFC 9110 and the W3C draft Fetch Metadata Request Headers.
 */
export function findRefusal(knock: Knock, own: OwnAddress): Refusal | undefined {
  if (knock.host !== new URL(own.origin).host)
    return { status: 421, message: 'this is not the host that was asked for' };
  if (knock.origin !== undefined && knock.origin !== own.origin) {
    return { status: 403, message: `the page at ${knock.origin} may not ask here` };
  }
  const url = URL.parse(own.origin + knock.target);
  if (!knock.target.startsWith('/') || url?.origin !== own.origin) return { status: 400, message: 'this is no path' };
  const isStatic = !isAnswered(url.pathname);
  if (!isSiteAllowed(knock.fetchSite, isStatic)) return { status: 403, message: 'another site may not ask here' };
  if (isStatic)
    return isReading(knock.method) ? undefined : { status: 405, message: `${knock.method} is not done here` };
  if (!isSameSecret(knock.token, own.token))
    return { status: 401, message: 'the token of this launch is missing or wrong' };
  return knock.method === 'POST' ? findSizeRefusal(knock, url.pathname) : refuseUnlessReading(knock.method);
}

/** Whether a path is one of the door's own routes; anything else is a static file. Spelling tricks count as the route. */
function isAnswered(pathname: string): boolean {
  const places = [routes.ask, routes.blocks, routes.news, routes.give].map((route) => route.split('/')[1]);
  const first = pathname.replace(/^\/+/, '').split(/\/|%2f|%5c/i)[0];
  return places.includes(unescapePath(first).toLowerCase());
}

function unescapePath(text: string): string {
  try {
    return decodeURIComponent(text);
  } catch {
    return text;
  }
}

/** 'none' is the user's own doing (an address typed, a bookmark): right for the page, never for a question. */
function isSiteAllowed(fetchSite: string | undefined, isStatic: boolean): boolean {
  return fetchSite === undefined || fetchSite === 'same-origin' || (isStatic && fetchSite === 'none');
}

function isReading(method: string): boolean {
  return method === 'GET' || method === 'HEAD';
}

function refuseUnlessReading(method: string): Refusal | undefined {
  return isReading(method) ? undefined : { status: 405, message: `${method} is not done here` };
}

function findSizeRefusal(knock: Knock, pathname: string): Refusal | undefined {
  const mostBytes = pathname.startsWith(routes.give) ? LARGEST_FILE_BYTES : LARGEST_QUESTION_BYTES;
  const bytes = Number(knock.contentLength);
  if (knock.isChunked || !Number.isInteger(bytes))
    return { status: 411, message: 'the length of the body is not stated' };
  if (bytes > mostBytes) return { status: 413, message: `the body is larger than ${mostBytes / 2 ** 20} MiB` };
  return undefined;
}

/** Compares in constant time; digests first, so that not even the length shows. */
function isSameSecret(given: string | undefined, secret: string): boolean {
  const digest = (text: string) => createHash('sha256').update(text).digest();
  return given !== undefined && timingSafeEqual(digest(given), digest(secret));
}
