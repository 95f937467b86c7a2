import { randomBytes } from 'node:crypto';
import { once } from 'node:events';
import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';
import { TOKEN_HEADER } from '../../contract/routes.ts';
import type { Answer } from '../../door/answer.ts';
import { respondProblem } from '../../door/responses.ts';
import { Problem } from '../../problems/problem.ts';
import { sendResponse, toRequest } from './carry.ts';
import { findRefusal, type Knock, type OwnAddress } from './guards.ts';

/** A door that is served, until closed. */
export interface Loopback {
  /** The page's address, with the token of this launch in its fragment. */
  url: string;
  /** 'http://127.0.0.1:PORT' */
  origin: string;
  token: string;
  /** Stops listening and ends what is still open. */
  close(): Promise<void>;
}

/**
 * Serves a door at 127.0.0.1, on a free port unless one is given, behind guards and a token that is new each launch.
 * Throws a Problem 'refused' when the port cannot be had.
 */
export async function startLoopback(answer: Answer, port = 0): Promise<Loopback> {
  const token = randomBytes(32).toString('base64url');
  const server = createServer();
  await listen(server, port);
  const { origin } = new URL(`http://127.0.0.1:${(server.address() as AddressInfo).port}`);
  server.on('request', (incoming, outgoing) => void serve(incoming, outgoing, { origin, token }, answer));
  return {
    url: `${origin}/#${token}`,
    origin,
    token,
    close: async () => {
      const closed = once(server, 'close');
      server.close();
      server.closeAllConnections();
      await closed;
    },
  };
}

async function listen(server: Server, port: number): Promise<void> {
  server.listen({ host: '127.0.0.1', port });
  try {
    await once(server, 'listening');
  } catch (thrown) {
    throw new Problem('refused', `Port ${port} cannot be had (${(thrown as NodeJS.ErrnoException).code}).`);
  }
}

async function serve(incoming: IncomingMessage, outgoing: ServerResponse, own: OwnAddress, answer: Answer) {
  const refusal = findRefusal(readKnock(incoming), own);
  try {
    if (refusal === undefined) await sendResponse(await answer(toRequest(incoming, outgoing, own.origin)), outgoing);
    else await sendResponse(respondProblem(new Problem('refused', refusal.message), refusal.status), outgoing);
  } catch {
    // The client went away, or the answer broke off halfway: a cut connection is the only way left to tell.
    outgoing.destroy();
  }
}

function readKnock({ method = '', url = '', headers }: IncomingMessage): Knock {
  const one = (name: string) => (typeof headers[name] === 'string' ? headers[name] : undefined);
  return {
    method,
    target: url,
    host: headers.host,
    origin: headers.origin,
    fetchSite: one('sec-fetch-site'),
    token: one(TOKEN_HEADER),
  };
}
