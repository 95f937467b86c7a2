import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { readBufrSwaths } from '../../src/decode/products/bufr-winds/read-bufr-swaths.ts';
import { makeBenchmarkOrbit } from '../../src/demo/benchmark-orbit.ts';
import { encodeFanBeamBufr } from '../../src/demo/encode-fan-beam-bufr.ts';

const CELLS = 68_544;
const WARM_UPS = 15;
const TRIES = 21;

/**
 * Times of reading the same orbit of 3 12 061: the whole of it into the swath model, beams and solutions too, against
 * ecCodes unpacking it and reading nine arrays. Medians, after warming up, without the start of either process.
 */
export async function benchBufr(): Promise<{ name: string; oursMs: number; rivalMs: number; atLeast: number }[]> {
  const bytes = encodeFanBeamBufr(makeBenchmarkOrbit(), { platformCode: 904, hasHeadings: true });
  for (let n = 0; n < WARM_UPS; n++) timeOurs(bytes);
  const oursMs = median(Array.from({ length: TRIES }, () => timeOurs(bytes)));
  const rivalMs = timeRival(bytes);
  return [
    { name: 'read an orbit of BUFR: all into the swath model / ecCodes, nine arrays', oursMs, rivalMs, atLeast: 3 },
  ];
}

function timeOurs(bytes: Uint8Array): number {
  const startMs = performance.now();
  const { swaths } = readBufrSwaths(bytes, 'orbit.bufr');
  const tookMs = performance.now() - startMs;
  if (swaths[0].state.length !== CELLS) throw new Error('the orbit was not read whole');
  return tookMs;
}

/** ecCodes in Debian's Python, which times itself and prints its tries, a JSON list of milliseconds. */
function timeRival(bytes: Uint8Array): number {
  const folder = mkdtempSync(join(tmpdir(), 'crosstrack-bench-'));
  const path = join(folder, 'orbit.bufr');
  writeFileSync(path, bytes);
  const script = fileURLToPath(new URL('read-nine-arrays.py', import.meta.url));
  const rival = spawnSync('/usr/bin/python3', [script, path, String(CELLS)], { encoding: 'utf8' });
  rmSync(folder, { recursive: true });
  if (rival.status !== 0) throw new Error(`ecCodes for Python (python3-eccodes) did not run: ${rival.stderr}`);
  return median(JSON.parse(rival.stdout));
}

function median(values: number[]): number {
  return values.sort((a, b) => a - b)[Math.floor(values.length / 2)];
}
