import { existsSync, realpathSync } from 'node:fs';
import { homedir } from 'node:os';
import { delimiter, join } from 'node:path';

/** What the search for a browser depends on. */
export interface Machine {
  platform: NodeJS.Platform;
  variables: Record<string, string | undefined>;
  exists: (path: string) => boolean;
}

const names = [
  'chromium',
  'chromium-browser',
  'google-chrome-stable',
  'google-chrome',
  'brave-browser',
  'microsoft-edge-stable',
  'microsoft-edge',
  'vivaldi-stable',
];

const usualPlaces: Partial<Record<NodeJS.Platform, string[]>> = {
  linux: ['/usr/bin', '/usr/local/bin', '/snap/bin'].flatMap((folder) => names.map((name) => `${folder}/${name}`)),
  darwin: ['Chromium', 'Google Chrome', 'Brave Browser', 'Microsoft Edge', 'Vivaldi'].map(
    (name) => `/Applications/${name}.app/Contents/MacOS/${name}`,
  ),
};

const windowsPlaces = [
  ['Chromium', 'Application', 'chrome.exe'],
  ['Google', 'Chrome', 'Application', 'chrome.exe'],
  ['BraveSoftware', 'Brave-Browser', 'Application', 'brave.exe'],
  ['Microsoft', 'Edge', 'Application', 'msedge.exe'],
];

const thisMachine: Machine = { platform: process.platform, variables: process.env, exists: existsSync };

/**
 * The program of a browser of the Chromium family: the one CROSSTRACK_BROWSER names, else the first by PATH, else the
 * first in the usual places of this platform; undefined where there is none.
 */
export function findBrowser(machine: Machine = thisMachine): string | undefined {
  const { variables, exists } = machine;
  const chosen = variables.CROSSTRACK_BROWSER;
  if (chosen) return exists(chosen) ? chosen : undefined;
  return [...listByPath(machine), ...listUsualPlaces(machine)].find(exists);
}

/** Whether a window could be seen: on Linux only where a display is named. */
export function hasDisplay({ platform, variables }: Machine = thisMachine): boolean {
  if (platform === 'win32' || platform === 'darwin') return true;
  return Boolean(variables.DISPLAY || variables.WAYLAND_DISPLAY);
}

/** Where a browser may keep a profile. One packed as a snap may write to its own folder only. */
export function findProfileParent(browser: string, temporaryFolder: string): string {
  const isSnap = browser.startsWith('/snap/') || realpathSync(browser).startsWith('/snap/');
  return isSnap ? join(homedir(), 'snap', 'chromium', 'common') : temporaryFolder;
}

function listByPath({ platform, variables }: Machine): string[] {
  if (platform === 'win32') return [];
  const folders = (variables.PATH ?? '').split(delimiter).filter((folder) => folder !== '');
  return names.flatMap((name) => folders.map((folder) => join(folder, name)));
}

function listUsualPlaces({ platform, variables }: Machine): string[] {
  if (platform !== 'win32') return usualPlaces[platform] ?? [];
  const roots = [variables.LOCALAPPDATA, variables.PROGRAMFILES, variables['PROGRAMFILES(X86)']];
  return windowsPlaces.flatMap((place) =>
    roots.filter((root) => root !== undefined).map((root) => join(root, ...place)),
  );
}
