import { expect, test } from 'vitest';
import { joinBlocks } from '../../../../renderer/layers/shared/cells.ts';
import { NOT_SHOWN, SHOWN_WITHOUT_WIND, WIND_HIDDEN, WIND_SHOWN } from '../../../../renderer/layers/shared/shown.ts';
import { tileFootprints } from '../../../../renderer/layers/sight/footprint-tiles.ts';
import { lonOfMercator } from '../../../../renderer/map/mercator.ts';
import { drawBlock } from '../drawn-block.ts';

const everywhere = { west: 0.01, east: 1.005, north: -0.5, south: 1.5 };
const kindOf: Record<string, number> = { '.': NOT_SHOWN, o: SHOWN_WITHOUT_WIND, h: WIND_HIDDEN, w: WIND_SHOWN };

/** A lattice on the equator, cells of a quarter of a degree, drawn as letters: w wind, h hidden, o no wind, . not shown, ' ' a gap. */
function lattice(rows: string[], lonOfFirst = 0) {
  const columns = rows[0].length;
  const halfM = 0.125 * 111_195;
  const cells = rows.flatMap((row, r) =>
    [...row].map((letter, c) => ({
      lon: ((lonOfFirst + c * 0.25 + 540) % 360) - 180,
      lat: 2 - r * 0.25,
      state: letter === ' ' ? 0 : 2,
      speedMs: 8,
      halfSidesM: (letter === ' ' ? [0, 0, 0, 0] : [0, -halfM, halfM, 0]) as [number, number, number, number],
    })),
  );
  const kinds = Uint8Array.from(rows.join(''), (letter) => kindOf[letter] ?? NOT_SHOWN);
  return { cells: joinBlocks([drawBlock(cells, { columns })]), kinds };
}

function countQuads(rows: string[], most: number) {
  const { cells, kinds } = lattice(rows);
  const { wind, noWind } = tileFootprints(cells, kinds, most, everywhere);
  return { wind: wind.length / 8, noWind: noWind.length / 8 };
}

/** The widest stretch of longitude that the quads cover, west and east edge. */
function spanOf(quads: Float32Array): [number, number] {
  const lons = [...quads].filter((_, i) => i % 2 === 0).map(lonOfMercator);
  return [Math.min(...lons), Math.max(...lons)];
}

test('draws neighbours that were seen alike as one', () => {
  expect(countQuads(['wwww', 'wwww', 'wwww', 'wwww'], 4)).toEqual({ wind: 1, noWind: 0 });
  expect(countQuads(['wwww', 'wwww', 'wwww', 'wwww'], 1)).toEqual({ wind: 16, noWind: 0 });
});

test('counts a hidden wind as seen', () => {
  expect(countQuads(['whwh'], 4)).toEqual({ wind: 1, noWind: 0 });
});

test('keeps water looked at without a wind apart from water with one', () => {
  const { wind, noWind } = countQuads(['wwoo'], 4);
  expect([wind, noWind]).toEqual([1, 1]);
});

test('covers no cell that is not shown', () => {
  const { cells, kinds } = lattice(['ww.w']);
  const { wind } = tileFootprints(cells, kinds, 4, everywhere);
  // The middle of the cell that is not shown lies at 0.5 degrees.
  for (let quad = 0; quad < wind.length; quad += 8) {
    const [west, east] = spanOf(wind.subarray(quad, quad + 8));
    expect(west < 0.5 && east > 0.5).toBe(false);
  }
  expect(wind.length / 8).toBe(2);
});

test('does not bridge a gap between neighbours of the array that lie apart on the earth', () => {
  const left = lattice(['ww'], 0).cells.blocks[0];
  const right = lattice(['ww'], 6).cells.blocks[0];
  const cells = [left, right].flatMap((block) =>
    [0, 1].map((i) => ({
      lon: block.lonE5[i] / 1e5,
      lat: 2,
      speedMs: 8,
      halfSidesM: [0, -13_900, 13_900, 0] as [number, number, number, number],
    })),
  );
  const joined = joinBlocks([drawBlock(cells)]);
  const { wind } = tileFootprints(joined, new Uint8Array(4).fill(WIND_SHOWN), 4, everywhere);
  expect(wind.length / 8).toBe(2);
  expect(spanOf(wind.subarray(0, 8))[1]).toBeLessThan(0.5);
  expect(spanOf(wind.subarray(8))[0]).toBeGreaterThan(5.5);
});

test('reaches past each footprint by a fiftieth at most, from its middle', () => {
  const { cells, kinds } = lattice(['w']);
  const [west, east] = spanOf(tileFootprints(cells, kinds, 1, everywhere).wind);
  expect(east - west).toBeCloseTo(0.25 * 1.02, 3);
});

test('draws a footprint on the date line in one piece', () => {
  const { cells, kinds } = lattice(['wwww'], 179.5);
  const [west, east] = spanOf(tileFootprints(cells, kinds, 4, everywhere).wind);
  expect(east - west).toBeCloseTo(1.02, 2);
});

test('leaves out what the view does not reach, and finds it from the other side of the date line', () => {
  const { cells, kinds } = lattice(['ww'], 179);
  const far = { west: 0.4, east: 0.6, north: 0, south: 1 };
  const beyond = { west: -0.01, east: 0.1, north: 0, south: 1 };
  expect(tileFootprints(cells, kinds, 1, far).wind.length).toBe(0);
  expect(tileFootprints(cells, kinds, 1, beyond).wind.length / 8).toBe(2);
});
