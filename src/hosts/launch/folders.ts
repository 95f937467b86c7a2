import { homedir } from 'node:os';
import { join } from 'node:path';

/** Where this user keeps what can be made again (XDG Base Directory Specification 0.8; the platforms' own on others). */
export function findCacheFolder(
  variables: Record<string, string | undefined> = process.env,
  platform: NodeJS.Platform = process.platform,
): string {
  if (platform === 'win32') return join(variables.LOCALAPPDATA || join(homedir(), 'AppData', 'Local'), 'Crosstrack');
  if (platform === 'darwin') return join(homedir(), 'Library', 'Caches', 'Crosstrack');
  return join(variables.XDG_CACHE_HOME || join(homedir(), '.cache'), 'crosstrack');
}
