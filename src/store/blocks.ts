import type { GeoBox, TimeWindow } from '../contract/values.ts';
import type { Archive } from './archive.ts';

/** One block that a question found. */
export interface FoundBlock {
  blockId: number;
  passId: number;
  /** Cells of its rows, looked at or not. */
  cells: number;
}

/** The blocks whose footprints reach into a box and whose looks fall into a window, oldest stored first. */
export function findBlocks(archive: Archive, box: GeoBox, window: TimeWindow): FoundBlock[] {
  const find = archive.database.prepare(
    `SELECT blockId, passId, cells FROM blockBoxes JOIN blocks ON blockId = boxId / 2
     WHERE west <= @east AND east >= @west AND south <= @north AND north >= @south
       AND startMs <= @toMs AND endMs >= @fromMs`,
  );
  const found = new Map<number, FoundBlock>();
  for (const half of cutAtDateLine(box)) {
    for (const block of find.iterate({ ...half, ...window }) as Iterable<FoundBlock>) found.set(block.blockId, block);
  }
  return [...found.values()].sort((one, other) => one.blockId - other.blockId);
}

/** The drawings of blocks as one payload (contract/packed-swath), in the order asked; unknown ids are left out. */
export function readBlocks(archive: Archive, blockIds: readonly number[]): ArrayBuffer {
  const read = archive.database.prepare('SELECT passId, drawing FROM blocks WHERE blockId = ?');
  const found: { blockId: number; passId: number; drawing: Buffer }[] = [];
  let bytes = 0;
  for (const blockId of blockIds) {
    const row = read.get(blockId) as { passId: number; drawing: Buffer } | undefined;
    if (row === undefined) continue;
    found.push({ blockId, ...row });
    bytes += row.drawing.byteLength;
  }
  const payload = new Uint8Array(bytes);
  let offset = 0;
  for (const { blockId, passId, drawing } of found) {
    payload.set(drawing, offset);
    new Uint32Array(payload.buffer, offset, 2).set([blockId, passId]);
    offset += drawing.byteLength;
  }
  return payload.buffer;
}

function cutAtDateLine(box: GeoBox): GeoBox[] {
  if (box.west <= box.east) return [box];
  return [
    { ...box, east: 180 },
    { ...box, west: -180 },
  ];
}
