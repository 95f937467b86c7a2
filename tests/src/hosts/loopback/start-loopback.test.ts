import { type IncomingHttpHeaders, type OutgoingHttpHeaders, request } from 'node:http';
import { connect } from 'node:net';
import { afterEach, expect, test } from 'vitest';
import { TOKEN_HEADER } from '../../../../src/contract/routes.ts';
import { createAnswer } from '../../../../src/door/answer.ts';
import { type Loopback, startLoopback } from '../../../../src/hosts/loopback/start-loopback.ts';
import type { Desk } from '../../../../src/operations/desk.ts';

// What is right here is fixed outside: RFC 9110 for statuses, the W3C draft Fetch Metadata Request Headers for
// Sec-Fetch-Site, and the browser attack of DNS rebinding, which shows itself in the Host header alone.

let open: Loopback | undefined;

afterEach(async () => {
  await open?.close();
  open = undefined;
});

async function openHost(answer: (request: Request) => Promise<Response> | Response): Promise<Loopback> {
  open = await startLoopback(async (asked) => answer(asked));
  return open;
}

/** A door that says what reached it; nothing that is refused may come this far. */
const tellWhatCame = async (asked: Request) =>
  Response.json({ method: asked.method, path: new URL(asked.url).pathname, body: await asked.text() });

interface Reply {
  status: number;
  headers: IncomingHttpHeaders;
  body: string;
}

/** Asks with exactly these headers, as no browser or fetch would let a page do. */
function knock(host: Loopback, method: string, path: string, headers: OutgoingHttpHeaders = {}, body?: string) {
  const { port } = new URL(host.origin);
  return new Promise<Reply>((resolve, reject) => {
    const asking = request({ host: '127.0.0.1', port, method, path, headers, agent: false }, (incoming) => {
      const chunks: Buffer[] = [];
      incoming.on('data', (chunk) => chunks.push(chunk));
      incoming.on('error', reject);
      incoming.on('end', () =>
        resolve({
          status: incoming.statusCode ?? 0,
          headers: incoming.headers,
          body: Buffer.concat(chunks).toString(),
        }),
      );
    });
    asking.on('error', reject);
    asking.end(body);
  });
}

function withToken(host: Loopback, headers: OutgoingHttpHeaders = {}): OutgoingHttpHeaders {
  return { [TOKEN_HEADER]: host.token, ...headers };
}

