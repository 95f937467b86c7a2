import type { Page } from '@playwright/test';
import type { OperationAnswer, OperationInput, OperationName } from '../../../src/contract/operations.ts';
import { TOKEN_HEADER } from '../../../src/contract/routes.ts';
import type { Settings } from '../../../src/contract/values.ts';
import { showEverything } from '../../../src/wind/switches.ts';
import { expect } from './application.ts';
import type { Corner } from './drawn-swath.ts';

/** A storm of invented winds across the date line, seen by one pass with a gap down its middle. */
export const corner: Corner = { lon: 178, lat: 38, timeMs: Date.UTC(2031, 2, 2, 6, 0) };
export const stormRows = [
  'ccccccccc........bbbbbbbbb',
  'cccbbbbbb........bbbbbbbbb',
  'bbbbbgggg........bbbbbbbbb',
  'bbbbggsss........bbbbbbbbb',
  'bbbbgssss........bbbobbbbb',
  'bbbbglsss........bboooobbb',
  'bbbbgllgg........bbboobbbb',
  'bbbbbgggg........bbbbbbbbb',
  'bbbbbbbbb........bbbbbbbbb',
];
/** How many of its winds are of gale or more, counted in the drawing: g and l of 20 m/s are 39 kt, s of 28 m/s 54 kt. */
export const galeWinds = 28;
/** Of these, with land in the cell. */
export const galeWindsOnLand = 3;

/** An hour after the pass. */
export const watchMs = corner.timeMs + 3_600_000;

/** A view of the whole storm. */
export const camera = { lon: -178.3, lat: 37, zoom: 6, bearing: 0 };

/** Asks the host as the page itself would. */
export function askHost<Name extends OperationName>(
  page: Page,
  name: Name,
  input: OperationInput<Name>,
): Promise<OperationAnswer<Name>> {
  return page.evaluate(
    async ([path, body, header]) => {
      const headers = { 'content-type': 'application/json', [header]: location.hash.slice(1) };
      const response = await fetch(path, { method: 'POST', headers, body });
      return (await response.json()).answer;
    },
    [`/ask/${name}`, JSON.stringify(input), TOKEN_HEADER],
  );
}

/** Opens files by the window's own button and waits until each has its fate. */
export async function openFiles(page: Page, files: { name: string; buffer: Buffer }[]): Promise<void> {
  const choosing = page.waitForEvent('filechooser');
  await page.getByRole('button', { name: 'Open files' }).click();
  const given = files.map((file) => ({ ...file, mimeType: 'application/octet-stream' }));
  await (await choosing).setFiles(given);
  for (const { name } of files) await expect(page.getByText(`${name}: `)).toBeVisible();
}

/** Leaves the window as if the user had set it so, and opens it again. */
export async function setScene(page: Page, parts: Partial<Settings>): Promise<void> {
  const settings: Settings = {
    camera,
    setClockMs: watchMs,
    windowHours: 12,
    switches: showEverything(),
    hiddenPassIds: [],
    speedUnit: 'knots',
    light: 'day',
    watchAreaId: null,
    ...parts,
  };
  // The page keeps its own settings as it goes; ours come after.
  const { origin, hash } = new URL(page.url());
  await page.goto(`${origin}/coastline/land-110m.json${hash}`);
  await askHost(page, 'keepSettings', { settings });
  await page.goto(`${origin}/${hash}`);
  await expect(page.locator('.watch-line')).toHaveAttribute('aria-busy', 'false');
}

/** Where a position lies on the screen while the chart looks straight from `view`. */
export async function screenPoint(
  page: Page,
  { lon, lat }: { lon: number; lat: number },
  view = camera,
): Promise<{ x: number; y: number }> {
  const box = await page.locator('#chart').boundingBox();
  if (!box) throw new Error('the chart is not on the page');
  // Web Mercator, 512 pixels round the earth at zoom 0 (MapLibre's convention).
  const worldPx = 512 * 2 ** view.zoom;
  const y = (degrees: number) => Math.log(Math.tan(Math.PI / 4 + (degrees * Math.PI) / 360)) / (2 * Math.PI);
  const east = ((((lon - view.lon + 180) % 360) + 360) % 360) - 180;
  return {
    x: box.x + box.width / 2 + (east / 360) * worldPx,
    y: box.y + box.height / 2 - (y(lat) - y(view.lat)) * worldPx,
  };
}
