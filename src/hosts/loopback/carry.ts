import type { IncomingMessage, ServerResponse } from 'node:http';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { ReadableStream as NodeReadableStream } from 'node:stream/web';

/** A request off the socket as the door takes it, its body still on its way. It aborts when the client goes away. */
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

/** Sends a response down the socket no faster than the client reads. Rejects when the client goes away before its end. */
export async function sendResponse(response: Response, outgoing: ServerResponse): Promise<void> {
  outgoing.writeHead(response.status, Object.fromEntries(response.headers));
  // The news stream may say nothing for a while; its reader must learn at once that it is open.
  outgoing.flushHeaders();
  if (response.body === null) outgoing.end();
  else await pipeline(Readable.fromWeb(response.body as NodeReadableStream), outgoing);
}
