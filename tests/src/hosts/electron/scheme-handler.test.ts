import { expect, test } from 'vitest';
import { createSchemeHandler } from '../../../../src/hosts/electron/scheme-handler.ts';

const handle = createSchemeHandler(async (request) => Response.json({ reached: new URL(request.url).pathname }));

test.each([
  ['the page itself', 'crosstrack://desk/', {}],
  ['a question of the page', 'crosstrack://desk/ask/readStatus', { origin: 'crosstrack://desk' }],
  ['a file of the page', 'crosstrack://desk/assets/main.js', { 'sec-fetch-site': 'same-origin' }],
])('brings %s to the door', async (_what, url, headers) => {
  const response = await handle(new Request(url, { headers }));
  expect(response.status).toBe(200);
  expect(await response.json()).toEqual({ reached: new URL(url).pathname });
});

test.each([
  ['another host of our scheme', 'crosstrack://elsewhere/ask/readStatus', {}],
  ['another scheme', 'https://desk/ask/readStatus', {}],
  ['a user in the address', 'crosstrack://someone@desk/', {}],
  ['a port in the address', 'crosstrack://desk:80/', {}],
  ['another origin', 'crosstrack://desk/ask/readStatus', { origin: 'https://storm.example' }],
  ['a page without an origin', 'crosstrack://desk/ask/readStatus', { origin: 'null' }],
  ['another site', 'crosstrack://desk/ask/readStatus', { 'sec-fetch-site': 'cross-site' }],
])('refuses %s, out loud', async (_what, url, headers) => {
  // Node's Request takes no user in an address; what Electron hands over has the same parts.
  const response = await handle({ url, headers: new Headers(headers) } as Request);
  expect(response.status).toBe(403);
  expect((await response.json()).problem).toMatchObject({ code: 'refused' });
});

test('hands the answer on as it is, a stream included', async () => {
  const body = new ReadableStream({ start: (controller) => controller.enqueue(new Uint8Array([1, 2, 3])) });
  const answer = new Response(body, { status: 207 });
  const passed = await createSchemeHandler(async () => answer)(new Request('crosstrack://desk/news'));
  expect(passed).toBe(answer);
});
