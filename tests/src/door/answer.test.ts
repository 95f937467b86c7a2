import { mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { LARGEST_FILE_BYTES, routes } from '../../../src/contract/routes.ts';
import { type Answer, createAnswer } from '../../../src/door/answer.ts';
import { type Desk, openDesk } from '../../../src/operations/desk.ts';

let folder: string;
let desk: Desk;
let answer: Answer;

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'crosstrack-door-'));
  mkdirSync(join(folder, 'page', 'assets'), { recursive: true });
  writeFileSync(join(folder, 'page', 'index.html'), '<!doctype html>');
  writeFileSync(join(folder, 'outside.js'), 'outside');
  desk = openDesk({
    archivePath: join(folder, 'archive.db'),
    demoFolder: folder,
    coastlineFolder: folder,
    workerUrl: new URL('../../../src/workers/load-worker.ts', import.meta.url),
    appVersion: '0',
  });
  answer = createAnswer(desk, { staticFolder: join(folder, 'page') });
});

afterEach(async () => {
  await desk.close();
  rmSync(folder, { recursive: true });
});

const get = (path: string) => answer(new Request(`http://door.test${path}`));

/** Posts bytes without end, as a client may; gives the status and how many were taken. */
async function postEndless(path: string, headers: Record<string, string> = {}) {
  let bytesTaken = 0;
  const body = new ReadableStream<Uint8Array>({
    pull(controller) {
      const part = new Uint8Array(1024 * 1024);
      bytesTaken += part.length;
      controller.enqueue(part);
    },
  });
  // 'duplex' is in the Fetch standard and not yet in the DOM's types.
  const init = { method: 'POST', body, headers, duplex: 'half' } as RequestInit;
  const { status } = await answer(new Request(`http://door.test${path}`, init));
  return { status, bytesTaken };
}

test('stops reading a question that does not end', async () => {
  const { status, bytesTaken } = await postEndless(`${routes.ask}listPasses`);
  expect(status).toBe(413);
  expect(bytesTaken).toBeLessThan(8 * 1024 * 1024);
});

test('does not begin to read a file that says it is too large', async () => {
  const headers = { 'content-length': String(LARGEST_FILE_BYTES + 1) };
  const { status, bytesTaken } = await postEndless(`${routes.give}?name=x`, headers);
  expect(status).toBe(413);
  expect(bytesTaken).toBeLessThan(4 * 1024 * 1024);
});

// Types of the IANA media type registry and the HTML standard; scripts and modules are refused by browsers without them.
test.each([
  ['index.html', 'text/html; charset=utf-8'],
  ['assets/a.js', 'text/javascript; charset=utf-8'],
  ['assets/a.mjs', 'text/javascript; charset=utf-8'],
  ['assets/a.css', 'text/css; charset=utf-8'],
  ['assets/a.json', 'application/json'],
  ['assets/a.wasm', 'application/wasm'],
  ['assets/a.woff2', 'font/woff2'],
])('serves %s as %s', async (name, type) => {
  writeFileSync(join(folder, 'page', name), 'x');
  const response = await get(`/${name}`);
  expect([response.status, response.headers.get('content-type')]).toEqual([200, type]);
});

test('does not serve files of kinds that a page has no use for', async () => {
  writeFileSync(join(folder, 'page', 'archive.db'), 'x');
  expect((await get('/archive.db')).status).toBe(404);
});

test('does not follow a link out of the folder, nor serve the folder itself', async () => {
  symlinkSync(join(folder, 'outside.js'), join(folder, 'page', 'link.js'));
  for (const path of ['/link.js', '/assets', '/assets/', '/%00', '/%', '//outside.js', '/..%2foutside.js']) {
    expect((await get(path)).status, path).toBe(404);
  }
});

test('does not serve a folder whose name begins like its own', async () => {
  mkdirSync(join(folder, 'page-two'));
  writeFileSync(join(folder, 'page-two', 'a.js'), 'x');
  expect((await get('/..%2fpage-two/a.js')).status).toBe(404);
});

// Content Security Policy Level 3 (W3C) for the directives; Fetch and HTML standards for the other headers.
test.each(['/', '/no.html', '/news', '/bytes/blocks?ids=1', '/bytes/blocks', '/ask/listPasses'])(
  'answers %s with the strict headers',
  async (path) => {
    const { headers, body } = await get(path);
    await body?.cancel();
    const policy = Object.fromEntries(
      (headers.get('content-security-policy') ?? '').split('; ').map((part) => {
        const [name, ...sources] = part.split(' ');
        return [name, sources.join(' ')];
      }),
    );
    expect(policy).toMatchObject({
      'default-src': "'none'",
      'script-src': "'self'",
      'connect-src': "'self'",
      'font-src': "'self'",
      'worker-src': "'self'",
      'img-src': "'self' data: blob:",
      'style-src': "'self' 'unsafe-inline'",
      'frame-ancestors': "'none'",
    });
    expect(headers.get('x-content-type-options')).toBe('nosniff');
    expect(headers.get('referrer-policy')).toBe('no-referrer');
    expect(headers.get('cross-origin-opener-policy')).toBe('same-origin');
    expect(headers.get('cross-origin-resource-policy')).toBe('same-origin');
    expect(headers.get('access-control-allow-origin')).toBeNull();
    expect(headers.get('set-cookie')).toBeNull();
  },
);

test('ends the news when the reader goes away, and lets the desk go on', async () => {
  const gone = new AbortController();
  const response = await answer(new Request(`http://door.test${routes.news}`, { signal: gone.signal }));
  const reader = (response.body as ReadableStream<Uint8Array>).getReader();
  expect(new TextDecoder().decode((await reader.read()).value)).toBe('{"kind":"alive"}\n');
  gone.abort();
  expect(await reader.read()).toEqual({ done: true, value: undefined });
  expect(() => desk.say({ kind: 'passes changed' })).not.toThrow();
});

test('carries what the host itself has to say', async () => {
  const response = await get(routes.news);
  const reader = (response.body as ReadableStream<Uint8Array>).getReader();
  await reader.read();
  desk.say({ kind: 'asked by the desktop', what: 'night' });
  const line = new TextDecoder().decode((await reader.read()).value);
  expect(JSON.parse(line)).toEqual({ kind: 'asked by the desktop', what: 'night' });
  await reader.cancel();
});

test('cuts off a reader who never reads', async () => {
  const response = await get(routes.news);
  for (let line = 0; line < 11_000; line++) desk.say({ kind: 'passes changed' });
  let bytes = 0;
  for await (const part of response.body ?? []) bytes += part.length;
  expect(bytes).toBeLessThan(11_000 * '{"kind":"passes changed"}\n'.length);
});
