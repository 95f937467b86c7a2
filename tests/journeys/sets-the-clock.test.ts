import type { Locator } from '@playwright/test';
import { expect, test } from './harness/application.ts';
import { drawSwathFile } from './harness/drawn-swath.ts';
import { corner, openFiles, setScene, stormRows } from './harness/scene.ts';

const earlier = { ...corner, timeMs: corner.timeMs - 5 * 3_600_000 };

test.beforeEach(async ({ page }) => {
  await openFiles(page, [
    { name: 'storm.bufr', buffer: drawSwathFile(stormRows, corner) },
    { name: 'earlier.bufr', buffer: drawSwathFile(stormRows, earlier) },
  ]);
  await setScene(page, {});
});

test('counts ages and the window from the clock that is typed in', async ({ page }) => {
  const now = page.getByLabel('Now (UTC)');
  await now.fill('2031-03-02 08:30');
  await now.press('Enter');
  await expect(page.locator('.watch-sentence')).toContainText('2 h 30 min ago');
  await now.fill('tomorrow');
  await now.press('Enter');
  await expect(page.locator('.watch-sentence')).toContainText('2 h 30 min ago');
});

test('steps from pass to pass, and back to the system clock', async ({ page }) => {
  const now = page.getByLabel('Now (UTC)');
  await page.getByRole('button', { name: '‹ earlier pass' }).click();
  await expect(now).toHaveValue('2031-03-02 06:01');
  await page.getByRole('button', { name: '‹ earlier pass' }).click();
  await expect(now).toHaveValue('2031-03-02 01:01');
  await expect(page.getByRole('button', { name: '‹ earlier pass' })).toBeDisabled();
  await page.getByRole('button', { name: 'newest pass', exact: true }).click();
  await expect(now).toHaveValue('2031-03-02 06:01');
  await page.getByRole('button', { name: 'system clock' }).click();
  await expect(now).toHaveValue(new RegExp(`^${new Date().getUTCFullYear()}`));
});

test('turns by the keys and by dragging: a quarter round is three hours', async ({ page }) => {
  const now = page.getByLabel('Now (UTC)');
  await page.getByRole('spinbutton', { name: /^Now/ }).press('ArrowLeft');
  await expect(now).toHaveValue('2031-03-02 06:50');
  const dial = await boxAtRest(page.locator('.dial'));
  const [x, y] = [dial.x + dial.width / 2, dial.y + dial.height / 2];
  // From nine o'clock, which is three hours ago, up to now: clockwise, so time goes back.
  await page.mouse.move(x - 30, y);
  await page.mouse.down();
  for (let step = 1; step <= 18; step++) {
    const angle = (step * 5 * Math.PI) / 180;
    await page.mouse.move(x - 30 * Math.cos(angle), y - 30 * Math.sin(angle));
  }
  await page.mouse.up();
  await expect(now).toHaveValue('2031-03-02 03:50');
});

test('says a shorter window in the watch line, and shows by the dial how far it reaches', async ({ page }) => {
  await page.getByRole('radio', { name: '3 h' }).check();
  await expect(page.locator('.watch-sentence')).toContainText('in the last 3 hours');
  await expect(page.locator('.pass').filter({ hasText: 'earlier.bufr' })).toContainText('outside the time window');
  await expect(page.getByRole('spinbutton', { name: /^How far back/ })).toHaveAttribute('aria-valuetext', '3 h');
});

/** Where an element stands once it keeps still: the watch line above the dial may grow by a line when it is read anew. */
async function boxAtRest(element: Locator): Promise<{ x: number; y: number; width: number; height: number }> {
  let last = '';
  await expect
    .poll(
      async () => {
        const before = last;
        last = JSON.stringify(await element.boundingBox());
        return last !== 'null' && last === before;
      },
      { intervals: [1500] },
    )
    .toBe(true);
  return JSON.parse(last);
}
