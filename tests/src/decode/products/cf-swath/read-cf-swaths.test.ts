import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { readCfSwaths } from '../../../../../src/decode/products/cf-swath/read-cf-swaths.ts';
import { LOOKED_NO_WIND, NEVER_LOOKED, WIND } from '../../../../../src/swath/swath.ts';
import { flagsOf, SmallFile, variable } from './small-swath.ts';

const fixture = (name: string) =>
  new Uint8Array(readFileSync(new URL(`../../../../fixtures/netcdf/${name}`, import.meta.url)));
const rounded = (values: ArrayLike<number>, digits = 3) => Array.from(values, (value) => Number(value.toFixed(digits)));

// c-band-swath.nc: made by ncgen from c-band-swath.cdl, 3 rows of 4 cells; expected values by hand from that text.
const cBand = readCfSwaths(fixture('c-band-swath.nc'), 'c-band-swath.nc');
const [swath] = cBand.swaths;

test('tells wind, looked but no wind, and never looked apart', () => {
  expect(Array.from(swath.state)).toEqual([
    ...[WIND, WIND, WIND, LOOKED_NO_WIND],
    ...[WIND, WIND, LOOKED_NO_WIND, WIND],
    ...[NEVER_LOOKED, NEVER_LOOKED, NEVER_LOOKED, NEVER_LOOKED],
  ]);
});

test('brings longitudes 0 to 360 to -180 to 180, with both meridians inside one row', () => {
  expect(rounded(swath.lon, 5).slice(0, 8)).toEqual([-0.35, 0, 0.35, 0.7, -180, 179.65, 179.99999, -0.01]);
});

test('leaves rows of fill without position, time, wind or flags', () => {
  expect(rounded(swath.lon.slice(8))).toEqual([Number.NaN, Number.NaN, Number.NaN, Number.NaN]);
  expect(rounded(swath.timeMs.slice(8))).toEqual([Number.NaN, Number.NaN, Number.NaN, Number.NaN]);
  expect(Array.from(swath.flags.slice(8))).toEqual([0, 0, 0, 0]);
});

test('takes the observed wind though the model wind stands first with the same standard name', () => {
  expect(rounded(swath.speedMs)).toEqual([
    ...[10, 2.5, 17.2, Number.NaN],
    ...[27.91, 8.2, Number.NaN, 6.4],
    ...[Number.NaN, Number.NaN, Number.NaN, Number.NaN],
  ]);
});

test('turns directions to where the wind blows into those it comes from, 360 becoming 180', () => {
  expect(rounded(swath.directionFrom.slice(0, 7))).toEqual([268.5, 0, 180, Number.NaN, 180, 90, Number.NaN]);
});

test('keeps the model wind as background, turned round too', () => {
  expect(rounded(swath.background?.speedMs.slice(0, 8) ?? [])).toEqual([9, 9.1, 9.2, 9.3, 9.4, 9.5, 9.6, 9.7]);
  expect(rounded(swath.background?.directionFrom.slice(0, 8) ?? [])).toEqual([181, 182, 183, 180, 185, 186, 187, 188]);
});

test('keeps a wind whose direction is missing and says so', () => {
  expect(swath.speedMs[7]).toBeCloseTo(6.4);
  expect(flagsOf(swath)[7]).toEqual(['directionUnknown']);
});

test('keeps a wind with the land bit, and one whose backscatter distance leaves its own range', () => {
  expect([swath.state[2], flagsOf(swath)[2]]).toEqual([WIND, ['landInCell']]);
  expect([swath.state[4], flagsOf(swath)[4]]).toEqual([WIND, ['fitQualityFailed']]);
});

test('maps the flag words of the C-band family', () => {
  expect(flagsOf(swath).slice(0, 6)).toEqual([
    ...[[], ['atMost3Ms'], ['landInCell'], ['landInCell', 'tooFewLooks']],
    ...[['fitQualityFailed'], ['fieldConsistencyFailed']],
  ]);
  expect(Array.from(swath.rawFlags.slice(0, 6))).toEqual([0, 2048, 32768, 4227072, 131072, 65536]);
});

