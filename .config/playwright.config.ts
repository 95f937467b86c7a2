import { fileURLToPath } from 'node:url';
import { defineConfig } from '@playwright/test';
import { findElectronPackage, findElectronProgram } from '../src/hosts/launch/electron-runtime.ts';
import type { JourneyOptions } from '../tests/journeys/harness/application.ts';
import { chromiumFlags, findChromium } from './find-chromium.ts';

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url));
const packageFolder = findElectronPackage();
const electronProgram = packageFolder && findElectronProgram(packageFolder);
const executablePath = findChromium();
if (executablePath === undefined)
  throw new Error('No Chromium was found; npm test installs one where that can be done.');

export default defineConfig<JourneyOptions>({
  testDir: here('../tests/journeys'),
  outputDir: here('../test-results/journeys'),
  forbidOnly: Boolean(process.env.CI),
  retries: 0,
  workers: 1,
  timeout: 120_000,
  expect: { timeout: 30_000 },
  reporter: [['list'], ['json', { outputFile: here('../test-results/journeys.json') }]],
  use: {
    viewport: { width: 1280, height: 800 },
    // Far from UTC: a time shown in the machine's own zone would be seen at once.
    timezoneId: 'Pacific/Auckland',
    locale: 'en-GB',
    launchOptions: { executablePath, args: [...chromiumFlags] },
  },
  projects: [
    { name: 'loopback', use: { host: 'loopback' } },
    ...(electronProgram
      ? [{ name: 'electron', testIgnore: '**/loopback/**', use: { host: 'electron' as const, electronProgram } }]
      : []),
  ],
});
