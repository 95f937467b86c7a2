import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { chromium, type Page } from '@playwright/test';
import { build, preview } from 'vite';
import { chromiumFlags, findChromium } from '../../.config/find-chromium.ts';
import type { Subject, timeFrames } from './frame-page/page.ts';

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
const NET_TRIES = 5;
const FRAME_TRIES = 21;

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
  const comparisons: Comparison[] = [];
  for (const cells of COUNTS) {
    const [emptyMs, oursMs, rivalMs] = await time(tab, NET_TRIES, [
      { draws: 'nothing', cells },
      { draws: 'barbs', cells },
      { draws: 'symbols', cells },
    ]);
    const name = `draw ${cells} barbs, net of the map / symbol layer`;
    comparisons.push({ name, oursMs: oursMs - emptyMs, rivalMs: rivalMs - emptyMs, atLeast: 4 });
  }
  comparisons.push(await compareMost(tab));
  for (const cells of [...COUNTS, MOST_CELLS]) {
    const [rivalMs, oursMs] = await time(tab, FRAME_TRIES, [
      { draws: 'nothing', cells },
      { draws: 'chart', cells },
    ]);
    const name = `a frame of the thinned chart of ${cells} cells, panned / the empty map`;
    comparisons.push({ name, oursMs, rivalMs, atMost: 1.5 });
  }
  return comparisons;
}

/** There is no rival where the symbol layer fails, so ours is held to its own pace with fewer. */
async function compareMost(tab: Page): Promise<Comparison> {
  const fewer = COUNTS[COUNTS.length - 1];
  const [emptyMs, mostMs, fewerMs] = await time(tab, NET_TRIES, [
    { draws: 'nothing', cells: 0 },
    { draws: 'barbs', cells: MOST_CELLS },
    { draws: 'barbs', cells: fewer },
  ]);
  return {
    name: `draw ${MOST_CELLS} barbs, where the symbol layer fails / ours of ${fewer}, per barb`,
    oursMs: mostMs - emptyMs,
    rivalMs: ((fewerMs - emptyMs) * MOST_CELLS) / fewer,
    atMost: 1.5,
  };
}

async function time(tab: Page, tries: number, subjects: Subject[]): Promise<number[]> {
  const isPanning = subjects.some(({ draws }) => draws === 'chart');
  return tab.evaluate(
    ([given, count, panning]) =>
      (window as unknown as { timeFrames: typeof timeFrames }).timeFrames(given, count, panning),
    [subjects, tries, isPanning] as const,
  );
}

function here(path: string): string {
  return fileURLToPath(new URL(path, import.meta.url));
}
