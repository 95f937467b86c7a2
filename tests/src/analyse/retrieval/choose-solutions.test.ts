import { expect, test } from 'vitest';
import { chooseSolutions, measureDisagreement } from '../../../../src/analyse/retrieval/choose-solutions.ts';
import { createBackground, createSolutions } from '../../../../src/swath/swath.ts';

const speedMs = 10;

/**
 * A field drawn as rows of digits: each cell could have a wind from the west (270) or from the east (90). '1' ranks the
 * west first, '2' the east; '.' has no wind.
 */
function drawField(lines: string[], backgroundFrom: number | null = null) {
  const columns = lines[0].length;
  const solutions = createSolutions(lines.length * columns, 2);
  const background = backgroundFrom === null ? null : createBackground(lines.length * columns);
  background?.speedMs.fill(speedMs);
  background?.directionFrom.fill(backgroundFrom ?? Number.NaN);
  [...lines.join('')].forEach((digit, cell) => {
    if (digit === '.') return;
    for (const slot of [0, 1]) {
      solutions.speedMs[cell * 2 + slot] = speedMs;
      solutions.directionFrom[cell * 2 + slot] = (digit === '1') === (slot === 0) ? 270 : 90;
      solutions.probability[cell * 2 + slot] = slot === 0 ? 0.6 : 0.4;
    }
  });
  return { rows: lines.length, columns, solutions, background };
}

/** The chosen winds as rows of letters: W from the west, E from the east. */
function showChoice(field: ReturnType<typeof drawField>, chosen: Uint8Array): string[] {
  const letters = [...chosen].map((solution, cell) =>
    solution === 0 ? '.' : field.solutions.directionFrom[cell * 2 + solution - 1] === 270 ? 'W' : 'E',
  );
  return Array.from({ length: field.rows }, (_, row) =>
    letters.slice(row * field.columns, (row + 1) * field.columns).join(''),
  );
}

test('turns single winds that disagree with all their neighbours', () => {
  const field = drawField(['11111', '12111', '11121', '11111']);
  const chosen = chooseSolutions(field, { sides: [[0, 5]] });
  expect(showChoice(field, chosen)).toEqual(['WWWWW', 'WWWWW', 'WWWWW', 'WWWWW']);
  expect(chosen[6]).toBe(2);
});

test('starts from the background, and so a whole side turns with it', () => {
  const field = drawField(['22222', '22122', '22222'], 270);
  expect(showChoice(field, chooseSolutions(field, { sides: [[0, 5]] }))).toEqual(['WWWWW', 'WWWWW', 'WWWWW']);
});

test('keeps the halves of a swath apart: neighbours over the nadir gap have no say', () => {
  const field = drawField(['112222', '112222', '112222']);
  const whole = chooseSolutions(field, { sides: [[0, 6]] });
  const halves = chooseSolutions(field, {
    sides: [
      [0, 2],
      [2, 6],
    ],
  });
  expect(showChoice(field, whole)).toEqual(['EEEEEE', 'EEEEEE', 'EEEEEE']);
  expect(showChoice(field, halves)).toEqual(['WWEEEE', 'WWEEEE', 'WWEEEE']);
});

test('gives 0 where a cell has no wind', () => {
  const field = drawField(['1.1', '.2.', '1.1']);
  expect([...chooseSolutions(field, { sides: [[0, 3]] })]).toEqual([1, 0, 1, 0, 2, 0, 1, 0, 1]);
});

test('keeps a front where both sides are wide', () => {
  const field = drawField(Array.from({ length: 12 }, () => '111111222222'));
  const choice = showChoice(field, chooseSolutions(field, { sides: [[0, 12]] }));
  expect(choice).toEqual(Array.from({ length: 12 }, () => 'WWWWWWEEEEEE'));
});

test('measures how far a wind lies from the others of its window', () => {
  const field = drawField(['111', '121', '111']);
  const first = new Uint8Array(9).fill(1);
  const disagreement = measureDisagreement(field, first, { sides: [[0, 3]] });
  // The middle wind is opposite to all eight: 20 m/s from each. A corner differs from one of its eight neighbours.
  expect(disagreement[4]).toBeCloseTo(20, 5);
  expect(disagreement[0]).toBeCloseTo(20 / 8, 5);
});
