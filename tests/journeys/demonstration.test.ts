import { expect, test } from './harness/application.ts';

test.use({ withDemonstration: true });

test('opens the demonstration at its own time and water, under a plain banner', async ({ page }) => {
  await expect(page.getByText('demonstration, invented data').first()).toBeVisible();
  await expect(page.getByLabel('Now (UTC)')).toHaveValue(/^2031-01-17/);
  await expect(page.locator('.pass')).toHaveCount(3);
  await expect(page.locator('.watch-sentence')).toContainText('storm was seen');
  await expect(page.locator('#chart-place')).toHaveAttribute('aria-label', /winds drawn in view/);
});

test('clears the demonstration with one press, and follows the system clock again', async ({ page, application }) => {
  await expect(page.locator('.pass')).toHaveCount(3);
  await page.getByRole('button', { name: 'Clear the demonstration' }).click();
  await expect(page.getByText('Nothing is loaded.')).toBeVisible();
  await expect(page.locator('.demonstration')).toBeHidden();
  await expect(page.getByLabel('Now (UTC)')).toHaveValue(new RegExp(`^${new Date().getUTCFullYear()}`));
  const again = await application.restart();
  await expect(again.getByText('Nothing is loaded.')).toBeVisible();
  await again.getByRole('button', { name: 'Load the demonstration' }).click();
  await expect(again.locator('.demonstration')).toBeVisible();
  await expect(again.getByLabel('Now (UTC)')).toHaveValue(/^2031-01-17/);
});

test('always shows the cautions in short, and all of them at a press', async ({ page }) => {
  await expect(page.locator('.foot-cautions')).toContainText('Blank water was not observed: it is not calm.');
  await page.getByRole('button', { name: 'All cautions' }).click();
  await expect(page.getByRole('dialog')).toContainText('Not for navigation');
  await page.keyboard.press('Escape');
  await expect(page.getByRole('dialog')).toBeHidden();
});

test('fits its window: only the column scrolls, never the page', async ({ page }) => {
  await expect(page.locator('.pass')).toHaveCount(3);
  const { page: pageHeight, window: windowHeight } = await page.evaluate(() => ({
    page: document.documentElement.scrollHeight,
    window: document.documentElement.clientHeight,
  }));
  expect(pageHeight).toBe(windowHeight);
});
