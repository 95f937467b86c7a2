import type { Page } from '@playwright/test';

/** Takes a picture of the window once two in a row are the same: software drawing takes its time. */
export async function shot(page: Page, path: string): Promise<void> {
  await page.locator('.watch-line[aria-busy="false"]').waitFor();
  let last = await page.screenshot();
  for (let tries = 0; tries < 30; tries++) {
    await page.waitForTimeout(1_000);
    const next = await page.screenshot({ path });
    if (next.equals(last)) return;
    last = next;
  }
  throw new Error(`the window did not come to rest for ${path}`);
}
