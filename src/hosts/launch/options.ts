import { parseArgs } from 'node:util';

/** What was asked of the launcher. */
export interface LaunchOptions {
  archivePath: string | undefined;
  /** False: only serve, at an address that is printed. */
  isWindowWanted: boolean;
  /** A port of the user's own choosing; the page is then served to a browser, never to Electron. */
  port: number | undefined;
  /** True: try again to fetch Electron, though an earlier try failed. */
  isFetchAsked: boolean;
  isDemonstrationWanted: boolean;
  isHelpAsked: boolean;
}

/** What `npm start -- --help` prints. */
export const launchHelp = `Opens Crosstrack.

npm start -- [options]

  --archive PATH       the archive to open or make (else CROSSTRACK_ARCHIVE, else this platform's place for data)
  --no-window          open no window: print the address and serve until stopped
  --port NUMBER        serve a browser at this port of 127.0.0.1 instead of one that is free
  --no-demonstration   leave an unused archive empty
  --fetch-electron     try again to fetch the Electron runtime, after a try that failed
  --help               print this
`;

/** Reads the launcher's arguments. Throws an Error with a sentence for people when it does not know one. */
export function readLaunchOptions(args: string[]): LaunchOptions {
  const { values } = parseArgs({
    args,
    options: {
      archive: { type: 'string' },
      'no-window': { type: 'boolean', default: false },
      port: { type: 'string' },
      'no-demonstration': { type: 'boolean', default: false },
      'fetch-electron': { type: 'boolean', default: false },
      help: { type: 'boolean', default: false },
    },
  });
  return {
    archivePath: values.archive,
    isWindowWanted: !values['no-window'],
    port: values.port === undefined ? undefined : readPort(values.port),
    isFetchAsked: values['fetch-electron'],
    isDemonstrationWanted: !values['no-demonstration'],
    isHelpAsked: values.help,
  };
}

function readPort(text: string): number {
  const port = Number(text);
  if (!/^\d+$/.test(text) || port > 65_535) throw new Error(`--port takes a number from 0 to 65535, not '${text}'`);
  return port;
}
