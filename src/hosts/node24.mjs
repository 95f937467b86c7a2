import { spawn } from 'node:child_process';
import { createRequire } from 'node:module';
import { constants } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** Our sources are TypeScript that Node runs as it is, and the archive's library needs this version. */
const LEAST_MAJOR = 24;

/** What to say where no Node 24 is found. */
export const askForNode24 = `Crosstrack needs Node ${LEAST_MAJOR} and this is Node ${process.versions.node}: install Node ${LEAST_MAJOR} and try again.`;

/**
 * The path of a Node 24: this one, or the one that `npm ci` installed for this platform; null where there is none.
 * Plain JavaScript, because an older Node reads it.
 */
export function findNode24() {
  if (Number(process.versions.node.split('.')[0]) >= LEAST_MAJOR) return process.execPath;
  const platform = process.platform === 'win32' ? 'win' : process.platform;
  try {
    const folder = dirname(createRequire(import.meta.url).resolve(`node-${platform}-${process.arch}/package.json`));
    return join(folder, 'bin', process.platform === 'win32' ? 'node.exe' : 'node');
  } catch {
    return null;
  }
}

/**
 * Runs a file under Node 24 with this process's arguments: here, where this is one, else in a child that has the
 * terminal. Says what is missing and sets exit code 2 where there is none.
 */
export async function runUnderNode24(/** @type {URL} */ file) {
  const node = findNode24();
  if (node === process.execPath) {
    await import(file.href);
  } else if (node !== null) {
    await runChild(node, file);
  } else {
    process.stderr.write(`${askForNode24}\n`);
    process.exitCode = 2;
  }
}

function runChild(node, file) {
  const child = spawn(node, [fileURLToPath(file), ...process.argv.slice(2)], { stdio: 'inherit' });
  // A terminal sends its interrupt to both; any other signal comes to us alone. The child decides when to end.
  process.on('SIGINT', () => {});
  process.on('SIGTERM', () => child.kill('SIGTERM'));
  process.on('SIGHUP', () => child.kill('SIGHUP'));
  return new Promise((resolve, reject) => {
    child.on('error', reject);
    child.on('exit', (code, signal) => {
      process.exitCode = code ?? 128 + constants.signals[signal];
      resolve();
    });
  });
}
