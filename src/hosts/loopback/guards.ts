import { createHash, timingSafeEqual } from 'node:crypto';
import { routes } from '../../contract/routes.ts';

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
}

/** A request turned away: the HTTP status and a sentence for people. */
interface Refusal {
  status: number;
  message: string;
}

/**
 * Why a request is turned away before the door sees it, or undefined when it may pass. Holds off other sites in the
 * user's browser (Host against DNS rebinding, Origin and Sec-Fetch-Site against requests across sites) and other
 * programs on the machine (the token). Statuses and headers: RFC 9110; W3C draft Fetch Metadata Request Headers.
 */
export function findRefusal(knock: Knock, own: OwnAddress): Refusal | undefined {
  const { method, target, host, origin, fetchSite, token } = knock;
  if (host !== new URL(own.origin).host) return { status: 421, message: 'This is not the host that was asked for.' };
  if (origin !== undefined && origin !== own.origin)
    return { status: 403, message: 'Another origin may not ask here.' };
  const url = target.startsWith('/') ? URL.parse(own.origin + target) : null;
  if (url === null) return { status: 400, message: 'This is no path.' };
  const isAnswered = answeredPlaces.has(url.pathname.split('/')[1]);
  if (!isSiteAllowed(fetchSite, isAnswered)) return { status: 403, message: 'Another site may not ask here.' };
  if (method !== 'GET' && method !== 'POST') return { status: 405, message: `${method} is not done here.` };
  if (isAnswered && !isSameSecret(token, own.token)) {
    return { status: 401, message: 'The token of this launch is missing or wrong.' };
  }
  return undefined;
}

/** The first parts of the door's own routes; a path that begins otherwise is a static file. */
const answeredPlaces = new Set(Object.values(routes).map((route) => route.split('/')[1]));

/** 'none' is the user's own doing (an address typed, a bookmark): right for the page, never for a question. */
function isSiteAllowed(fetchSite: string | undefined, isAnswered: boolean): boolean {
  return fetchSite === undefined || fetchSite === 'same-origin' || (fetchSite === 'none' && !isAnswered);
}

/** Compares in constant time; digests first, so that not even the length shows. */
function isSameSecret(given: string | undefined, secret: string): boolean {
  const digest = (text: string) => createHash('sha256').update(text).digest();
  return given !== undefined && timingSafeEqual(digest(given), digest(secret));
}
