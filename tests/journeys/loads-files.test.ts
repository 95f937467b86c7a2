import { readFileSync } from 'node:fs';
import type { Page } from '@playwright/test';
import { expect, test } from './harness/application.ts';
import { drawSwathFile } from './harness/drawn-swath.ts';
import { corner, galeWinds, openFiles, stormRows } from './harness/scene.ts';

const storm = { name: 'storm.bufr', buffer: drawSwathFile(stormRows, corner) };

/** Lets go of files over the middle of the window, as the desktop would. */
async function dropFiles(page: Page, files: { name: string; buffer: Buffer }[]): Promise<void> {
  const given = files.map(({ name, buffer }) => ({ name, bytes: [...buffer] }));
  const dropped = await page.evaluateHandle((list) => {
    const transfer = new DataTransfer();
    for (const { name, bytes } of list) transfer.items.add(new File([new Uint8Array(bytes)], name));
    return transfer;
  }, given);
  await page.dispatchEvent('#chart', 'drop', { dataTransfer: dropped });
}

test('says that nothing is loaded, and nobody looked, before the first file', async ({ page }) => {
  await expect(page.getByText('Nothing is loaded.')).toBeVisible();
  await expect(page.locator('.watch-sentence')).toContainText('Nobody looked at this view');
});

test('loads an old pass, offers to stand at it, and says what was seen', async ({ page }) => {
  await openFiles(page, [storm]);
  await expect(page.getByText('storm.bufr: loaded')).toBeVisible();
  const notice = page.locator('.notice').filter({ hasText: 'No pass lies in the time window' });
  await notice.getByRole('button', { name: 'Stand at the newest pass' }).click();
  await expect(notice).toBeHidden();
  await page.locator('.pass-choose').click();
  // 28 m/s is 54 kt (28 x 3600 / 1852 = 54.4), Beaufort 10.
  await expect(page.locator('.watch-sentence')).toContainText('storm was seen: strongest 54 kt from the west');
  await expect(page.locator('.watch-sentence')).toContainText('No wind of gale or more is hidden');
  await expect(page.locator('.pass')).toContainText('2031-03-02 06:00 to 06:00 UTC');
  await expect(page.locator('.pass')).toContainText('C band, fan-beam');
  await expect(page.locator('.pass')).toContainText(`${galeWinds} of gale or more`);
});

test('says of a pass loaded into another time that it is not drawn, and offers to stand at it', async ({ page }) => {
  await openFiles(page, [storm]);
  await page.getByRole('button', { name: 'Stand at the newest pass' }).click();
  const years = { ...corner, timeMs: corner.timeMs - 4 * 365 * 86_400_000 };
  await openFiles(page, [{ name: 'older.bufr', buffer: drawSwathFile(stormRows, years) }]);
  const notice = page.locator('.notice').filter({ hasText: 'older.bufr is outside the time window and not drawn' });
  await notice.getByRole('button', { name: 'Stand at it' }).click();
  await expect(page.getByLabel('Now (UTC)')).toHaveValue('2027-03-03 06:01');
  await expect(notice).toBeHidden();
});

test('says of a file given twice that it is already there', async ({ page }) => {
  await openFiles(page, [storm]);
  await openFiles(page, [{ ...storm, name: 'the same again.bufr' }]);
  await expect(page.getByText('the same again.bufr: already there')).toBeVisible();
  await expect(page.locator('.pass')).toHaveCount(1);
});

test('tells why a file that was dropped is refused, and where it breaks', async ({ page }) => {
  const cut = storm.buffer.subarray(0, storm.buffer.length - 40);
  const text = readFileSync(new URL(import.meta.url));
  await dropFiles(page, [
    { name: 'cut.bufr', buffer: cut },
    { name: 'notes.txt', buffer: text },
  ]);
  const fateOf = (name: string) => page.locator('.fate').filter({ hasText: `${name}: refused` });
  await expect(fateOf('notes.txt')).toContainText('no format known');
  await expect(fateOf('cut.bufr')).toContainText(/message|byte/);
  await expect(page.locator('.pass')).toHaveCount(0);
});

test('removes a pass only after asking', async ({ page }) => {
  await openFiles(page, [storm]);
  const pass = page.locator('.pass');
  await pass.getByRole('button', { name: 'Remove' }).click();
  await pass.getByRole('button', { name: 'Keep it' }).click();
  await expect(pass).toHaveCount(1);
  await pass.getByRole('button', { name: 'Remove' }).click();
  await pass.getByRole('button', { name: 'Remove it' }).click();
  await expect(pass).toHaveCount(0);
});