test('takes out a speed outside the range the file states, flags the cell and tells it', () => {
  expect(flagsOf(swath)[6]).toEqual(['outOfRange']);
  expect(cBand.problems.map(({ code }) => code)).toEqual(['values-out-of-range']);
  expect(cBand.problems[0].message).toContain(': 1.');
});

test('reads each cell time, and gives a cell without one that of its neighbour', () => {
  // netCDF4-python num2date of the same file: 2021-06-15 00:00:00 and 00:00:04.
  expect(Array.from(swath.timeMs.slice(0, 8))).toEqual([
    ...Array(4).fill(Date.UTC(2021, 5, 15)),
    ...Array(4).fill(Date.UTC(2021, 5, 15, 0, 0, 4)),
  ]);
  expect(swath.notes.join(' ')).toContain('Cells without a time of their own');
});

test('says what the file says about its source, size, band and flags', () => {
  expect(swath).toMatchObject({
    rows: 3,
    columns: 4,
    sourceAsRead: 'C-band fan-beam scatterometer',
    cellSizeM: 25_000,
    band: 'C',
    viewing: 'fan-beam',
    isDirectionStated: true,
    flagReading: 'as-file-states',
    solutions: null,
    beams: null,
  });
  expect(cBand.format).toBe('netCDF classic (CDF-1)');
  expect(swath.iceProbability?.[3]).toBeCloseTo(0.25);
});

test('says that no rain flag need not mean no rain', () => {
  expect(swath.notes.join(' ')).toContain('rain was not checked');
});

// ku-band-swath.nc: made by ncgen from ku-band-swath.cdl, 2 records of 4 cells.
const [kuBand] = readCfSwaths(fixture('ku-band-swath.nc'), 'ku-band-swath.nc').swaths;

test('reads a Ku-band swath along the unlimited dimension, with one time for each row', () => {
  expect(Array.from(kuBand.state)).toEqual([
    WIND,
    WIND,
    WIND,
    NEVER_LOOKED,
    LOOKED_NO_WIND,
    LOOKED_NO_WIND,
    WIND,
    WIND,
  ]);
  expect(rounded(kuBand.directionFrom.slice(0, 3))).toEqual([45, 359.9, 0]);
  // netCDF4-python num2date of the same file: 2031-01-02 12:15:00 and 12:30:00.
  expect([kuBand.timeMs[0], kuBand.timeMs[7]]).toEqual([Date.UTC(2031, 0, 2, 12, 15), Date.UTC(2031, 0, 2, 12, 30)]);
});

test('takes a set bit of the Ku-band family for the abnormal case, whatever its word says', () => {
  expect(flagsOf(kuBand).slice(0, 3)).toEqual([[], ['above30Ms'], ['rainCheckNotUsable', 'atMost3Ms']]);
  expect(flagsOf(kuBand)[6]).toEqual(['rain']);
});

test('believes only the first set bit of a Ku-band cell without a wind: the later tests never ran', () => {
  expect(flagsOf(kuBand).slice(4, 6)).toEqual([['tooFewLooks'], ['iceInCell']]);
});

test('takes a flag word of all bits for missing, its quality for unknown', () => {
  expect(flagsOf(kuBand)[7]).toEqual(['qualityUnknown']);
  expect(kuBand.rawFlags[7]).toBe(0xffffffff);
});

test('knows the Ku band by its flag words and measures the cell size where none is stated', () => {
  expect([kuBand.band, kuBand.viewing]).toEqual(['Ku', 'pencil-beam']);
  // A quarter of a degree at 10 and at 10.25 degrees north: 60 NM x 1.852 x 0.25 x cos(lat) is 27.36 and 27.33 km.
  expect(kuBand.cellSizeM / 1000).toBeCloseTo(27.35, 1);
});

