/**
 * Makes the README's pictures of the demonstration into assets/pictures: `npm run pictures`. The real application on an
 * archive of its own, in the Chromium that the journeys drive, 1440 x 900.
 */
import { mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { chromium, type Page } from '@playwright/test';
import { chromiumFlags, findChromium } from '../../.config/find-chromium.ts';
import { startHost } from '../journeys/harness/application.ts';
import { shot } from './settled-shot.ts';

const pictures = fileURLToPath(new URL('../../assets/pictures/', import.meta.url));
const folder = mkdtempSync(join(tmpdir(), 'crosstrack-pictures-'));
const executablePath = findChromium();
if (executablePath === undefined)
  throw new Error('No Chromium was found: npm test installs one where that can be done.');

mkdirSync(pictures, { recursive: true });
const host = await startHost(join(folder, 'archive.db'), true);
const browser = await chromium.launch({ executablePath, args: [...chromiumFlags] });
const page = await browser.newPage({ viewport: { width: 1440, height: 900 }, timezoneId: 'UTC', locale: 'en-GB' });
await page.goto(host.url);
await page.locator('.pass').nth(2).waitFor();
await shot(page, join(pictures, 'opening-chart.png'));
await comeCloser(page);
await shot(page, join(pictures, 'storm-close-up.png'));
await page.locator('.watch-sentence').getByRole('button', { name: / kt$/ }).click();
await shot(page, join(pictures, 'cell-card.png'));
await browser.close();
await host.stop();
rmSync(folder, { recursive: true });

/** Turns the wheel over the storm's centre. */
async function comeCloser(page: Page): Promise<void> {
  const chart = await page.locator('#chart').boundingBox();
  if (!chart) throw new Error('the chart is not on the page');
  await page.mouse.move(chart.x + chart.width * 0.48, chart.y + chart.height * 0.48);
  for (let turn = 0; turn < 6; turn++) {
    await page.mouse.wheel(0, -160);
    await page.waitForTimeout(400);
  }
}