test('stands at 127.0.0.1 with a token of 32 random bytes in the fragment, new each launch', async () => {
  const first = await startLoopback(async () => new Response());
  const second = await startLoopback(async () => new Response());
  await Promise.all([first.close(), second.close()]);
  expect(first.url).toMatch(/^http:\/\/127\.0\.0\.1:\d+\/#[A-Za-z0-9_-]{43}$/);
  expect(Buffer.from(first.token, 'base64url')).toHaveLength(32);
  expect(first.token).not.toBe(second.token);
});

test('brings a question with the token to the door and the answer back', async () => {
  const host = await openHost(tellWhatCame);
  const reply = await knock(
    host,
    'POST',
    '/ask/readStatus',
    withToken(host, { 'sec-fetch-site': 'same-origin' }),
    '{}',
  );
  expect(reply.status).toBe(200);
  expect(JSON.parse(reply.body)).toEqual({ method: 'POST', path: '/ask/readStatus', body: '{}' });
});

test('gives static files without a token to the page itself', async () => {
  const host = await openHost(tellWhatCame);
  expect((await knock(host, 'GET', '/', { 'sec-fetch-site': 'none' })).status).toBe(200);
  expect((await knock(host, 'GET', '/assets/main.js', { 'sec-fetch-site': 'same-origin' })).status).toBe(200);
});

test.each([
  ['another name for this machine, as in DNS rebinding', 'GET', '/', { host: 'storm.example:80' }, 421],
  ['localhost, which is a name and not this address', 'GET', '/', { host: 'localhost' }, 421],
  ['the right address with another port', 'GET', '/', { host: '127.0.0.1:1' }, 421],
  ['a page of another origin', 'GET', '/', { origin: 'http://storm.example' }, 403],
  ['a page without an origin', 'POST', '/ask/readStatus', { origin: 'null' }, 403],
  ['another site', 'GET', '/', { 'sec-fetch-site': 'cross-site' }, 403],
  ['another port of this machine', 'GET', '/', { 'sec-fetch-site': 'same-site' }, 403],
  ['an address typed to reach an answer', 'GET', '/bytes/blocks?ids=1', { 'sec-fetch-site': 'none' }, 403],
  ['a method that is not used', 'PUT', '/', {}, 405],
  ['a method that is not used, on an answering route', 'DELETE', '/news', {}, 405],
  ['a preflight of another origin', 'OPTIONS', '/ask/readStatus', { origin: 'http://storm.example' }, 403],
])('turns away %s, loudly, though it has the token', async (_what, method, path, headers, status) => {
  let reachedTheDoor = false;
  const host = await openHost((asked) => {
    reachedTheDoor = true;
    return tellWhatCame(asked);
  });
  const reply = await knock(host, method, path, withToken(host, headers));
  expect(reply.status).toBe(status);
  expect(JSON.parse(reply.body).problem).toMatchObject({ code: 'refused', message: expect.stringMatching(/\w/) });
  expect(reachedTheDoor).toBe(false);
});

test.each([
  ['POST', '/ask/readStatus'],
  ['GET', '/bytes/blocks?ids=1'],
  ['GET', '/news'],
  ['POST', '/give/file?name=a.bufr'],
  ['GET', '/x/../news'],
  ['GET', '/x/%2e%2e/news'],
])('asks for the token at %s %s', async (method, path) => {
  const host = await openHost(tellWhatCame);
  const wrong = Buffer.alloc(32, 7).toString('base64url');
  expect((await knock(host, method, path)).status).toBe(401);
  expect((await knock(host, method, path, { [TOKEN_HEADER]: wrong })).status).toBe(401);
  expect((await knock(host, method, path, { [TOKEN_HEADER]: host.token.slice(1) })).status).toBe(401);
  expect((await knock(host, method, `${path}#${host.token}`)).status).toBe(401);
});

test('takes no address of another machine in place of a path', async () => {
  const host = await openHost(tellWhatCame);
  const { port, host: ownHost } = new URL(host.origin);
  const reply = await new Promise<string>((resolve) => {
    const socket = connect(Number(port), '127.0.0.1');
    let told = '';
    socket.on('data', (chunk) => {
      told += chunk;
    });
    socket.on('close', () => resolve(told));
    socket.write(`GET http://storm.example/ HTTP/1.1\r\nHost: ${ownHost}\r\nConnection: close\r\n\r\n`);
  });
  expect(reply).toMatch(/^HTTP\/1\.1 400 /);
});

/** The real door over a desk that is never reached. */
const realDoor = createAnswer({} as Desk, { staticFolder: '.' });

test('refuses a body that says it is too large, before it comes', async () => {
  const host = await openHost(realDoor);
  const headers = withToken(host, { 'content-length': 600 * 1024 * 1024 });
  const refused = new Promise<number>((resolve, reject) => {
    const asking = request(`${host.origin}/give/file?name=a`, { method: 'POST', headers, agent: false });
    asking.on('response', (incoming) => {
      resolve(incoming.statusCode ?? 0);
      asking.destroy();
    });
    asking.on('error', reject);
    asking.flushHeaders();
  });
  expect(await refused).toBe(413);
});

test('takes no more of a body of unstated length than a question may have', async () => {
  const host = await openHost(realDoor);
  const headers = withToken(host, { 'transfer-encoding': 'chunked' });
  const body = ' '.repeat(64 * 1024 * 1024);
  const outcome = await knock(host, 'POST', '/ask/readStatus', headers, body).then(
    ({ status }) => status,
    () => 'cut off',
  );
  expect([413, 'cut off']).toContain(outcome);
});

test.each(['/%6eews', '//news', '/NEWS', '/bytes%2fblocks?ids=1', '/ask%2freadStatus'])(
  'answers nothing without the token at %s, which is spelt like a route',
  async (path) => {
    const host = await openHost(realDoor);
    expect([401, 404]).toContain((await knock(host, 'GET', path)).status);
  },
);

test('sends no header that opens it to other origins', async () => {
  const host = await openHost(tellWhatCame);
  const reply = await knock(host, 'GET', '/', { origin: host.origin });
  expect(Object.keys(reply.headers).filter((name) => name.startsWith('access-control'))).toEqual([]);
});

test('cuts the connection when an answer breaks off halfway, and keeps serving', async () => {
  let calls = 0;
  const host = await openHost(() => {
    calls += 1;
    if (calls > 1) return new Response('well');
    return new Response(
      new ReadableStream({ pull: (controller) => controller.error(new Error('the disk went away')) }),
    );
  });
  await expect(knock(host, 'GET', '/')).rejects.toThrow();
  expect((await knock(host, 'GET', '/')).body).toBe('well');
});

test('passes a stream on as it comes, and tells the door when the reader goes away', async () => {
  let endStream: (() => void) | undefined;
  const gone = new Promise<void>((resolve) => {
    endStream = resolve;
  });
  const host = await openHost((asked) => {
    asked.signal.addEventListener('abort', () => endStream?.());
    const lines = new ReadableStream({
      start: (controller) => controller.enqueue(new TextEncoder().encode('{"kind":"alive"}\n')),
    });
    return new Response(lines);
  });
  const leaving = new AbortController();
  const response = await fetch(`${host.origin}/news`, {
    headers: { [TOKEN_HEADER]: host.token },
    signal: leaving.signal,
  });
  const first = await response.body?.getReader().read();
  expect(new TextDecoder().decode(first?.value)).toBe('{"kind":"alive"}\n');
  leaving.abort();
  await gone;
});

test('asks the door for no more than the reader takes', async () => {
  let chunksMade = 0;
  const host = await openHost(
    () =>
      new Response(
        new ReadableStream({
          pull: (controller) => {
            chunksMade += 1;
            controller.enqueue(new Uint8Array(1024 * 1024));
            if (chunksMade === 200) controller.close();
          },
        }),
      ),
  );
  const { port, host: ownHost } = new URL(host.origin);
  const socket = connect(Number(port), '127.0.0.1');
  socket.write(`GET / HTTP/1.1\r\nHost: ${ownHost}\r\nConnection: close\r\n\r\n`);
  await new Promise((resolve) => socket.once('readable', resolve));
  const madeBefore = await settled(() => chunksMade);
  socket.destroy();
  expect(madeBefore).toBeLessThan(100);
});

/** The value once it has stood still for some turns of the event loop. */
async function settled(read: () => number): Promise<number> {
  for (let quiet = 0, last = read(); quiet < 200; quiet++) {
    await new Promise((resolve) => setImmediate(resolve));
    if (read() !== last) {
      last = read();
      quiet = 0;
    }
  }
  return read();
}

test('says which port cannot be had', async () => {
  const host = await openHost(tellWhatCame);
  const port = Number(new URL(host.origin).port);
  await expect(startLoopback(async () => new Response(), port)).rejects.toThrow(
    `Port ${port} cannot be had (EADDRINUSE)`,
  );
});

test('closes while a stream is open', async () => {
  const host = await openHost(() => new Response(new ReadableStream({ start: (c) => c.enqueue(new Uint8Array(1)) })));
  const response = await fetch(`${host.origin}/news`, { headers: { [TOKEN_HEADER]: host.token } });
  const reader = response.body?.getReader();
  await reader?.read();
  const ended = reader?.read().catch(() => 'ended');
  await host.close();
  open = undefined;
  expect(await ended).toBe('ended');
});
