/**
 * Writes assets/demo: the demonstration's three passes and its own clock and view. Run it from anywhere with Node 24:
 * node src/demo/make-demo.ts. The same files come out every time.
 */
import { readFileSync, writeFileSync } from 'node:fs';
import { encodeCfSwath } from './encode-cf-swath.ts';
import { encodeFanBeamBufr } from './encode-fan-beam-bufr.ts';
import { demonstrationTitle, demonstrationView, makeDemonstrationWatch } from './watch.ts';

const assets = new URL('../../assets/', import.meta.url);
const land = JSON.parse(readFileSync(new URL('coastline/land-10m.json', assets), 'utf8'));
const watch = makeDemonstrationWatch(land.coordinates);

/** Eight rows of 42 cells to a message, as in real files. */
const CELLS_PER_MESSAGE = 8 * 42;

function encodeFanBeam(swath: typeof watch.firstFanBeam): Uint8Array {
  return encodeFanBeamBufr(swath, { platformCode: swath.platformCode ?? 0, cellsPerMessage: CELLS_PER_MESSAGE });
}

const files = {
  'c-band-pass-1.bufr': encodeFanBeam(watch.firstFanBeam),
  'c-band-pass-2.bufr': encodeFanBeam(watch.secondFanBeam),
  'ku-band-pass.nc': encodeCfSwath(watch.pencilBeam, {}),
  'watch.json': `${JSON.stringify({ title: demonstrationTitle, nowMs: watch.nowMs, view: demonstrationView })}\n`,
};
for (const [name, content] of Object.entries(files)) writeFileSync(new URL(`demo/${name}`, assets), content);
