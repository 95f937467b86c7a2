import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { existsSync, readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';

/** What the build reads, and the files by which its age is known. */
const sources = ['src', 'renderer', 'assets/coastline', 'electron.config.ts', 'package-lock.json'];
const products = ['dist/main/main.js', 'dist/main/load-worker.js', 'dist/renderer/index.html'];

/** Why the build is to be made anew, in words, or undefined when it stands and is newer than all it is made from. */
export function findStaleness(projectFolder: string): string | undefined {
  const made = products.map((file) => join(projectFolder, file));
  if (!made.every((file) => existsSync(file))) return 'there is none yet';
  const builtMs = Math.min(...made.map((file) => statSync(file).mtimeMs));
  const changedMs = Math.max(...sources.map((source) => newestMs(join(projectFolder, source))));
  return changedMs > builtMs ? 'the sources are newer' : undefined;
}

/** Builds where that is due, after saying so. Throws an Error with the tool's own words when the build fails. */
export async function buildIfStale(projectFolder: string, say: (line: string) => void): Promise<void> {
  const staleness = findStaleness(projectFolder);
  if (staleness === undefined) return;
  say(`Building the window's files, since ${staleness} …`);
  const build = spawn(process.execPath, [join(projectFolder, '.config', 'build.ts')], {
    cwd: projectFolder,
    env: { ...process.env, NO_COLOR: '1' },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let told = '';
  for (const stream of [build.stdout, build.stderr]) {
    stream.on('data', (chunk) => {
      told += chunk;
    });
  }
  const [code] = await once(build, 'close');
  if (code !== 0) throw new Error(`the build failed:\n${told}`);
}

/** When the newest file of a file or folder was last changed, ms since 1970; 0 where there is none. */
function newestMs(path: string): number {
  const found = statSync(path, { throwIfNoEntry: false });
  if (found === undefined) return 0;
  if (!found.isDirectory()) return found.mtimeMs;
  const entries = readdirSync(path, { withFileTypes: true, recursive: true });
  return Math.max(found.mtimeMs, ...entries.map((entry) => statSync(join(entry.parentPath, entry.name)).mtimeMs));
}
