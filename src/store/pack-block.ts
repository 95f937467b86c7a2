import { blockBytes, type DrawBlock, layOutBlock } from '../contract/packed-swath.ts';
import { NEVER_LOOKED, type Swath } from '../swath/swath.ts';

/** Some rows of a swath in the layout they are drawn from, ids left 0 (contract/packed-swath). */
export function packBlock(swath: Swath, halfSidesM: Int16Array, firstRow: number, rows: number): ArrayBuffer {
  const { columns } = swath;
  const buffer = new ArrayBuffer(blockBytes(rows * columns));
  const block = layOutBlock(buffer, 0, { blockId: 0, passId: 0, firstRow, rows, columns });
  const from = firstRow * columns;
  const to = from + rows * columns;
  block.state.set(swath.state.subarray(from, to));
  block.flags.set(swath.flags.subarray(from, to));
  block.speedMs.set(swath.speedMs.subarray(from, to));
  block.directionFrom.set(swath.directionFrom.subarray(from, to));
  block.halfSidesM.set(halfSidesM.subarray(from * 4, to * 4));
  packPlaces(swath, from, block);
  return buffer;
}

function packPlaces(swath: Swath, from: number, block: DrawBlock): void {
  for (let index = 0; index < block.cells; index++) {
    const cell = from + index;
    if (swath.state[cell] === NEVER_LOOKED) continue;
    const lonE5 = Math.round(swath.lon[cell] * 1e5);
    block.lonE5[index] = lonE5 >= 18_000_000 ? lonE5 - 36_000_000 : lonE5;
    block.latE5[index] = Math.round(swath.lat[cell] * 1e5);
    block.timeS[index] = Math.round(swath.timeMs[cell] / 1000);
  }
}
