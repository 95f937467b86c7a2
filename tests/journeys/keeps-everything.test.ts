import type { Page } from '@playwright/test';
import { expect, test } from './harness/application.ts';
import { drawSwathFile, placeOf } from './harness/drawn-swath.ts';
import { askHost, corner, openFiles, screenPoint, setScene, stormRows } from './harness/scene.ts';

const later = { ...corner, lat: corner.lat - 6, timeMs: corner.timeMs + 1_800_000 };

/** Draws a box of four corners round the strongest winds and keeps it under a name. */
async function drawArea(page: Page, name: string): Promise<void> {
  await page.getByRole('button', { name: /^Watch area/ }).click();
  await page.getByRole('button', { name: 'Draw an area' }).click();
  for (const [row, column] of [
    [3, 4],
    [3, 10],
    [8, 10],
    [8, 4],
  ]) {
    const { x, y } = await screenPoint(page, placeOf(corner, row, column));
    await page.mouse.click(x, y);
  }
  await page.keyboard.press('Enter');
  await page.getByLabel('Name of the area').fill(name);
  await page.getByRole('button', { name: 'Keep it' }).click();
}

test('finds everything still there after a reload and after a new start', async ({ page, application }) => {
  await openFiles(page, [
    { name: 'storm.bufr', buffer: drawSwathFile(stormRows, corner) },
    { name: 'later.bufr', buffer: drawSwathFile(stormRows, later) },
  ]);
  await setScene(page, {});
  await drawArea(page, 'Storm water');
  await expect(page.locator('.watch-sentence')).toContainText('‘Storm water’');

  await page.getByRole('radio', { name: 'Night' }).check();
  await page.getByRole('radio', { name: 'm/s' }).check();
  await page.getByRole('radio', { name: '24 h' }).check();
  await page.getByRole('button', { name: 'Gale and more', exact: true }).click();
  await page.getByRole('checkbox', { name: 'Land in the cell' }).uncheck();
  await page
    .locator('.pass')
    .filter({ hasText: 'later.bufr' })
    .getByRole('checkbox', { name: 'on the chart' })
    .uncheck();
  const before = await expectKept(page);

  await page.reload();
  expect(await expectKept(page)).toEqual(before);
  expect(await expectKept(await application.restart())).toEqual(before);
});

/** Holds what the window shows to what was set, and gives the settings the host keeps. */
async function expectKept(page: Page) {
  await expect(page.locator('.watch-sentence')).toContainText('‘Storm water’');
  await expect(page.locator('.watch-sentence')).toContainText('28.0 m/s');
  await expect(page.locator('.watch-sentence')).toContainText('in the last 24 hours');
  await expect(page.locator('html')).toHaveAttribute('data-light', 'night');
  await expect(page.getByRole('radio', { name: 'm/s' })).toBeChecked();
  await expect(page.getByLabel('Now (UTC)')).toHaveValue('2031-03-02 07:00');
  await expect(page.getByRole('checkbox', { name: 'Show Beaufort 7, near gale' })).not.toBeChecked();
  await expect(page.getByRole('checkbox', { name: 'Land in the cell' })).not.toBeChecked();
  const hidden = page.locator('.pass').filter({ hasText: 'later.bufr' });
  await expect(hidden.getByRole('checkbox', { name: 'on the chart' })).not.toBeChecked();
  await expect(page.locator('#chart-place')).toHaveAttribute('aria-label', /strongest 28.0 m\/s/);
  await page.waitForTimeout(1_000);
  const { settings } = await askHost(page, 'readSettings', {});
  return settings;
}
