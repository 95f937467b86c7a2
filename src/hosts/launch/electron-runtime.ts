import { existsSync, readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';

/** The folder of the electron package, which holds the runtime once that is fetched; undefined where it is not installed. */
export function findElectronPackage(): string | undefined {
  try {
    // Never require('electron') itself: without its runtime it begins to download.
    return dirname(createRequire(import.meta.url).resolve('electron/package.json'));
  } catch {
    return undefined;
  }
}

/**
 * The path of the Electron program on this machine, or undefined where its runtime is not there. A folder named by
 * ELECTRON_OVERRIDE_DIST_PATH comes first, as in Electron's own index.js.
 */
export function findElectronProgram(
  packageFolder: string,
  variables: Record<string, string | undefined> = process.env,
): string | undefined {
  const pathFile = join(packageFolder, 'path.txt');
  const program = existsSync(pathFile) ? readFileSync(pathFile, 'utf8') : undefined;
  const chosen = variables.ELECTRON_OVERRIDE_DIST_PATH;
  const path = chosen ? join(chosen, program ?? 'electron') : findOwnProgram(packageFolder, program);
  return path !== undefined && existsSync(path) ? path : undefined;
}

function findOwnProgram(packageFolder: string, program: string | undefined): string | undefined {
  // The package's script writes path.txt once all is unpacked.
  if (program === undefined || !existsSync(join(packageFolder, 'dist', 'version'))) return undefined;
  return join(packageFolder, 'dist', program);
}
