import { expect, test } from 'vitest';
import { type DrawingList, listDrawing, marks } from '../../../../renderer/layers/barbs/drawing-list.ts';
import { joinBlocks } from '../../../../renderer/layers/shared/cells.ts';
import { flagBit } from '../../../../src/wind/flags.ts';
import { type DrawnCell, drawBlock } from '../drawn-block.ts';

const KNOT_MS = 1852 / 3600;

const oneWorld = { west: 0, east: 1, north: 0, south: 1 };

function list(cells: DrawnCell[], hidden: number[] = []): DrawingList {
  const drawn = cells.map((_, i) => i).filter((i) => !hidden.includes(i));
  return listDrawing(joinBlocks([drawBlock(cells)]), drawn, hidden, oneWorld);
}

/** East and north of the direction that an entry says its wind comes from. */
function directionOf({ words }: DrawingList, entry: number): [number, number] {
  const word = words[entry * 4 + 2];
  return [((word << 16) >> 16) / 32767, (word >> 16) / 32767];
}

test('draws under 1 kt as a calm, 1 and 2 kt as a bare shaft, by whole knots', () => {
  const at = (knots: number) => list([{ lon: 0, lat: 50, speedMs: knots * KNOT_MS }]).runs[0].shape;
  expect([0, 0.49, 0.51, 2.49, 2.51].map(at)).toEqual([
    { mark: marks.calm },
    { mark: marks.calm },
    { fives: 0 },
    { fives: 0 },
    { fives: 1 },
  ]);
});

test('packs where the wind comes from, east and north', () => {
  for (const [degrees, east, north] of [
    [0, 0, 1],
    [90, 1, 0],
    [225, -Math.SQRT1_2, -Math.SQRT1_2],
    [360, 0, 1],
  ]) {
    const [packedEast, packedNorth] = directionOf(list([{ lon: 0, lat: 50, speedMs: 10, directionFrom: degrees }]), 0);
    expect(packedEast).toBeCloseTo(east, 4);
    expect(packedNorth).toBeCloseTo(north, 4);
  }
});

test('marks the southern hemisphere by each cell’s own latitude, the equator as north', () => {
  const isSouth = (lat: number) => (list([{ lon: 0, lat, speedMs: 10 }]).words[3] & 8) !== 0;
  expect([50, 0.00001, 0, -0.00001, -50].map(isSouth)).toEqual([false, false, false, true, true]);
});

test('gives a wind without a known direction its own mark, even where the file holds a number', () => {
  const unknown = { lon: 0, lat: 50, speedMs: 20, directionFrom: 270, flags: flagBit.directionUnknown };
  expect(list([unknown]).runs.map(({ shape }) => shape)).toEqual([{ mark: marks.noDirection }]);
  expect(list([{ ...unknown, directionFrom: Number.NaN, flags: 0 }]).runs[0].shape).toEqual({
    mark: marks.noDirection,
  });
});

test('keeps the wind beside every mark of doubt', () => {
  const flags = flagBit.rain | flagBit.landInCell | flagBit.iceInCell | flagBit.fitQualityFailed;
  expect(list([{ lon: 0, lat: 50, speedMs: 20, flags }]).runs.map(({ shape }) => shape)).toEqual([
    { mark: marks.land },
    { mark: marks.quality },
    { mark: marks.rain },
    { mark: marks.ice },
    { fives: 8 },
  ]);
});

test('does not mark the normal conditions of a light wind as doubt', () => {
  const { runs } = list([{ lon: 0, lat: 50, speedMs: 2, flags: flagBit.atMost3Ms | flagBit.monitoringNotRun }]);
  expect(runs.map(({ shape }) => shape)).toEqual([{ fives: 1 }]);
});

test('draws a hidden wind as a dot beneath all others, in the ink of its class', () => {
  const { runs, words } = list(
    [
      { lon: 0, lat: 50, speedMs: 20 },
      { lon: 1, lat: 50, speedMs: 9 },
    ],
    [0],
  );
  expect(runs).toEqual([
    { shape: { mark: marks.hidden }, first: 0, count: 1 },
    { shape: { fives: 3 }, first: 1, count: 1 },
  ]);
  // 20 m/s is Beaufort 8, the fourth of six inks; 9 m/s Beaufort 5, the second.
  expect([words[3] & 7, words[7] & 7]).toEqual([3, 1]);
});

test('draws stronger barbs after weaker ones, so that the strongest lies on top', () => {
  const { runs } = list([30, 5, 12].map((speedMs, i) => ({ lon: i, lat: 50, speedMs })));
  expect(runs.map(({ shape }) => shape)).toEqual([{ fives: 2 }, { fives: 5 }, { fives: 12 }]);
});

test('lays a wind out once in every copy of the world in reach', () => {
  const cells = joinBlocks([drawBlock([{ lon: 170, lat: 0, speedMs: 10 }])]);
  const { runs, words } = listDrawing(cells, [0], [], { west: -0.3, east: 1.2, north: 0, south: 1 });
  expect(runs).toEqual([{ shape: { fives: 4 }, first: 0, count: 2 }]);
  const floats = new Float32Array(words.buffer);
  expect([floats[0], floats[4]]).toEqual([expect.closeTo(170 / 360 - 0.5, 6), expect.closeTo(170 / 360 + 0.5, 6)]);
});
