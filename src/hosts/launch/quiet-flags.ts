/**
 * The switches that keep a browser of the Chromium family from speaking to anyone but 127.0.0.1: no name resolves, no
 * proxy is asked, nothing is fetched, reported or looked for in the background.
 */
export const quietFlags: readonly string[] = [
  '--host-resolver-rules=MAP * ~NOTFOUND, EXCLUDE 127.0.0.1',
  '--no-proxy-server',
  '--disable-background-networking',
  '--disable-breakpad',
  '--disable-component-update',
  '--disable-crash-reporter',
  '--disable-default-apps',
  '--disable-domain-reliability',
  '--disable-extensions',
  '--disable-features=AutofillServerCommunication,CertificateTransparencyComponentUpdater,DialMediaRouteProvider,InterestFeedContentSuggestions,MediaRouter,OptimizationHints,Translate',
  '--disable-quic',
  '--disable-sync',
  '--no-first-run',
  '--no-default-browser-check',
  '--no-pings',
  '--safebrowsing-disable-auto-update',
];

/**
 * All switches for one app window. Software drawing is a fallback, where there is no graphics processor. The sandbox is
 * off only for root, for whom the browser does not start with it.
 */
export function listWindowFlags(url: string, profileFolder: string, isRoot: boolean): string[] {
  return [
    `--app=${url}`,
    `--user-data-dir=${profileFolder}`,
    '--window-size=1360,900',
    '--enable-unsafe-swiftshader',
    '--disable-background-mode',
    '--password-store=basic',
    '--use-mock-keychain',
    ...quietFlags,
    ...(isRoot ? ['--no-sandbox', '--test-type'] : []),
  ];
}
