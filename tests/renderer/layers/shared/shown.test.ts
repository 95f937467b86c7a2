import { expect, test } from 'vitest';
import { joinBlocks } from '../../../../renderer/layers/shared/cells.ts';
import {
  NOT_SHOWN,
  SHOWN_WITHOUT_WIND,
  sortCells,
  WIND_HIDDEN,
  WIND_SHOWN,
} from '../../../../renderer/layers/shared/shown.ts';
import { blockBytes, type DrawBlock, layOutBlock } from '../../../../src/contract/packed-swath.ts';
import { flagBit } from '../../../../src/wind/flags.ts';
import { showEverything } from '../../../../src/wind/switches.ts';

/** One row of cells: a speed in m/s, '-' looked but no wind, '.' never looked. */
function drawRow(passId: number, cells: (number | '-' | '.')[]): DrawBlock {
  const header = { blockId: passId, passId, firstRow: 0, rows: 1, columns: cells.length };
  const block = layOutBlock(new ArrayBuffer(blockBytes(cells.length)), 0, header);
  cells.forEach((cell, i) => {
    block.state[i] = cell === '.' ? 0 : cell === '-' ? 1 : 2;
    block.speedMs[i] = typeof cell === 'number' ? cell : Number.NaN;
    block.timeS[i] = 1000;
  });
  return block;
}

const window = { fromMs: 0, toMs: 2_000_000 };
const shown = { switches: showEverything(), hiddenPassIds: [], window };

test('keeps never looked, looked without a wind, and wind apart', () => {
  expect([...sortCells(joinBlocks([drawRow(1, ['.', '-', 9])]), shown)]).toEqual([
    NOT_SHOWN,
    SHOWN_WITHOUT_WIND,
    WIND_SHOWN,
  ]);
});

test('leaves water outside the time window as not looked at', () => {
  const kinds = sortCells(joinBlocks([drawRow(1, ['-', 9])]), { ...shown, window: { fromMs: 0, toMs: 999_000 } });
  expect([...kinds]).toEqual([NOT_SHOWN, NOT_SHOWN]);
});

test('hides the winds of a hidden pass without unseeing its water', () => {
  const cells = joinBlocks([drawRow(1, [9, '-']), drawRow(2, [9])]);
  expect([...sortCells(cells, { ...shown, hiddenPassIds: [1] })]).toEqual([
    WIND_HIDDEN,
    SHOWN_WITHOUT_WIND,
    WIND_SHOWN,
  ]);
});

test('hides by class and by flag, and only those', () => {
  const block = drawRow(1, [9, 20, 9]);
  block.flags[2] = flagBit.landInCell;
  const switches = showEverything();
  switches.beaufortShown[8] = false;
  switches.doubtShown.land = false;
  expect([...sortCells(joinBlocks([block]), { ...shown, switches })]).toEqual([WIND_SHOWN, WIND_HIDDEN, WIND_HIDDEN]);
});
