import type { Page } from '@playwright/test';
import { expect, test } from './harness/application.ts';
import { drawSwathFile, placeOf } from './harness/drawn-swath.ts';
import { corner, openFiles, screenPoint, setScene, stormRows } from './harness/scene.ts';

const card = (page: Page) => page.locator('.card');

/** Close enough that every cell has its own barb. */
const close = { ...placeOf(corner, 5, 13), zoom: 6.6, bearing: 0 };

async function clickCell(page: Page, row: number, column: number): Promise<void> {
  const { x, y } = await screenPoint(page, placeOf(corner, row, column), close);
  await page.mouse.click(x, y);
}

test.beforeEach(async ({ page }) => {
  await openFiles(page, [{ name: 'storm.bufr', buffer: drawSwathFile(stormRows, corner) }]);
  await setScene(page, { camera: close });
  await expect(page.locator('#chart-place')).toHaveAttribute('aria-label', /strongest 54 kt/);
});

test('tells all of the cell that was clicked, and does not cover it', async ({ page }) => {
  await clickCell(page, 5, 7);
  for (const text of [
    '54 kt',
    'Storm, Beaufort 10',
    '28.0 m/s from 270° west',
    '2031-03-02 06:00:16 UTC, 1 h ago',
    'none set; rain was perhaps never checked',
    '54 kt (28.0 m/s) from 090° east, 25 % likely',
    '54 kt (28.0 m/s) from 270° west, 75 % likely chosen',
    'storm.bufr, row 5, cell 7',
    'Above about 25 m/s such a speed is uncertain',
    'Not for navigation.',
  ]) {
    await expect(card(page)).toContainText(text);
  }
  const box = await card(page).boundingBox();
  const { x } = await screenPoint(page, placeOf(corner, 5, 7), close);
  expect(box && (x < box.x || x > box.x + box.width)).toBe(true);
  await page.keyboard.press('Escape');
  await expect(card(page)).toBeHidden();
});

test('names the flags of a cell in words', async ({ page }) => {
  await clickCell(page, 7, 6);
  await expect(card(page)).toContainText('land in the cell; rain was perhaps never checked');
  await expect(card(page)).toContainText('Land lies in this cell');
});

test('says of water without a wind that it was looked at and is not calm', async ({ page }) => {
  await clickCell(page, 6, 22);
  await expect(card(page)).toContainText('Looked at, but no wind');
  await expect(card(page)).toContainText('Not calm');
});

test('has no card for water nobody looked at', async ({ page }) => {
  await clickCell(page, 5, 7);
  await expect(card(page)).toBeVisible();
  await clickCell(page, 5, 13);
  await expect(card(page)).toBeHidden();
});

test('goes from cell to cell by buttons, and from the watch line to the strongest', async ({ page }) => {
  await page.locator('.watch-sentence').getByRole('button', { name: '54 kt' }).click();
  await expect(card(page)).toContainText('Storm, Beaufort 10');
  const from = await card(page).locator('dd').last().textContent();
  await card(page).getByRole('button', { name: 'cell before' }).click();
  await expect(card(page).locator('dd').last()).not.toHaveText(from ?? '');
});
