import { expect, test } from 'vitest';
import { barbLines } from '../../../../renderer/panels/shared/barb-picture.ts';

const feathers = (lines: string) => (lines.match(/l -/g) ?? []).length;
const pennants = (outline: string) => (outline.match(/Z/g) ?? []).length;

// Glossary of Meteorology, 'wind barb': half barb 5 kt, barb 10 kt, pennant 50 kt; calm is a circle.
test.each([
  [5, 0, 1],
  [25, 0, 3],
  [50, 1, 0],
  [65, 1, 2],
])('draws %i kt with %i pennants and %i feathers', (knots, pennantCount, featherCount) => {
  const { lines, pennants: outline } = barbLines(knots);
  expect([pennants(outline), feathers(lines)]).toEqual([pennantCount, featherCount]);
});

test('draws a bare shaft for the 1 and 2 kt that are nearest to no feather', () => {
  expect(barbLines(0)).toEqual({ lines: 'M 21 0 H 0', pennants: '' });
});
