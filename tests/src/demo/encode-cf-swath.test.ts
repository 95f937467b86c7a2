import { expect, test } from 'vitest';
import { readNetcdfHeader } from '../../../src/decode/containers/netcdf-classic/read-netcdf-header.ts';
import { readVariable } from '../../../src/decode/containers/netcdf-classic/read-variable.ts';
import { readCfSwaths } from '../../../src/decode/products/cf-swath/read-cf-swaths.ts';
import { type CfSwathOptions, encodeCfSwath } from '../../../src/demo/encode-cf-swath.ts';
import { createBackground, createSwath, LOOKED_NO_WIND, type Swath, WIND } from '../../../src/swath/swath.ts';
import { flagBit, listFlags } from '../../../src/wind/flags.ts';

/** One row: a west wind, a north wind with flags on the other side of Greenwich, a cell over land, one never looked at. */
function makeSwath(): Swath {
  const swath = createSwath(1, 4);
  swath.state.set([WIND, WIND, LOOKED_NO_WIND]);
  swath.lon.set([-0.5, 0.5, 1.5]);
  swath.lat.set([-40, -40, -40]);
  swath.timeMs.fill(Date.UTC(2031, 0, 17, 6), 0, 3);
  swath.speedMs.set([17.2, 2.5]);
  swath.directionFrom.set([270, 0]);
  swath.flags.set([flagBit.rain, flagBit.atMost3Ms | flagBit.landInCell, flagBit.landInCell]);
  swath.cellSizeM = 25_000;
  return swath;
}

function readBack(swath: Swath, options: CfSwathOptions): Swath {
  const { swaths, problems } = readCfSwaths(encodeCfSwath(swath, options), 'made.nc');
  expect(problems).toEqual([]);
  return swaths[0];
}

/** The values of a variable as they stand in the file. */
function rawValues(bytes: Uint8Array, name: string): number[] {
  const header = readNetcdfHeader(bytes, 'made.nc');
  const variable = header.variables.find((candidate) => candidate.name === name);
  return variable ? Array.from(readVariable(bytes, header, variable) as Int16Array) : [];
}

for (const family of ['c-band', 'ku-band'] as const) {
  test(`writes a swath like a ${family} file that our reader gives back`, () => {
    const swath = makeSwath();
    const back = readBack(swath, { family });
    expect(Array.from(back.state)).toEqual(Array.from(swath.state));
    expect(Array.from(back.speedMs)).toEqual(Array.from(swath.speedMs));
    expect(Array.from(back.directionFrom)).toEqual(Array.from(swath.directionFrom));
    expect(Array.from(back.lon, (lon) => lon.toFixed(5))).toEqual(Array.from(swath.lon, (lon) => lon.toFixed(5)));
    expect(Array.from(back.timeMs.slice(0, 3))).toEqual(Array.from(swath.timeMs.slice(0, 3)));
    expect(Array.from(back.flags, listFlags)).toEqual(Array.from(swath.flags, listFlags));
    expect(back.cellSizeM).toBe(25_000);
    expect(back.band).toBe(family === 'c-band' ? 'C' : 'Ku');
  });
}

// The packing of real files: longitudes 0 to 360 x 1e-5, speeds x 0.01, directions to x 0.1 with north as 360.
test('packs a C-band file as real ones are packed', () => {
  const bytes = encodeCfSwath(makeSwath());
  expect(rawValues(bytes, 'lon')).toEqual([35_950_000, 50_000, 150_000, -2_147_483_647]);
  expect(rawValues(bytes, 'wind_speed')).toEqual([1720, 250, -32767, -32767]);
  expect(rawValues(bytes, 'wind_dir')).toEqual([900, 1800, -32767, -32767]);
  expect(rawValues(bytes, 'wvc_quality_flag')).toEqual([512, 2048 + 32768, 32768, -2_147_483_647]);
});

test('writes a south wind as blowing to 360, never to 0', () => {
  const swath = makeSwath();
  swath.directionFrom[0] = 180;
  expect(rawValues(encodeCfSwath(swath), 'wind_dir')[0]).toBe(3600);
});

test('writes the model wind before the observed one', () => {
  const swath = makeSwath();
  swath.background = createBackground(4);
  swath.background.speedMs.fill(9);
  const names = readNetcdfHeader(encodeCfSwath(swath), 'made.nc').variables.map(({ name }) => name);
  expect(names.indexOf('model_speed')).toBeLessThan(names.indexOf('wind_speed'));
  expect(readBack(swath, {}).background?.speedMs[0]).toBe(9);
});

test('sets every bit from the failed test on in a Ku-band cell without a wind', () => {
  const raw = rawValues(encodeCfSwath(makeSwath(), { family: 'ku-band' }), 'flags');
  // Masks 1, 2, 128, ..., 16384 sum to 32643; from the coastal bit (128) on to 32640. No cell at all is 0x7fff.
  expect(raw).toEqual([8192, 2048 + 128, 32640, 0x7fff]);
});

test('writes CDF-5 on request', () => {
  expect(encodeCfSwath(makeSwath(), { version: 5 })[3]).toBe(5);
});
