import { expect, test } from 'vitest';
import { readBufrSwaths } from '../../../../../src/decode/products/bufr-winds/read-bufr-swaths.ts';
import type { Swath } from '../../../../../src/swath/swath.ts';
import { buildMessage, type CellWanted, joinBytes } from './build-fan-beam.ts';

/** A swath as rows of speeds; '.' never looked, '-' looked but no wind. */
function draw({ rows, columns, state, speedMs }: Swath): string[] {
  const sign = (cell: number) => ['.', '-', speedMs[cell].toFixed(0)][state[cell]];
  return Array.from({ length: rows }, (_, row) =>
    Array.from({ length: columns }, (_, column) => sign(row * columns + column)).join(' '),
  );
}

const at = (seconds: number, number: number, speedMs: number, more: CellWanted = {}): CellWanted => ({
  seconds,
  number,
  winds: [[speedMs, 250, 0]],
  ...more,
});

function drawAll(...messages: CellWanted[][]): string[][] {
  const { swaths, problems } = readBufrSwaths(joinBytes(...messages.map((cells) => buildMessage(cells))), 'x');
  expect(problems).toEqual([]);
  return swaths.map(draw);
}

test('lets a row go on from one message to the next', () => {
  expect(drawAll([at(0, 1, 1), at(0, 2, 2), at(4, 1, 3)], [at(4, 2, 4), at(8, 1, 5), at(8, 2, 6)])).toEqual([
    ['1 2', '3 4', '5 6'],
  ]);
});

test('leaves places without a cell never looked at, which is not looked at without a wind', () => {
  const noWind: CellWanted = { winds: [[null, null, null]], selected: null };
  expect(drawAll([at(0, 2, 1), at(0, 4, 2), at(4, 1, 3), at(4, 2, 0, noWind)])).toEqual([['. 1 . 2', '3 - . .']]);
});

test('puts messages that come out of order, and cells that count downwards, in order', () => {
  expect(drawAll([at(8, 2, 6), at(8, 1, 5)], [at(0, 2, 2), at(0, 1, 1)], [at(4, 1, 3), at(4, 2, 4)])).toEqual([
    ['1 2', '3 4', '5 6'],
  ]);
});

test('gives a cell that stands twice a row of its own, losing neither', () => {
  expect(drawAll([at(0, 1, 1), at(0, 2, 2)], [at(0, 1, 7), at(0, 2, 8)], [at(4, 1, 3)])).toEqual([
    ['1 2', '7 8', '3 .'],
  ]);
});

test('parts passes where time pauses for more than twenty minutes', () => {
  expect(drawAll([at(0, 1, 1), at(1200, 1, 2), at(2401, 1, 3)])).toEqual([['1', '2'], ['3']]);
});

test('parts passes of different platforms and of different cell sizes', () => {
  const swaths = drawAll(
    [at(0, 1, 1), at(0, 2, 2)],
    [at(2, 1, 3, { platform: 905 })],
    [at(3, 1, 4, { cellSizeM: 12_500 }), at(3, 2, 5, { cellSizeM: 12_500 })],
  );
  expect(swaths).toEqual([['4 5'], ['1 2'], ['3']]);
});

test('keeps cells of a platform that the file does not name', () => {
  const { swaths } = readBufrSwaths(buildMessage([at(0, 1, 1, { platform: null })]), 'x');
  expect(swaths.map(({ platformCode, state }) => [platformCode, state.length])).toEqual([[null, 1]]);
});

test('reads plain messages whose cells have different numbers of solutions as one pass', () => {
  const one = buildMessage([at(0, 1, 5)], false);
  const two = buildMessage(
    [
      at(0, 2, 6, {
        winds: [
          [6, 250, -0.3],
          [6.2, 70, -0.3],
        ],
      }),
    ],
    false,
  );
  const { swaths } = readBufrSwaths(joinBytes(one, two), 'x');
  expect(swaths.map(draw)).toEqual([['5 6']]);
  expect(Array.from(swaths[0].solutions?.speedMs ?? [], (speedMs) => speedMs.toFixed(1))).toEqual([
    '5.0',
    'NaN',
    '6.0',
    '6.2',
  ]);
});
