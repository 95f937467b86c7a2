import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { chromium, type Page } from '@playwright/test';
import { build, preview } from 'vite';
import { chromiumFlags, findChromium } from '../../.config/find-chromium.ts';
import type { FrameBench } from './frame-page/page.ts';

interface Comparison {
  name: string;
  oursMs: number;
  rivalMs: number;
  atLeast?: number;
  atMost?: number;
}

/** Cells of four orbits at 25 km, more than the symbol layer can take: its icons of one tile are counted in 16 bits. */
const MOST_CELLS = 270_000;
const COUNTS = [20_000, 100_000];

/**
 * Times of a frame in headless Chromium, redraw and read back: our barbs, none left out, against the map library's
 * symbol layer, both without the empty map's frame; and the thinned chart, water and barbs, against the empty map.
 */
export async function benchFrames(): Promise<Comparison[]> {
  const executablePath = findChromium();
  if (executablePath === undefined) throw new Error('no Chromium runs on this machine');
  const folder = mkdtempSync(join(tmpdir(), 'crosstrack-frames-'));
  const page = {
    root: here('frame-page'),
    publicDir: here('../../assets'),
    configFile: false,
    logLevel: 'error',
  } as const;
  await build({
    ...page,
    build: { outDir: folder, emptyOutDir: true, rolldownOptions: { input: here('frame-page/page.html') } },
  });
  const server = await preview({ ...page, build: { outDir: folder }, preview: { host: '127.0.0.1', port: 0 } });
  const browser = await chromium.launch({ executablePath, args: [...chromiumFlags] });
  try {
    const tab = await browser.newPage({ viewport: { width: 1280, height: 800 } });
    await tab.goto(new URL('page.html', server.resolvedUrls?.local[0]).href);
    return await compare(tab);
  } finally {
    await browser.close();
    await server.close();
    rmSync(folder, { recursive: true });
  }
}

async function compare(tab: Page): Promise<Comparison[]> {
  const emptyMs = await frameMs(tab, 'emptyMap');
  const comparisons: Comparison[] = [];
  let ourNetMs = NaN;
  for (const count of COUNTS) {
    ourNetMs = (await frameMs(tab, 'allBarbs', count)) - emptyMs;
    const rivalMs = (await frameMs(tab, 'allSymbols', count)) - emptyMs;
    comparisons.push({
      name: `draw ${count} barbs, net of the map / symbol layer`,
      oursMs: ourNetMs,
      rivalMs,
      atLeast: 4,
    });
  }
  const lastCount = COUNTS[COUNTS.length - 1];
  comparisons.push({
    name: `draw ${MOST_CELLS} barbs, where symbols fail / our ${lastCount}, as many times as there are more`,
    oursMs: (await frameMs(tab, 'allBarbs', MOST_CELLS)) - emptyMs,
    rivalMs: (ourNetMs * MOST_CELLS) / lastCount,
    atMost: 1.5,
  });
  for (const count of [...COUNTS, MOST_CELLS]) {
    const oursMs = await frameMs(tab, 'thinnedChart', count);
    comparisons.push({
      name: `a frame of the thinned chart of ${count} cells / the empty map`,
      oursMs,
      rivalMs: emptyMs,
      atMost: 1.5,
    });
  }
  return comparisons;
}

async function frameMs(tab: Page, what: keyof FrameBench, count = 0): Promise<number> {
  return tab.evaluate(([name, cells]) => (window as unknown as { bench: FrameBench }).bench[name](cells), [
    what,
    count,
  ] as const);
}

function here(path: string): string {
  return fileURLToPath(new URL(path, import.meta.url));
}
