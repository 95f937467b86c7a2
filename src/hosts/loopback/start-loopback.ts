import { randomBytes } from 'node:crypto';
import { once } from 'node:events';
import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';
import { TOKEN_HEADER } from '../../contract/routes.ts';
import { Problem } from '../../problems/problem.ts';
import { sendResponse, toRequest } from './carry.ts';
import { findRefusal, type Knock, type OwnAddress } from './guards.ts';

export interface Loopback {
  /** The page's address, with the token of this launch in its fragment. */
  url: string;
  origin: string;
  token: string;
  /** Stops listening and ends what is still open. */
  close(): Promise<void>;
}

/**
 * Serves a door at 127.0.0.1, on a free port unless one is given, behind guards and a token that is new each launch.
 * Throws a Problem when the port is taken.
 */
export async function startLoopback(answer: (request: Request) => Promise<Response>, port = 0): Promise<Loopback> {
  const token = randomBytes(32).toString('base64url');
  const server = createServer();
  await listen(server, port);
  const origin = new URL(`http://127.0.0.1:${(server.address() as AddressInfo).port}`).origin;
  server.on('request', (incoming, outgoing) => void serve(incoming, outgoing, { origin, token }, answer));
  return {
    url: `${origin}/#${token}`,
    origin,
    token,
    close: async () => {
      server.close();
      server.closeAllConnections();
      await once(server, 'close');
    },
  };
}

async function listen(server: Server, port: number): Promise<void> {
  server.listen({ host: '127.0.0.1', port });
  try {
    await once(server, 'listening');
  } catch (thrown) {
    throw new Problem('refused', `port ${port} cannot be had (${(thrown as NodeJS.ErrnoException).code})`);
  }
}

async function serve(
  incoming: IncomingMessage,
  outgoing: ServerResponse,
  own: OwnAddress,
  answer: (request: Request) => Promise<Response>,
): Promise<void> {
  try {
    const refusal = findRefusal(readKnock(incoming), own);
    if (refusal !== undefined) {
      refuse(outgoing, refusal.status, 'refused', refusal.message);
      return;
    }
    await sendResponse(await answer(toRequest(incoming, outgoing, own.origin)), outgoing, incoming.method !== 'HEAD');
  } catch (thrown) {
    if (outgoing.headersSent) outgoing.destroy();
    else refuse(outgoing, 500, 'internal', thrown instanceof Error ? thrown.message : String(thrown));
  }
}

function readKnock({ method, url, headers }: IncomingMessage): Knock {
  const one = (name: string) => (typeof headers[name] === 'string' ? headers[name] : undefined);
  return {
    method: method ?? '',
    target: url ?? '',
    host: headers.host,
    origin: headers.origin,
    fetchSite: one('sec-fetch-site'),
    token: one(TOKEN_HEADER),
    contentLength: headers['content-length'],
    isChunked: headers['transfer-encoding'] !== undefined,
  };
}

/** Turns a request away out loud. The connection ends, so that an unread body is not waited for. */
function refuse(outgoing: ServerResponse, status: number, code: 'refused' | 'internal', message: string): void {
  outgoing.writeHead(status, {
    'content-type': 'application/json',
    'cache-control': 'no-store',
    'x-content-type-options': 'nosniff',
    connection: 'close',
  });
  outgoing.end(JSON.stringify({ problem: { code, message, where: '' } }));
}
