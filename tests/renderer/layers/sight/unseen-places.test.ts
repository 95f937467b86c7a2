import { expect, test } from 'vitest';
import { joinBlocks } from '../../../../renderer/layers/shared/cells.ts';
import { SHOWN_WITHOUT_WIND } from '../../../../renderer/layers/shared/shown.ts';
import { findUnseenPlaces } from '../../../../renderer/layers/sight/unseen-places.ts';
import { mercatorX, mercatorY } from '../../../../renderer/map/mercator.ts';
import { toScreen, type View } from '../../../../renderer/map/view.ts';
import { drawBlock } from '../drawn-block.ts';

function viewAt(lon: number, lat: number): View {
  return { x: mercatorX(lon), y: mercatorY(lat), zoom: 5, bearing: 0, widthPx: 900, heightPx: 700 };
}

/** Cells every quarter of a degree, west of a longitude, about 20 N. */
function cellsWestOf(lon: number) {
  const cells = [];
  for (let lat = 10; lat <= 30; lat += 0.25) {
    for (let at = lon - 12; at < lon; at += 0.25) cells.push({ lon: ((at + 540) % 360) - 180, lat });
  }
  return joinBlocks([drawBlock(cells)]);
}

test('finds room for words all over water that nobody looked at', () => {
  expect(findUnseenPlaces(joinBlocks([]), new Uint8Array(0), viewAt(0, 20)).length).toBeGreaterThan(8);
});

test('puts no words on or near seen water, with a wind or without', () => {
  const cells = cellsWestOf(181);
  const kinds = new Uint8Array(cells.count).fill(SHOWN_WITHOUT_WIND);
  const view = viewAt(180, 20);
  const places = findUnseenPlaces(cells, kinds, view);
  expect(places.length).toBeGreaterThan(2);
  const [edgePx] = toScreen(view, mercatorX(181), view.y);
  for (const { x, y } of places) expect(toScreen(view, x, y)[0]).toBeGreaterThan(edgePx + 60);
});

test('moves no words when the view is panned', () => {
  const none = joinBlocks([]);
  const here = findUnseenPlaces(none, new Uint8Array(0), viewAt(0, 20));
  const there = findUnseenPlaces(none, new Uint8Array(0), viewAt(0.7, 20.4));
  const isSame = (place: { x: number; y: number }) => there.some(({ x, y }) => x === place.x && y === place.y);
  expect(here.filter(isSame).length).toBeGreaterThan(here.length / 2);
});
