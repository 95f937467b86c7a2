import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { readCfSwaths } from '../../src/decode/products/cf-swath/read-cf-swaths.ts';
import { makeBenchmarkOrbit } from '../../src/demo/benchmark-orbit.ts';
import { encodeCfSwath } from '../../src/demo/encode-cf-swath.ts';

const CELLS = 68_544;
const WARM_UPS = 40;
const TRIES = 41;
const RIVAL_TRIES = 9;

/** Every array that our reader takes from the file. */
const ARRAYS = [
  ...['time', 'lat', 'lon', 'model_speed', 'model_dir', 'ice_prob'],
  ...['wvc_quality_flag', 'wind_speed', 'wind_dir'],
];

/**
 * Times of reading the same netCDF orbit: into the swath model, in a process that has read others before, as the app
 * has; against the netCDF C library reading the same arrays through Python, each time in a fresh process as a script
 * does, without its start. (A Python process that reads the same file again and again reuses its memory and takes a
 * fifth of that.) Medians.
 */
export async function benchNetcdf(): Promise<{ name: string; oursMs: number; rivalMs: number; atLeast: number }[]> {
  const bytes = encodeCfSwath(makeBenchmarkOrbit());
  const folder = mkdtempSync(join(tmpdir(), 'crosstrack-bench-'));
  const path = join(folder, 'orbit.nc');
  writeFileSync(path, bytes);
  try {
    const rivalMs = median(Array.from({ length: RIVAL_TRIES }, () => timeRival(path)));
    for (let n = 0; n < WARM_UPS; n++) timeOurs(bytes);
    const oursMs = median(Array.from({ length: TRIES }, () => timeOurs(bytes)));
    return [
      {
        name: 'read an orbit of netCDF: into the swath model / netCDF C library through Python, same arrays',
        oursMs,
        rivalMs,
        atLeast: 3,
      },
    ];
  } finally {
    rmSync(folder, { recursive: true });
  }
}

function timeOurs(bytes: Uint8Array): number {
  const startMs = performance.now();
  const { swaths } = readCfSwaths(bytes, 'orbit.nc');
  const tookMs = performance.now() - startMs;
  if (swaths[0].state.length !== CELLS) throw new Error('the orbit was not read whole');
  return tookMs;
}

/** The netCDF C library in Debian's Python, which times itself and prints milliseconds. */
function timeRival(path: string): number {
  const script = fileURLToPath(new URL('read-orbit.py', import.meta.url));
  const rival = spawnSync('/usr/bin/python3', [script, path, String(CELLS), ...ARRAYS], { encoding: 'utf8' });
  if (rival.status !== 0) throw new Error(`netCDF for Python (python3-netcdf4) did not run: ${rival.stderr}`);
  return Number(rival.stdout);
}

function median(values: number[]): number {
  return values.sort((a, b) => a - b)[Math.floor(values.length / 2)];
}
