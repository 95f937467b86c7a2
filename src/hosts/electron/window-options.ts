import type { BrowserWindowConstructorOptions, CustomScheme } from 'electron';
import { OWN_SCHEME } from './own-address.ts';

/** What our scheme may do. It never steps around the content policy. */
export const ownScheme: CustomScheme = {
  scheme: OWN_SCHEME,
  privileges: { standard: true, secure: true, supportFetchAPI: true, stream: true, bypassCSP: false },
};

/** The one window. A name without 'persist:' keeps its session in memory: all that lasts is in the archive. */
export const windowOptions: BrowserWindowConstructorOptions = {
  width: 1360,
  height: 900,
  minWidth: 800,
  minHeight: 500,
  title: 'Crosstrack',
  show: false,
  webPreferences: {
    partition: 'crosstrack',
    sandbox: true,
    contextIsolation: true,
    nodeIntegration: false,
    nodeIntegrationInWorker: false,
    nodeIntegrationInSubFrames: false,
    webSecurity: true,
    allowRunningInsecureContent: false,
    experimentalFeatures: false,
    webviewTag: false,
    plugins: false,
    navigateOnDragDrop: false,
    // The dictionaries would be fetched.
    spellcheck: false,
  },
};

/** Chromium's own switches, name and value: no name resolves, and nothing is fetched or reported in the background. */
export const quietSwitches: readonly [name: string, value?: string][] = [
  ['host-resolver-rules', 'MAP * ~NOTFOUND'],
  ['no-proxy-server'],
  ['disable-background-networking'],
  ['disable-component-update'],
  ['disable-domain-reliability'],
  ['disable-quic'],
  ['no-pings'],
];
