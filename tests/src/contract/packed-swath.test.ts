import { expect, test } from 'vitest';
import { blockBytes, layOutBlock, viewBlocks } from '../../../src/contract/packed-swath.ts';

test('views two blocks of one payload where each was laid out', () => {
  const buffer = new ArrayBuffer(blockBytes(3) + blockBytes(2));
  const first = layOutBlock(buffer, 0, { blockId: 7, passId: 1, firstRow: 0, rows: 1, columns: 3 });
  const second = layOutBlock(buffer, blockBytes(3), { blockId: 8, passId: 1, firstRow: 1, rows: 1, columns: 2 });
  first.lonE5[2] = -17_999_999;
  first.state[2] = 2;
  second.speedMs[1] = 12.5;
  second.halfSidesM[7] = -12_500;

  const [one, two] = viewBlocks(buffer);
  expect([one.blockId, one.cells, one.lonE5[2], one.state[2]]).toEqual([7, 3, -17_999_999, 2]);
  expect([two.blockId, two.firstRow, two.speedMs[1], two.halfSidesM[7]]).toEqual([8, 1, 12.5, -12_500]);
});

test('is never misaligned: every block is a multiple of 8 bytes', () => {
  for (let cells = 0; cells < 20; cells++) expect(blockBytes(cells) % 8).toBe(0);
});

test('refuses a block that reaches past its payload', () => {
  const buffer = new ArrayBuffer(blockBytes(3));
  layOutBlock(buffer, 0, { blockId: 1, passId: 1, firstRow: 0, rows: 1, columns: 3 });
  expect(() => viewBlocks(buffer.slice(0, 64))).toThrow(RangeError);
});
