import type { Page } from '@playwright/test';
import { lights } from '../../renderer/state/lights.ts';
import { expect, test } from './harness/application.ts';
import { drawSwathFile } from './harness/drawn-swath.ts';
import { shareOfColour } from './harness/pixels.ts';
import { openFiles, screenPoint, setScene, watchMs } from './harness/scene.ts';

// A wind from the west: its shaft runs west from its position, and its feathers lie to the left of the wind's motion in the
// north and to the right in the south (WMO-No. 485, appendix II-4). 39 kt is four barbs.
const place = (lat: number) => ({ lon: 179.9, lat, timeMs: watchMs - 3_600_000 });
const galeInk = lights.day.windInks[3];

/** How much gale ink lies about a spot so many pixels right of and below a position. */
async function inkAt(page: Page, lat: number, bearing: number, right: number, down: number): Promise<number> {
  const view = { lon: 180, lat, zoom: 7, bearing: 0 };
  const middle = await screenPoint(page, { lon: 180, lat }, view);
  const cell = await screenPoint(page, place(lat), view);
  // Turned with the map about the middle of the view.
  const turn = (-bearing * Math.PI) / 180;
  const [east, south] = [cell.x - middle.x, cell.y - middle.y];
  const x = middle.x + east * Math.cos(turn) - south * Math.sin(turn) + right;
  const y = middle.y + east * Math.sin(turn) + south * Math.cos(turn) + down;
  return shareOfColour(page, { x, y }, 10, galeInk);
}

async function showWind(page: Page, lat: number, bearing: number): Promise<void> {
  await openFiles(page, [{ name: 'wind.bufr', buffer: drawSwathFile(['g'], place(lat)) }]);
  await setScene(page, { camera: { lon: 180, lat, zoom: 7, bearing } });
  await expect(page.locator('#chart-place')).toHaveAttribute('aria-label', /strongest 39 kt/);
}

test('puts the feathers of a northern wind to the north of a west wind’s shaft', async ({ page }) => {
  await showWind(page, 50, 0);
  await expect.poll(() => inkAt(page, 50, 0, -20, -7)).toBeGreaterThan(0.05);
  expect(await inkAt(page, 50, 0, -20, 7)).toBe(0);
  expect(await inkAt(page, 50, 0, 10, 0)).toBe(0);
});

test('puts the feathers of a southern wind to the south of it', async ({ page }) => {
  await showWind(page, -50, 0);
  await expect.poll(() => inkAt(page, -50, 0, -20, 7)).toBeGreaterThan(0.05);
  expect(await inkAt(page, -50, 0, -20, -7)).toBe(0);
  expect(await inkAt(page, -50, 0, 10, 0)).toBe(0);
});

test('turns the barb with the map', async ({ page }) => {
  await showWind(page, 50, 90);
  // With east up, west is down and north is to the left.
  await expect.poll(() => inkAt(page, 50, 90, -7, 20)).toBeGreaterThan(0.05);
  expect(await inkAt(page, 50, 90, 7, 20)).toBe(0);
  expect(await inkAt(page, 50, 90, 0, -10)).toBe(0);
});
