import type { Page } from '@playwright/test';
import { expect, test } from './harness/application.ts';
import { drawSwathFile } from './harness/drawn-swath.ts';
import { corner, galeWinds, galeWindsOnLand, openFiles, setScene, stormRows } from './harness/scene.ts';

const sentence = (page: Page) => page.locator('.watch-sentence');
const chart = (page: Page) => page.locator('#chart-place');

test.beforeEach(async ({ page }) => {
  await openFiles(page, [{ name: 'storm.bufr', buffer: drawSwathFile(stormRows, corner) }]);
  await setScene(page, {});
  await expect(chart(page)).toHaveAttribute('aria-label', /strongest 54 kt/);
});

test('draws only the chosen Beaufort classes, and counts the gale winds that this hides', async ({ page }) => {
  await page.getByRole('button', { name: 'Storm and more' }).click();
  // 10 winds of 28 m/s stay; the other winds of gale are counted as hidden.
  await expect(sentence(page)).toContainText(`${galeWinds - 10} winds of gale or more are hidden`);
  await page.getByRole('checkbox', { name: 'Show Beaufort 10, storm' }).uncheck();
  await expect(chart(page)).toHaveAttribute('aria-label', 'Chart: no wind drawn in view');
  await expect(sentence(page)).toContainText(`${galeWinds} winds of gale or more are hidden`);
  await expect(sentence(page)).toContainText('It is hidden by your switches');
});

test('leaves classes below gale out of the hidden count', async ({ page }) => {
  await page.getByRole('button', { name: 'Gale and more', exact: true }).click();
  await expect(page.getByRole('button', { name: 'Gale and more', exact: true })).toHaveAttribute(
    'aria-pressed',
    'true',
  );
  await expect(sentence(page)).toContainText('No wind of gale or more is hidden');
  await expect(chart(page)).toHaveAttribute('aria-label', /strongest 54 kt/);
});

test('counts what a doubt switch hides, and shows all again at one press', async ({ page }) => {
  await page.getByRole('checkbox', { name: 'Land in the cell' }).uncheck();
  await expect(sentence(page)).toContainText(`${galeWindsOnLand} winds of gale or more are hidden`);
  await page.getByRole('checkbox', { name: 'Rain detected' }).uncheck();
  await expect(sentence(page)).toContainText(`${galeWindsOnLand} winds of gale or more are hidden`);
  await page.getByRole('button', { name: 'Show them' }).click();
  await expect(sentence(page)).toContainText('No wind of gale or more is hidden');
  await expect(page.getByRole('checkbox', { name: 'Land in the cell' })).toBeChecked();
});

test('counts the winds of a hidden pass', async ({ page }) => {
  await page.locator('.pass').getByRole('checkbox', { name: 'on the chart' }).uncheck();
  await expect(sentence(page)).toContainText(`${galeWinds} winds of gale or more are hidden`);
  await expect(chart(page)).toHaveAttribute('aria-label', 'Chart: no wind drawn in view');
});

test('says speeds in metres per second everywhere when asked to', async ({ page }) => {
  await page.getByRole('radio', { name: 'm/s' }).check();
  await expect(sentence(page)).toContainText('strongest 28.0 m/s');
  await expect(page.locator('.pass-strongest')).toHaveText('strongest 28.0 m/s, storm');
  // 33.5 kt x 1852 / 3600 = 17.23 m/s.
  await expect(page.getByRole('row', { name: /gale/ }).nth(1)).toContainText('from 17.23');
});
