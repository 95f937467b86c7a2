/**
 * The layout of drawn cells on their way from the archive to the screen: written once when a pass is stored, kept as it is
 * in the database, sent as it is, and viewed, never parsed.
 *
 * A payload is a run of blocks, each a multiple of 8 bytes long and starting on one. Numbers are little-endian.
 *
 *   offset  what
 *   0       uint32 block id                       (0 inside the database; filled in when answering)
 *   4       uint32 pass id                        (likewise)
 *   8       uint32 bytes of this block, all of it
 *   12      uint32 cells n = rows * columns
 *   16      uint32 first row of the block in its pass, counted from 0
 *   20      uint32 rows
 *   24      uint32 columns
 *   28      uint32 0, reserved
 *   32      int32[n]   longitude, 1e-5 degrees east, -180 <= lon < 180
 *           int32[n]   latitude, 1e-5 degrees north
 *           uint32[n]  time, whole seconds since 1970-01-01 UTC
 *           uint32[n]  our flags (wind/flags)
 *           float32[n] wind speed, m/s, NaN where none
 *           float32[n] direction the wind blows from, degrees true, NaN where none or not known
 *           int16[4n]  footprint half-sides, metres (swath/footprints)
 *           uint8[n]   state: 0 never looked, 1 looked but no wind, 2 wind
 *           padding to 8
 */
export const BLOCK_HEADER_BYTES = 32;
const CELL_BYTES = 4 * 6 + 8 + 1;

/** The columns of one block as views into its payload. Cell i is row firstRow + floor(i / columns), column i % columns. */
export interface DrawBlock {
  blockId: number;
  passId: number;
  firstRow: number;
  rows: number;
  columns: number;
  cells: number;
  lonE5: Int32Array<ArrayBuffer>;
  latE5: Int32Array<ArrayBuffer>;
  timeS: Uint32Array<ArrayBuffer>;
  flags: Uint32Array<ArrayBuffer>;
  speedMs: Float32Array<ArrayBuffer>;
  directionFrom: Float32Array<ArrayBuffer>;
  halfSidesM: Int16Array<ArrayBuffer>;
  state: Uint8Array<ArrayBuffer>;
}

/** Bytes of a block of so many cells, header and padding included. */
export function blockBytes(cells: number): number {
  return Math.ceil((BLOCK_HEADER_BYTES + cells * CELL_BYTES) / 8) * 8;
}

/** Writes a block's header into a buffer at an offset that is a multiple of 8, and gives views of its columns to fill. */
export function layOutBlock(
  buffer: ArrayBuffer,
  offset: number,
  header: { blockId: number; passId: number; firstRow: number; rows: number; columns: number },
): DrawBlock {
  const cells = header.rows * header.columns;
  const words = new Uint32Array(buffer, offset, BLOCK_HEADER_BYTES / 4);
  words.set([header.blockId, header.passId, blockBytes(cells), cells, header.firstRow, header.rows, header.columns, 0]);
  return viewBlock(buffer, offset);
}

/** All blocks of a payload, as views. Throws a RangeError when a block reaches past the payload. */
export function viewBlocks(payload: ArrayBuffer): DrawBlock[] {
  const blocks: DrawBlock[] = [];
  let offset = 0;
  while (offset + BLOCK_HEADER_BYTES <= payload.byteLength) {
    blocks.push(viewBlock(payload, offset));
    const bytes = new Uint32Array(payload, offset + 8, 1)[0];
    if (bytes < BLOCK_HEADER_BYTES) throw new RangeError(`a block of ${bytes} bytes at ${offset} is no block`);
    offset += bytes;
  }
  return blocks;
}

function viewBlock(buffer: ArrayBuffer, offset: number): DrawBlock {
  const [blockId, passId, , cells, firstRow, rows, columns] = new Uint32Array(buffer, offset, BLOCK_HEADER_BYTES / 4);
  const at = (column: number) => offset + BLOCK_HEADER_BYTES + column * cells * 4;
  return {
    blockId,
    passId,
    firstRow,
    rows,
    columns,
    cells,
    lonE5: new Int32Array(buffer, at(0), cells),
    latE5: new Int32Array(buffer, at(1), cells),
    timeS: new Uint32Array(buffer, at(2), cells),
    flags: new Uint32Array(buffer, at(3), cells),
    speedMs: new Float32Array(buffer, at(4), cells),
    directionFrom: new Float32Array(buffer, at(5), cells),
    halfSidesM: new Int16Array(buffer, at(6), cells * 4),
    state: new Uint8Array(buffer, at(8), cells),
  };
}
