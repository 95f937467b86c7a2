import type { App, Session, WebContents } from 'electron';
import { isOwnAddress, PAGE_ADDRESS } from './own-address.ts';
import { isOwnSender, type Sender } from './sender-check.ts';

/** The events and handlers of a page's contents that the policy takes hold of. */
type Guarded = Pick<WebContents, 'on' | 'setWindowOpenHandler'>;

/** Refuses a page every way out: other addresses, new windows, web views. Only our page may be loaded, or loaded again. */
export function guardContents(contents: Guarded): void {
  contents.setWindowOpenHandler(() => ({ action: 'deny' }));
  contents.on('will-navigate', (details) => {
    if (details.url !== PAGE_ADDRESS) details.preventDefault();
  });
  contents.on('will-frame-navigate', (details) => {
    if (details.url !== PAGE_ADDRESS || !details.isMainFrame) details.preventDefault();
  });
  contents.on('will-redirect', (details) => details.preventDefault());
  contents.on('will-attach-webview', (event) => event.preventDefault());
}

/** Refuses every permission, device and download, and every request that is not ours or not from our page. */
export function guardSession(
  session: Pick<
    Session,
    'on' | 'setPermissionCheckHandler' | 'setPermissionRequestHandler' | 'setDevicePermissionHandler' | 'webRequest'
  >,
  isOwnContents: (contentsId: number) => boolean,
): void {
  session.setPermissionCheckHandler(() => false);
  session.setPermissionRequestHandler((_contents, _permission, tell) => tell(false));
  session.setDevicePermissionHandler(() => false);
  session.on('will-download', (event) => event.preventDefault());
  session.webRequest.onBeforeRequest((details, tell) => {
    const sender: Sender = {
      contentsId: details.webContentsId,
      isMainFrame: details.frame ? details.frame.parent === null : undefined,
      origin: details.initiatorOrigin,
    };
    tell({ cancel: !isRequestAllowed(details.url) || !isOwnSender(sender, isOwnContents) });
  });
}

/** Refuses what an application is asked for on behalf of a page: bad certificates, client certificates, passwords. */
export function guardApp(app: Pick<App, 'on'>): void {
  app.on('web-contents-created', (_event, contents) => guardContents(contents));
  app.on('certificate-error', (event, _contents, _url, _error, _certificate, tell) => {
    event.preventDefault();
    tell(false);
  });
  app.on('select-client-certificate', (event, _contents, _url, _list, tell) => {
    event.preventDefault();
    tell();
  });
  app.on('login', (event, _contents, _details, _info, tell) => {
    event.preventDefault();
    tell();
  });
}

/** Whether the page may ask for an address: its own, and what it made itself. */
export function isRequestAllowed(address: string): boolean {
  if (isOwnAddress(address)) return true;
  const inner = address.startsWith('blob:') ? address.slice('blob:'.length) : '';
  return address.startsWith('data:') || isOwnAddress(inner);
}
