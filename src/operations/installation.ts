import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import type { DeskOptions } from './desk.ts';

/** What a desk needs beside its archive, where the program runs from its source tree. */
export function describeInstallation(): Omit<DeskOptions, 'archivePath'> {
  const manifest = readFileSync(new URL('../../package.json', import.meta.url), 'utf8');
  return {
    demoFolder: fileURLToPath(new URL('../../assets/demo/', import.meta.url)),
    coastlineFolder: fileURLToPath(new URL('../../assets/coastline/', import.meta.url)),
    workerUrl: new URL('../workers/load-worker.ts', import.meta.url),
    appVersion: JSON.parse(manifest).version,
  };
}
