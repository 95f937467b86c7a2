import { lights } from '../../renderer/state/lights.ts';
import { expect, test } from './harness/application.ts';
import { drawSwathFile, placeOf } from './harness/drawn-swath.ts';
import { shareOfColour } from './harness/pixels.ts';
import { corner, openFiles, screenPoint, setScene, stormRows, watchMs } from './harness/scene.ts';

test.beforeEach(async ({ page }) => {
  await openFiles(page, [{ name: 'storm.bufr', buffer: drawSwathFile(stormRows, corner) }]);
});

for (const light of ['day', 'dusk', 'night'] as const) {
  test(`shades water nobody looked at by ${light}, and leaves seen water clean`, async ({ page }) => {
    await setScene(page, { light });
    await expect(page.locator('#chart-place')).toHaveAttribute('aria-label', /strongest 54 kt/);
    const { unseen, sea } = lights[light];
    const gap = await screenPoint(page, placeOf(corner, 5, 13.5));
    const seen = await screenPoint(page, placeOf(corner, 4, 22));
    await expect.poll(() => shareOfColour(page, gap, 30, unseen)).toBeGreaterThan(0.5);
    // What is neither is the hatching, whose fine lines blend into their ground, here and there to the very shade of the sea.
    expect(await shareOfColour(page, gap, 30, unseen)).toBeLessThan(0.95);
    expect(await shareOfColour(page, gap, 30, sea)).toBeLessThan(0.15);
    expect(await shareOfColour(page, seen, 60, sea)).toBeGreaterThan(0.5);
    expect(await shareOfColour(page, seen, 60, unseen)).toBeLessThan(0.02);
  });
}

test('shades water again once the window no longer reaches the pass', async ({ page }) => {
  await setScene(page, {});
  const { unseen, sea } = lights.day;
  const seen = await screenPoint(page, placeOf(corner, 2, 22));
  await expect.poll(() => shareOfColour(page, seen, 60, sea)).toBeGreaterThan(0.5);
  const now = page.getByLabel('Now (UTC)');
  await now.fill(new Date(watchMs + 24 * 3_600_000).toISOString().slice(0, 16).replace('T', ' '));
  await now.press('Enter');
  await expect(page.getByText('No pass lies in the time window.')).toBeVisible();
  await expect.poll(() => shareOfColour(page, seen, 60, unseen)).toBeGreaterThan(0.5);
});
