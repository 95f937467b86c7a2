import { EventEmitter } from 'node:events';
import type { App, OnBeforeRequestListenerDetails, Session, WebContents } from 'electron';
import { expect, test } from 'vitest';
import { guardApp, guardContents, guardSession, isRequestAllowed } from '../../../../src/hosts/electron/policies.ts';

/** Tells an event as Electron does and says whether a listener prevented it. */
function isPrevented(emitter: EventEmitter, name: string, details: object = {}, ...rest: unknown[]): boolean {
  let wasPrevented = false;
  const preventDefault = () => {
    wasPrevented = true;
  };
  emitter.emit(name, { ...details, preventDefault }, ...rest);
  return wasPrevented;
}

/** A page's contents as far as the policy takes hold of them. */
class Contents extends EventEmitter {
  openWindow: ((details: { url: string }) => { action: string }) | undefined;
  setWindowOpenHandler(handler: (details: { url: string }) => { action: string }) {
    this.openWindow = handler;
  }
}

function guardedContents(): Contents {
  const contents = new Contents();
  guardContents(contents as unknown as WebContents);
  return contents;
}

test.each([
  'https://storm.example/',
  'file:///etc/passwd',
  'crosstrack://elsewhere/',
  'data:text/html,hello',
  'about:blank',
])('lets no page go to %s', (url) => {
  const contents = guardedContents();
  expect(isPrevented(contents, 'will-navigate', { url })).toBe(true);
  expect(isPrevented(contents, 'will-frame-navigate', { url, isMainFrame: true })).toBe(true);
});

test('lets our page load again, in the main frame only', () => {
  const contents = guardedContents();
  const url = 'crosstrack://desk/';
  expect(isPrevented(contents, 'will-navigate', { url })).toBe(false);
  expect(isPrevented(contents, 'will-frame-navigate', { url, isMainFrame: true })).toBe(false);
  expect(isPrevented(contents, 'will-frame-navigate', { url, isMainFrame: false })).toBe(true);
});

test('opens no second window, follows no redirect and holds no web view', () => {
  const contents = guardedContents();
  expect(contents.openWindow?.({ url: 'crosstrack://desk/' })).toEqual({ action: 'deny' });
  expect(isPrevented(contents, 'will-redirect', { url: 'crosstrack://desk/' })).toBe(true);
  expect(isPrevented(contents, 'will-attach-webview')).toBe(true);
});

type BeforeRequest = (
  details: Partial<OnBeforeRequestListenerDetails>,
  tell: (answer: { cancel?: boolean }) => void,
) => void;

/** A session as far as the policy takes hold of it, with what it was given. */
class GuardedSession extends EventEmitter {
  readonly given: { check?: () => boolean; ask?: (...args: unknown[]) => void; device?: () => boolean } = {};
  beforeRequest: BeforeRequest | undefined;
  readonly webRequest = {
    onBeforeRequest: (listener: BeforeRequest) => {
      this.beforeRequest = listener;
    },
  };
  constructor(ownContentsId: number) {
    super();
    guardSession(this as unknown as Session, (contentsId) => contentsId === ownContentsId);
  }
  setPermissionCheckHandler(handler: () => boolean) {
    this.given.check = handler;
  }
  setPermissionRequestHandler(handler: (...args: unknown[]) => void) {
    this.given.ask = handler;
  }
  setDevicePermissionHandler(handler: () => boolean) {
    this.given.device = handler;
  }
  isCancelled(details: Partial<OnBeforeRequestListenerDetails>): boolean | undefined {
    let cancelled: boolean | undefined;
    this.beforeRequest?.(details, ({ cancel }) => {
      cancelled = cancel;
    });
    return cancelled;
  }
}

test.each(['geolocation', 'media', 'notifications', 'clipboard-read', 'openExternal', 'a permission of tomorrow'])(
  'grants no page %s',
  (permission) => {
    const { given } = new GuardedSession(7);
    let granted: unknown;
    given.ask?.({}, permission, (answer: boolean) => {
      granted = answer;
    });
    expect([granted, given.check?.(), given.device?.()]).toEqual([false, false, false]);
  },
);

test('downloads nothing', () => {
  expect(isPrevented(new GuardedSession(7), 'will-download')).toBe(true);
});

test.each([
  'https://storm.example/',
  'http://127.0.0.1/',
  'ws://storm.example/',
  'wss://storm.example/',
  'ftp://storm.example/',
  'file:///etc/passwd',
  'chrome://version/',
  'devtools://devtools/bundled/inspector.html',
  'crosstrack://elsewhere/',
  'blob:https://storm.example/1234',
  'no address at all',
])('stops a request for %s', (url) => {
  expect(isRequestAllowed(url)).toBe(false);
  expect(new GuardedSession(7).isCancelled({ url, webContentsId: 7 })).toBe(true);
});

test.each([
  'crosstrack://desk/',
  'crosstrack://desk/ask/readStatus',
  'data:image/png;base64,',
  'blob:crosstrack://desk/1-2',
])('lets our page ask for %s', (url) => {
  expect(new GuardedSession(7).isCancelled({ url, webContentsId: 7 })).toBe(false);
});

type Frame = NonNullable<OnBeforeRequestListenerDetails['frame']>;

const mainFrame = { parent: null } as Frame;
const innerFrame = { parent: mainFrame } as Frame;

test.each([
  ['another window', { webContentsId: 8 }, true],
  ['a frame inside our page', { webContentsId: 7, frame: innerFrame }, true],
  [
    'another origin in our window',
    { webContentsId: 7, frame: mainFrame, initiatorOrigin: 'https://storm.example' },
    true,
  ],
  ['an opaque origin', { webContentsId: 7, frame: mainFrame, initiatorOrigin: 'null' }, true],
  ['the main frame of our window', { webContentsId: 7, frame: mainFrame, initiatorOrigin: 'crosstrack://desk' }, false],
  ['a worker of our page, which has no frame', { webContentsId: 7, initiatorOrigin: 'crosstrack://desk' }, false],
  ['the browser itself, which loads our page', {}, false],
])('asks who sends a request: %s', (_who, sender, isCancelled) => {
  expect(new GuardedSession(7).isCancelled({ url: 'crosstrack://desk/news', ...sender })).toBe(isCancelled);
});

test('trusts no bad certificate and gives no certificate or password', () => {
  const app = new EventEmitter();
  guardApp(app as unknown as App);
  const told: unknown[][] = [];
  const tell = (...words: unknown[]) => told.push(words);
  expect(isPrevented(app, 'certificate-error', {}, {}, 'https://storm.example', 'expired', {}, tell)).toBe(true);
  expect(isPrevented(app, 'select-client-certificate', {}, {}, 'https://storm.example', [{}], tell)).toBe(true);
  expect(isPrevented(app, 'login', {}, {}, {}, {}, tell)).toBe(true);
  expect(told).toEqual([[false], [], []]);
});

test('guards every contents that ever comes to be', () => {
  const app = new EventEmitter();
  guardApp(app as unknown as App);
  const contents = new Contents();
  app.emit('web-contents-created', {}, contents);
  expect(isPrevented(contents, 'will-navigate', { url: 'https://storm.example/' })).toBe(true);
});
