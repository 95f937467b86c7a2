import { expect, test } from 'vitest';
import { type Footing, findRoom } from '../../../../renderer/layers/barbs/elbow-room.ts';

const WORLD_PX = 8192;

/** A barb at a place on the screen whose wind comes from a direction, in the north. */
function barb(xPx: number, yPx: number, from: number | null, side = 1): Footing {
  const angle = ((from ?? 0) * Math.PI) / 180;
  return { xPx, yPx, upX: from === null ? 0 : Math.sin(angle), upY: from === null ? 0 : -Math.cos(angle), side };
}

test('leaves out a barb that would lie on a stronger one', () => {
  expect(findRoom([barb(100, 100, 0), barb(101, 90, 0)], WORLD_PX)).toEqual([true, false]);
});

test('draws barbs side by side that are too close end to end', () => {
  expect(findRoom([barb(100, 100, 0), barb(115, 100, 0)], WORLD_PX)).toEqual([true, true]);
  expect(findRoom([barb(100, 100, 0), barb(100, 115, 0)], WORLD_PX)).toEqual([true, false]);
  expect(findRoom([barb(100, 100, 90), barb(100, 115, 90)], WORLD_PX)).toEqual([true, true]);
});

test('keeps more room on the side of the feathers, whichever hemisphere it is', () => {
  // A north wind has its feathers to the east in the north and to the west in the south.
  expect(findRoom([barb(100, 100, 0, 1), barb(107, 100, 0, 1)], WORLD_PX)[1]).toBe(false);
  expect(findRoom([barb(100, 100, 0, -1), barb(93, 100, 0, -1)], WORLD_PX)[1]).toBe(false);
});

test('does not hide a barb behind one that was itself left out', () => {
  const strongest = barb(100, 100, 0);
  const leftOut = barb(100, 112, 0);
  const beyond = barb(100, 132, 0);
  expect(findRoom([strongest, leftOut, beyond], WORLD_PX)).toEqual([true, false, true]);
});

test('sees neighbours across the edge of the world', () => {
  expect(findRoom([barb(1, 100, 0), barb(WORLD_PX - 1, 100, 0)], WORLD_PX)).toEqual([true, false]);
});

test('gives a mark without a shaft little room', () => {
  expect(findRoom([barb(100, 100, null), barb(103, 100, null), barb(110, 100, null)], WORLD_PX)).toEqual([
    true,
    false,
    true,
  ]);
});
