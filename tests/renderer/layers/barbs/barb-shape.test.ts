import { expect, test } from 'vitest';
import { barbShape, fivesOf, MOST_FIVES } from '../../../../renderer/layers/barbs/barb-shape.ts';

// Glossary of Meteorology, 'wind barb': half barb 5 kt, barb 10, pennant 50, to the nearest 5 kt; ranges of whole knots
// 1-2, 3-7, 8-12, 13-17 ... 48-52 as public tables of the symbol print them.
const table: [fromKnots: number, toKnots: number, pennants: number, full: number, half: number][] = [
  [1, 2, 0, 0, 0],
  [3, 7, 0, 0, 1],
  [8, 12, 0, 1, 0],
  [13, 17, 0, 1, 1],
  [18, 22, 0, 2, 0],
  [23, 27, 0, 2, 1],
  [43, 47, 0, 4, 1],
  [48, 52, 1, 0, 0],
  [53, 57, 1, 0, 1],
  [63, 67, 1, 1, 1],
  [98, 102, 2, 0, 0],
  [113, 117, 2, 1, 1],
];

function countsOf(wholeKnots: number) {
  const { strokes, pennants } = barbShape(fivesOf(wholeKnots));
  const widths = strokes.slice(1).map(({ from, to }) => Math.hypot(to[0] - from[0], to[1] - from[1]));
  const longest = 9.5;
  return {
    pennants: pennants.length,
    full: widths.filter((width) => Math.abs(width - longest) < 1e-9).length,
    half: widths.filter((width) => Math.abs(width - longest / 2) < 1e-9).length,
  };
}

test.each(table)('draws %i to %i kt with %i pennants, %i barbs and %i half barbs', (from, to, pennants, full, half) => {
  for (let knots = from; knots <= to; knots++) expect(countsOf(knots)).toEqual({ pennants, full, half });
});

test('ends the shaft at the position, with all feathers on one side of it', () => {
  for (let fives = 0; fives <= MOST_FIVES; fives++) {
    const { strokes, pennants } = barbShape(fives);
    expect(strokes[0].from).toEqual([0, 0]);
    for (const { from, to } of [...strokes.slice(1), ...pennants]) {
      expect(from[0]).toBe(0);
      expect(to[0]).toBeGreaterThan(0);
    }
  }
});

test('orders pennants, barbs and half barb from the outer end, none of them at the position', () => {
  for (let fives = 1; fives <= MOST_FIVES; fives++) {
    const { strokes, pennants } = barbShape(fives);
    const places = [...pennants, ...strokes.slice(1)].map(({ from }) => from[1]);
    expect(places).toEqual([...places].sort((a, b) => b - a));
    expect(places[places.length - 1]).toBeGreaterThan(3);
    expect(strokes[0].to[1]).toBeGreaterThanOrEqual(places[0]);
  }
});

test('sets a lone half barb in from the end, so that it is not taken for a barb', () => {
  const [shaft, half] = barbShape(1).strokes;
  const [, barb] = barbShape(2).strokes;
  expect(half.from[1]).toBeLessThan(shaft.to[1] - 2);
  expect(barb.from[1]).toBe(shaft.to[1]);
});