test('finds no cells in an empty granule, and does not mind a time without a unit', () => {
  const file = new SmallFile();
  file.content.dimensions[0] = { name: 'row', length: 0, isUnlimited: true };
  for (const entry of file.content.variables) entry.values = new Float64Array(0);
  file.get('time').attributes = {};
  const { swaths, problems } = file.read();
  expect([swaths.length, problems.map(({ code }) => code)]).toEqual([0, ['no-cells']]);
});

test('finds no cells where every position is fill', () => {
  const file = new SmallFile().fill('lat', 'double', Float64Array.of(Number.NaN, Number.NaN, Number.NaN));
  expect(file.read().problems.map(({ code }) => code)).toEqual(['no-cells']);
});

test('counts a position that is not on the earth as never looked at, and tells it', () => {
  const { swaths, problems } = new SmallFile().fill('lat', 'double', Float64Array.of(50, -21474.83647, 50)).read();
  expect(Array.from(swaths[0].state)).toEqual([WIND, NEVER_LOOKED, WIND]);
  expect(problems.map(({ code }) => code)).toEqual(['values-out-of-range']);
});

test('keeps a cell at the pole whose packed latitude unpacks to a hair more than 90', () => {
  const file = new SmallFile().fill('lat', 'int', Int32Array.of(9_000_000, -9_000_000, 0));
  const [pole] = file.describe('lat', { scale_factor: Float64Array.of(1e-5) }).read().swaths;
  expect(Array.from(pole.lat)).toEqual([90, -90, 0]);
});

test('makes one swath of each pass of a merged file, leaving out its padding', () => {
  const file = new SmallFile();
  file.content.dimensions.unshift({ name: 'pass', length: 2 });
  for (const entry of file.content.variables) {
    entry.dimensions = ['pass', 'row', 'cell'];
    entry.values = Float64Array.of(...(entry.values as Float64Array), ...(entry.values as Float64Array));
    entry.type = 'double';
  }
  file.get('wind_speed').values = Float64Array.of(1, 2, 3, 4, 5, 6);
  file.get('lat').values = Float64Array.of(50, 50, 50, 51, 51, Number.NaN);
  const { swaths } = file.read();
  expect(swaths.map(({ speedMs }) => Array.from(speedMs))).toEqual([
    [1, 2, 3],
    [4, 5, Number.NaN],
  ]);
});

test('says which part is cut off, and reads the wind where only the model is', () => {
  const file = new SmallFile().add(
    variable('model_speed', 'float', Float32Array.of(7, 8, 9), { standard_name: 'wind_speed', units: 'm s-1' }),
  );
  const bytes = fixtureWithout(file, 1);
  const { swaths, problems } = readCfSwaths(bytes, 'cut.nc');
  expect(Array.from(swaths[0].speedMs)).toEqual([10, 11, 12]);
  expect(swaths[0].background).toBeNull();
  expect(problems.map(({ code, place }) => [code, place.part])).toEqual([['truncated', 'variable model_speed']]);
  expect(() => readCfSwaths(fixtureWithout(file, 13), 'cut.nc')).toThrow('The values of wind_dir should reach to byte');
});

function fixtureWithout(file: SmallFile, missingBytes: number): Uint8Array {
  const bytes = file.bytes();
  return bytes.subarray(0, bytes.length - missingBytes);
}

test('takes no memory for a swath that its file cannot hold', () => {
  const file = new SmallFile();
  const bytes = file.bytes();
  // The length of dimension 'row', behind magic, numrecs, tag, count, and its name: netCDF classic grammar, by hand.
  new DataView(bytes.buffer).setUint32(24, 0x7fffffff);
  expect(() => readCfSwaths(bytes, 'lying.nc')).toThrow(
    expect.objectContaining({ code: 'truncated', place: expect.objectContaining({ part: 'variable lat' }) }),
  );
});

test('refuses netCDF-4 by name', () => {
  const bytes = Uint8Array.of(0x89, 0x48, 0x44, 0x46, 0x0d, 0x0a, 0x1a, 0x0a);
  expect(() => readCfSwaths(bytes, 'a.nc4')).toThrow('netCDF-4 (HDF5)');
});
