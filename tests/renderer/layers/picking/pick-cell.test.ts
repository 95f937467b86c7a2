import { expect, test } from 'vitest';
import { pickCell } from '../../../../renderer/layers/picking/pick-cell.ts';
import { joinBlocks, placeOf } from '../../../../renderer/layers/shared/cells.ts';
import { NOT_SHOWN, SHOWN_WITHOUT_WIND, WIND_SHOWN } from '../../../../renderer/layers/shared/shown.ts';
import { mercatorX, mercatorY } from '../../../../renderer/map/mercator.ts';
import { toScreen, type View } from '../../../../renderer/map/view.ts';
import { drawBlock } from '../drawn-block.ts';

function viewAt(lon: number, lat: number, bearing = 0): View {
  return { x: mercatorX(lon), y: mercatorY(lat), zoom: 7, bearing, widthPx: 900, heightPx: 600 };
}

/** Two cells a quarter of a degree apart across the date line, winds from the north. */
const cells = joinBlocks([
  drawBlock([
    { lon: 179.9, lat: 50, speedMs: 20, timeS: 1000 },
    { lon: -179.75, lat: 50, speedMs: 10, timeS: 1000 },
  ]),
]);
const kinds = Uint8Array.from([WIND_SHOWN, WIND_SHOWN]);

function pointAt(view: View, lon: number, lat: number, right = 0, down = 0) {
  const x = mercatorX(lon) + Math.round(view.x - mercatorX(lon));
  const [xPx, yPx] = toScreen(view, x, mercatorY(lat));
  return { xPx: xPx + right, yPx: yPx + down };
}

test('takes a click on a shaft for its wind, though another cell lies under it', () => {
  const view = viewAt(180, 50);
  // The shaft of a north wind runs up from its position.
  expect(pickCell(cells, kinds, [0, 1], view, pointAt(view, 179.9, 50, 4, -18))).toBe(0);
});

test('follows the shaft when the map is turned', () => {
  const view = viewAt(180, 50, 90);
  // With east up, north is to the left.
  expect(pickCell(cells, kinds, [0, 1], view, pointAt(view, 179.9, 50, -18, 4))).toBe(0);
  expect(pickCell(cells, kinds, [0], view, pointAt(view, -179.75, 50, 0, 0))).toBe(1);
});

test('finds the footprint under a click where no drawn wind is near', () => {
  const view = viewAt(180, 50);
  expect(pickCell(cells, kinds, [], view, pointAt(view, 179.9 + 0.15, 50.09))).toBe(0);
});

test('finds nothing on water that nobody looked at, nor in cells that are not shown', () => {
  const view = viewAt(180, 50);
  expect(pickCell(cells, kinds, [0, 1], view, pointAt(view, 180.02, 50.3))).toBeNull();
  expect(pickCell(cells, Uint8Array.from([NOT_SHOWN, NOT_SHOWN]), [], view, pointAt(view, 179.9, 50))).toBeNull();
});

test('of overlapping footprints takes the newest, and a look without a wind counts as one', () => {
  const overlapping = joinBlocks([
    drawBlock([{ lon: 10, lat: 50, speedMs: 20, timeS: 1000 }], { passId: 1, blockId: 1 }),
    drawBlock([{ lon: 10.05, lat: 50, timeS: 5000 }], { passId: 2, blockId: 2 }),
  ]);
  const view = viewAt(10, 50);
  const point = pointAt(view, 10.1, 50.08);
  expect(pickCell(overlapping, Uint8Array.from([WIND_SHOWN, SHOWN_WITHOUT_WIND]), [], view, point)).toBe(1);
});

test('says where a cell is found, row and column counted from 1', () => {
  const block = drawBlock(
    [0, 1, 2, 3].map((i) => ({ lon: i, lat: -i, speedMs: 5 })),
    {
      columns: 2,
      firstRow: 10,
      passId: 4,
    },
  );
  expect(placeOf(joinBlocks([block]), 3)).toEqual({ passId: 4, row: 12, column: 2, lon: 3, lat: -3 });
});
