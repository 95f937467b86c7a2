import { createServer, type Server, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterEach, expect, test } from 'vitest';
import { ask } from '../../../renderer/backend/ask.ts';
import { type Door, findDoor } from '../../../renderer/backend/door.ts';
import { listenToNews } from '../../../renderer/backend/news.ts';
import type { NewsLine } from '../../../src/contract/news.ts';
import { TOKEN_HEADER } from '../../../src/contract/routes.ts';

let server: Server | undefined;

/** A small host of our own at 127.0.0.1, and the door a page of it would find. */
async function serve(
  answer: (path: string, token: string | undefined, response: ServerResponse) => void,
): Promise<Door> {
  server = createServer((request, response) => {
    answer(request.url ?? '', request.headers[TOKEN_HEADER] as string | undefined, response);
  });
  await new Promise<void>((resolve) => server?.listen(0, '127.0.0.1', resolve));
  const { port } = server.address() as AddressInfo;
  return findDoor({ origin: `http://127.0.0.1:${port}`, hash: '#a-token' });
}

afterEach(() => {
  server?.closeAllConnections();
  server?.close();
});

const answerJson = (response: ServerResponse, status: number, body: unknown) => {
  response.writeHead(status, { 'content-type': 'application/json' }).end(JSON.stringify(body));
};

test('finds no token in an address without a fragment', () => {
  expect(findDoor({ origin: 'crosstrack://app', hash: '' }).headers).toEqual({});
});

test('sends the token of the fragment with a question', async () => {
  let seenToken: string | undefined;
  const door = await serve((_, token, response) => {
    seenToken = token;
    answerJson(response, 200, { answer: { areas: [] } });
  });
  await ask(door, 'listWatchAreas', {});
  expect(seenToken).toBe('a-token');
});

test('tells a refusal by its code, sentence and place', async () => {
  const door = await serve((_, __, response) => {
    answerJson(response, 404, { problem: { code: 'not-stored', message: 'no such pass', where: 'pass 9' } });
  });
  await expect(ask(door, 'removePass', { passId: 9 })).rejects.toMatchObject({
    code: 'not-stored',
    message: 'no such pass',
    place: { part: 'pass 9' },
  });
});

test('refuses an answer that is not what the contract says', async () => {
  const door = await serve((_, __, response) => answerJson(response, 200, { answer: { areas: 'none' } }));
  await expect(ask(door, 'listWatchAreas', {})).rejects.toMatchObject({ code: 'internal' });
});

test('says that a host that is gone does not answer', async () => {
  const door = { origin: 'http://127.0.0.1:9', headers: {} };
  await expect(ask(door, 'listPasses', {})).rejects.toMatchObject({ code: 'not-readable' });
});

test('hears lines cut anywhere, and listens again when the stream ends', async () => {
  const streams = [
    ['{"kind":"alive"}\n{"kind":"pass', 'es changed"}\n'],
    ['{"kind":"alive"}\n', '{"kind":"areas changed"}\n'],
  ];
  const door = await serve((_, __, response) => {
    response.writeHead(200);
    const pieces = streams.shift() ?? [];
    response.write(pieces[0] ?? '');
    setTimeout(() => response.end(pieces[1] ?? ''), 20);
  });
  const heard: NewsLine['kind'][] = [];
  const links: boolean[] = [];
  await new Promise<void>((resolve) => {
    const stop = listenToNews(door, {
      hear(line) {
        heard.push(line.kind);
        if (heard.length < 2) return;
        stop();
        resolve();
      },
      linkChanged: (isUp) => links.push(isUp),
    });
  });
  expect(heard).toEqual(['passes changed', 'areas changed']);
  expect(links).toEqual([true, false, true]);
});
