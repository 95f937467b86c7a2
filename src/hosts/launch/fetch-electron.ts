import { type ChildProcess, spawn } from 'node:child_process';
import { mkdirSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/** A try without progress for this long is given up, ms. */
const PATIENCE_MS = 20_000;
const LOOK_EVERY_MS = 500;

/** One try to fetch the Electron runtime. */
interface FetchTry {
  packageFolder: string;
  cacheFolder: string;
  /** Asked for by name: then an earlier failure does not count. */
  isAsked: boolean;
  /** Ends the try. */
  signal: AbortSignal;
  say: (line: string) => void;
  variables?: Record<string, string | undefined>;
  patienceMs?: number;
}

/**
 * Fetches the Electron runtime by the package's own script, which checks what it got against its list of sums. Resolves
 * with undefined once it is there, else with the reason in words: it is not to be fetched here, an earlier try failed,
 * or this one did. Never outlasts the patience without progress, and never tries the same version twice unasked.
 */
export async function fetchElectron(wanted: FetchTry): Promise<string | undefined> {
  const { variables = process.env, patienceMs = PATIENCE_MS } = wanted;
  const isTest = variables.CI || variables.NODE_ENV === 'test' || variables.CROSSTRACK_NO_FETCH;
  if (isTest) return 'nothing is fetched in tests';
  const memory = join(wanted.cacheFolder, 'electron-tried.json');
  const version = readVersion(wanted.packageFolder);
  if (!wanted.isAsked && readTried(memory) === version) return 'an earlier try to fetch it failed';
  wanted.say('Fetching the Electron runtime, once …');
  mkdirSync(wanted.cacheFolder, { recursive: true });
  writeFileSync(memory, JSON.stringify({ version, triedAtMs: Date.now() }));
  const failure = await tryOnce(wanted, patienceMs, variables);
  if (failure === undefined) rmSync(memory);
  return failure;
}

async function tryOnce(
  { packageFolder, cacheFolder, signal }: FetchTry,
  patienceMs: number,
  variables: Record<string, string | undefined>,
): Promise<string | undefined> {
  // The script downloads into the temporary folder: one of our own shows how far it has come.
  const downloads = join(cacheFolder, 'electron-download');
  mkdirSync(downloads, { recursive: true });
  const script = spawn(process.execPath, [join(packageFolder, 'install.js')], {
    env: { ...variables, TMPDIR: downloads, TEMP: downloads, TMP: downloads },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  try {
    return await watch(script, [downloads, join(packageFolder, 'dist')], patienceMs, signal);
  } finally {
    script.kill('SIGKILL');
    rmSync(downloads, { recursive: true, force: true });
  }
}

function watch(
  script: ChildProcess,
  folders: string[],
  patienceMs: number,
  signal: AbortSignal,
): Promise<string | undefined> {
  return new Promise((resolve) => {
    let told = '';
    let progressMs = Date.now();
    let bytes = 0;
    const timer = setInterval(() => {
      const now = folders.reduce((sum, folder) => sum + measureFolder(folder), told.length);
      if (now !== bytes) progressMs = Date.now();
      bytes = now;
      if (Date.now() - progressMs >= patienceMs) end(`no progress for ${Math.round(patienceMs / 1000)} s`);
    }, LOOK_EVERY_MS);
    const end = (failure: string | undefined) => {
      clearInterval(timer);
      resolve(failure);
    };
    for (const stream of [script.stdout, script.stderr]) {
      stream?.on('data', (chunk) => {
        told += chunk;
      });
    }
    signal.addEventListener('abort', () => end('stopped'), { once: true });
    script.on('error', (error) => end(error.message));
    script.on('close', (code) => end(code === 0 ? undefined : (told.match(/.*Error.*/)?.[0].trim() ?? `exit ${code}`)));
  });
}

/** Bytes in a folder and below; 0 while it is not there, or while it changes under our eyes. */
function measureFolder(folder: string): number {
  try {
    const files = readdirSync(folder, { withFileTypes: true, recursive: true }).filter((entry) => entry.isFile());
    return files.reduce((sum, file) => sum + statSync(join(file.parentPath, file.name)).size, 0);
  } catch {
    return 0;
  }
}

function readVersion(packageFolder: string): string {
  return JSON.parse(readFileSync(join(packageFolder, 'package.json'), 'utf8')).version;
}

function readTried(memory: string): string | undefined {
  try {
    return JSON.parse(readFileSync(memory, 'utf8')).version;
  } catch {
    return undefined;
  }
}
