import type { IncomingMessage, ServerResponse } from 'node:http';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { ReadableStream as NodeReadableStream } from 'node:stream/web';

/** A request off the socket as a Request of the door, its body still on its way. It aborts when the client goes away. */
export function toRequest(incoming: IncomingMessage, outgoing: ServerResponse, origin: string): Request {
  const gone = new AbortController();
  outgoing.once('close', () => {
    if (!outgoing.writableFinished) gone.abort();
  });
  const headers = new Headers();
  for (const [name, value] of Object.entries(incoming.headers)) {
    if (typeof value === 'string') headers.set(name, value);
  }
  const method = incoming.method ?? 'GET';
  const body = method === 'POST' ? { body: Readable.toWeb(incoming) as ReadableStream, duplex: 'half' as const } : {};
  return new Request(origin + incoming.url, { method, headers, signal: gone.signal, ...body });
}

/** Sends a Response down the socket no faster than the client reads; a client that goes away ends its stream. */
export async function sendResponse(response: Response, outgoing: ServerResponse, isBodyWanted: boolean): Promise<void> {
  outgoing.writeHead(response.status, Object.fromEntries(response.headers));
  if (response.body === null || !isBodyWanted) {
    await response.body?.cancel();
    outgoing.end();
    return;
  }
  // The news stream may say nothing for a while; its reader must learn at once that it is open.
  outgoing.flushHeaders();
  await pipeline(Readable.fromWeb(response.body as NodeReadableStream), outgoing);
}
