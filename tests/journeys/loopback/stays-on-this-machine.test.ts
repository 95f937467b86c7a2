import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { chromium } from '@playwright/test';
import { quietFlags } from '../../../src/hosts/launch/quiet-flags.ts';
import { expect, startHost, test } from '../harness/application.ts';

// The browser's own network log (net-internals, NetLog JSON) tells of every request, name and connection of the whole
// browser, workers and background services included; the host's sockets are written down as Node opens them.

const logSockets = fileURLToPath(new URL('../harness/log-sockets.mjs', import.meta.url));
let folder: string;

test.beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'crosstrack-network-'));
});
test.afterEach(() => rmSync(folder, { recursive: true, force: true }));

interface NetLog {
  constants: { logEventTypes: Record<string, number> };
  events: { type: number; params?: Record<string, unknown> }[];
}

/** Runs the application with its demonstration in a browser with the launcher's own flags, and gives what both logs hold. */
async function watchApplication(launchOptions: { executablePath?: string; args?: string[] }, act: string) {
  const netLogFile = join(folder, 'net-log.json');
  const socketLogFile = join(folder, 'sockets.txt');
  const host = await startHost(join(folder, 'archive.db'), true, {
    NODE_OPTIONS: `--import=${logSockets}`,
    CROSSTRACK_SOCKET_LOG: socketLogFile,
  });
  const context = await chromium.launchPersistentContext(join(folder, 'profile'), {
    ...launchOptions,
    args: [...(launchOptions.args ?? []), ...quietFlags, `--log-net-log=${netLogFile}`],
  });
  const page = await context.newPage();
  const requests: string[] = [];
  context.on('request', (request) => requests.push(request.url()));
  await page.goto(host.url);
  await expect(page.locator('canvas').first()).toBeVisible();
  await page.evaluate(act);
  // News keeps a request open for good, so quiet is not to be had: some seconds of drawing must do.
  await page.waitForTimeout(5_000);
  await context.close();
  await host.stop();
  const { origin } = new URL(host.url);
  const netLog: NetLog = JSON.parse(readFileSync(netLogFile, 'utf8'));
  return { origin, requests, netLog, sockets: readFileSync(socketLogFile, 'utf8').trim().split('\n') };
}

/**
 * What left the browser: the far end of each connection, each name asked of a resolver, each datagram sent. Chromium
 * connects a datagram socket to learn whether there is a route, which sends nothing, so those do not count.
 */
function listReached({ constants, events }: NetLog): string[] {
  const told = { TCP_CONNECT_ATTEMPT: 'address', HOST_RESOLVER_SYSTEM_TASK: 'hostname', DNS_TRANSACTION: 'hostname' };
  const wanted = new Map<number, [name: string, detail: string]>();
  for (const [name, detail] of Object.entries({ ...told, UDP_BYTES_SENT: 'byte_count' })) {
    if (constants.logEventTypes[name] === undefined) throw new Error(`this browser's log has no ${name}`);
    wanted.set(constants.logEventTypes[name], [name, detail]);
  }
  return events.flatMap(({ type, params }) => {
    const [name, detail] = wanted.get(type) ?? [];
    return detail !== undefined && params?.[detail] !== undefined ? [`${name} ${params[detail]}`] : [];
  });
}

test('makes no request that leaves the machine, neither page nor browser nor host', async ({ launchOptions }) => {
  const { origin, requests, netLog, sockets } = await watchApplication(launchOptions, 'undefined');
  expect(requests).toContain(`${origin}/ask/readStatus`);
  expect(requests.filter((url) => !url.startsWith(`${origin}/`) && !/^(data|blob):/.test(url))).toEqual([]);
  expect(new Set(listReached(netLog))).toEqual(new Set([`TCP_CONNECT_ATTEMPT ${new URL(origin).host}`]));
  // The host's one look-up is the address it listens at; its loading thread was watched too.
  expect(new Set(sockets)).toEqual(new Set(['watching', 'lookup 127.0.0.1']));
  expect(sockets.filter((line) => line === 'watching').length).toBeGreaterThan(1);
});

test('lets a page that tries reach nobody', async ({ launchOptions }) => {
  const tries = `(async () => {
    await fetch('https://storm.example/fetched').catch(() => {});
    new Image().src = 'https://storm.example/image.png';
    navigator.sendBeacon('https://storm.example/beacon');
    new WebSocket('wss://storm.example/socket');
  })().catch(() => {})`;
  const { origin, netLog } = await watchApplication(launchOptions, tries);
  expect(new Set(listReached(netLog))).toEqual(new Set([`TCP_CONNECT_ATTEMPT ${new URL(origin).host}`]));
  // The content policy stops them before the browser begins a request, so no name is even looked for.
  expect(JSON.stringify(netLog.events)).not.toContain('storm.example');
});

test('would see a socket of the host', () => {
  const file = join(folder, 'sockets.txt');
  const attempt = "require('node:net').connect(9, '127.0.0.1').on('error', () => {})";
  spawnSync(process.execPath, [`--import=${logSockets}`, '-e', attempt], {
    env: { ...process.env, CROSSTRACK_SOCKET_LOG: file },
  });
  expect(existsSync(file) && readFileSync(file, 'utf8')).toMatch(/^connect .*127\.0\.0\.1/m);
});
