import { homedir, platform } from 'node:os';
import { isAbsolute, join, resolve } from 'node:path';

/** What the place of the archive depends on. */
export interface Surroundings {
  platform: NodeJS.Platform;
  home: string;
  variables: Record<string, string | undefined>;
}

/**
 * Where the archive lies: the path chosen, else what CROSSTRACK_ARCHIVE says, else the platform's folder for an
 * application's data (Linux: XDG Base Directory Specification 0.8, which says to ignore relative paths; Windows: the
 * roaming application data; macOS: Application Support).
 */
export function placeOfArchive(chosen?: string, around: Surroundings = lookAround()): string {
  const told = chosen || around.variables.CROSSTRACK_ARCHIVE;
  return told ? resolve(told) : join(folderOfData(around), 'archive.db');
}

function folderOfData({ platform, home, variables }: Surroundings): string {
  if (platform === 'win32') return join(variables.APPDATA || join(home, 'AppData', 'Roaming'), 'Crosstrack');
  if (platform === 'darwin') return join(home, 'Library', 'Application Support', 'Crosstrack');
  const xdg = variables.XDG_DATA_HOME;
  return join(xdg && isAbsolute(xdg) ? xdg : join(home, '.local', 'share'), 'crosstrack');
}

function lookAround(): Surroundings {
  return { platform: platform(), home: homedir(), variables: process.env };
}
