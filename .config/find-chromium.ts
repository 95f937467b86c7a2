import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { chromium } from '@playwright/test';
import { findBrowser } from '../src/hosts/launch/browsers.ts';

/** The Chromium that journeys and benchmarks drive: the one found on this machine, else Playwright's own; undefined where none runs. */
export function findChromium(): string | undefined {
  return [findBrowser(), chromium.executablePath()].find(
    (path) => path !== undefined && existsSync(path) && runs(path),
  );
}

/** Software drawing where there is no graphics processor; no sandbox only for root, for whom it does not start otherwise. */
export const chromiumFlags: readonly string[] = [
  '--enable-unsafe-swiftshader',
  ...(process.getuid?.() === 0 ? ['--no-sandbox'] : []),
];

/** One that lacks a library ends at once with an error. */
function runs(path: string): boolean {
  const sandbox = process.getuid?.() === 0 ? ['--no-sandbox'] : [];
  return spawnSync(path, ['--version', ...sandbox], { stdio: 'ignore', timeout: 30_000 }).status === 0;
}
