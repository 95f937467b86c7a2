import { Problem } from '../problems/problem.ts';
import { measureFootprints } from '../swath/footprints.ts';
import { type SwathSummary, summariseSwath } from '../swath/summarise.ts';
import { NEVER_LOOKED, type Swath } from '../swath/swath.ts';
import type { Archive } from './archive.ts';
import { measureBoxes } from './measure-boxes.ts';
import { packBlock } from './pack-block.ts';

/** The file a pass came from. */
export interface SourceFile {
  /** SHA-256 of its bytes, hexadecimal. */
  hash: string;
  name: string;
  bytes: number;
  /** How many passes it holds in all. */
  parts: number;
  isDemonstration: boolean;
  loadedAtMs: number;
}

/** Rows of one block: 32 rows of 42 cells at 25 km are 800 km of track and 44 kB to draw. */
export const ROWS_PER_BLOCK = 32;

/** A stored pass, and whether it was not there before. */
export interface KeptPass {
  passId: number;
  isNew: boolean;
}

/**
 * Stores one pass of a file, whole or not at all; partOfFile is counted from 1. The same part of the same content is
 * stored once: asked again, its id is given and nothing changes. Every cell that was looked at must have a place and a time.
 */
export function keepPass(archive: Archive, file: SourceFile, partOfFile: number, swath: Swath): KeptPass {
  const summary = summariseSwath(swath);
  if (summary.cells === 0) throw new Problem('no-cells', 'This pass holds no cell that was looked at.');
  checkPlaces(swath);
  const keep = archive.database.transaction(() => {
    const fileId = keepFile(archive, file);
    const known = archive.database
      .prepare('SELECT passId FROM passes WHERE fileId = ? AND partOfFile = ?')
      .pluck()
      .get(fileId, partOfFile) as number | undefined;
    if (known !== undefined) return { passId: known, isNew: false };
    const passId = insertPass(archive, fileId, partOfFile, swath, summary);
    insertBlocks(archive, passId, swath);
    return { passId, isNew: true };
  });
  return keep.immediate();
}

/** A wind without a place or a time can neither be drawn nor searched; a decoder must have left it out. */
function checkPlaces(swath: Swath): void {
  for (let cell = 0; cell < swath.state.length; cell++) {
    if (swath.state[cell] === NEVER_LOOKED) continue;
    if (Number.isFinite(swath.lon[cell] + swath.lat[cell] + swath.timeMs[cell])) continue;
    throw new Problem('damaged', 'A cell that was looked at has no position or no time.', {
      part: `row ${Math.floor(cell / swath.columns) + 1}, column ${(cell % swath.columns) + 1}`,
    });
  }
}

function keepFile(archive: Archive, file: SourceFile): number {
  archive.database
    .prepare(
      `INSERT INTO files (hash, name, bytes, parts, isDemonstration, loadedAtMs) VALUES (?, ?, ?, ?, ?, ?)
       ON CONFLICT (hash) DO NOTHING`,
    )
    .run(file.hash, file.name, file.bytes, file.parts, Number(file.isDemonstration), file.loadedAtMs);
  return archive.database.prepare('SELECT fileId FROM files WHERE hash = ?').pluck().get(file.hash) as number;
}

function insertPass(archive: Archive, fileId: number, partOfFile: number, swath: Swath, summary: SwathSummary): number {
  const row = {
    ...summary,
    fileId,
    partOfFile,
    startMs: Math.round(summary.startMs),
    endMs: Math.round(summary.endMs),
    maxTimeMs: summary.maxTimeMs === null ? null : Math.round(summary.maxTimeMs),
    checksRain: Number(summary.checksRain),
    band: swath.band,
    viewing: swath.viewing,
    platformCode: swath.platformCode,
    sourceAsRead: swath.sourceAsRead,
    rows: swath.rows,
    columns: swath.columns,
    cellSizeM: swath.cellSizeM > 0 ? swath.cellSizeM : null,
    flagReading: swath.flagReading,
    isDirectionStated: Number(swath.isDirectionStated),
    notes: JSON.stringify(swath.notes),
  };
  const names = Object.keys(row);
  return archive.database
    .prepare(
      `INSERT INTO passes (${names.join(', ')}) VALUES (${names.map((name) => `@${name}`).join(', ')}) RETURNING passId`,
    )
    .pluck()
    .get(row) as number;
}

function insertBlocks(archive: Archive, passId: number, swath: Swath): void {
  const { halfSidesM } = measureFootprints(swath);
  const insertBlock = archive.database
    .prepare(
      `INSERT INTO blocks (passId, firstRow, rows, cells, startMs, endMs, drawing)
       VALUES (?, ?, ?, ?, ?, ?, ?) RETURNING blockId`,
    )
    .pluck();
  const insertBox = archive.database.prepare('INSERT INTO blockBoxes VALUES (?, ?, ?, ?, ?)');
  const insertGroups = prepareGroups(archive, swath);
  for (let firstRow = 0; firstRow < swath.rows; firstRow += ROWS_PER_BLOCK) {
    const rows = Math.min(ROWS_PER_BLOCK, swath.rows - firstRow);
    const span = measureSpan(swath, firstRow, rows);
    const drawing = new Uint8Array(packBlock(swath, halfSidesM, firstRow, rows));
    const cells = rows * swath.columns;
    const blockId = insertBlock.get(passId, firstRow, rows, cells, span.startMs, span.endMs, drawing) as number;
    for (const [index, box] of measureBoxes(swath, halfSidesM, firstRow, rows).entries()) {
      insertBox.run(2 * blockId + index, box.west, box.east, box.south, box.north);
    }
    insertGroups(blockId, firstRow * swath.columns, (firstRow + rows) * swath.columns);
  }
}

/** First and last look of some rows, ms; null where nothing was looked at. */
function measureSpan(swath: Swath, firstRow: number, rows: number): { startMs: number | null; endMs: number | null } {
  let startMs = Number.POSITIVE_INFINITY;
  let endMs = Number.NEGATIVE_INFINITY;
  for (let cell = firstRow * swath.columns; cell < (firstRow + rows) * swath.columns; cell++) {
    if (swath.state[cell] === NEVER_LOOKED) continue;
    startMs = Math.min(startMs, swath.timeMs[cell]);
    endMs = Math.max(endMs, swath.timeMs[cell]);
  }
  return startMs > endMs ? { startMs: null, endMs: null } : { startMs: Math.floor(startMs), endMs: Math.ceil(endMs) };
}

/** Everything that is not drawn, group by group; a group the file does not hold takes no room. */
function prepareGroups(archive: Archive, swath: Swath): (blockId: number, from: number, to: number) => void {
  const insertDetails = archive.database.prepare('INSERT INTO blockDetails VALUES (?, ?, ?, ?, ?, ?)');
  const insertSolutions = archive.database.prepare('INSERT INTO blockSolutions VALUES (?, ?, ?, ?, ?, ?)');
  const insertBeams = archive.database.prepare('INSERT INTO blockBeams VALUES (?, ?, ?, ?, ?, ?)');
  const insertBackground = archive.database.prepare('INSERT INTO blockBackgrounds VALUES (?, ?, ?, ?)');
  const { solutions, beams, background, iceProbability } = swath;
  return (blockId, from, to) => {
    const cut = (column: Column, width = 1) => cutBytes(column, from * width, to * width);
    insertDetails.run(
      blockId,
      cut(swath.lon),
      cut(swath.lat),
      cut(swath.timeMs),
      cut(swath.rawFlags),
      cut(swath.chosenSolution),
    );
    if (solutions) {
      const { slots } = solutions;
      const columns = [solutions.speedMs, solutions.directionFrom, solutions.probability, solutions.fitDistance];
      insertSolutions.run(blockId, slots, ...columns.map((column) => cut(column, slots)));
    }
    if (beams) {
      const { count } = beams;
      const columns = [beams.incidenceDeg, beams.azimuthDeg, beams.backscatterDb, beams.noisePercent];
      insertBeams.run(blockId, count, ...columns.map((column) => cut(column, count)));
    }
    if (background || iceProbability) {
      insertBackground.run(
        blockId,
        background && cut(background.speedMs),
        background && cut(background.directionFrom),
        iceProbability && cut(iceProbability),
      );
    }
  };
}

type Column = Float64Array | Float32Array | Uint32Array | Uint8Array;

/** Entries from..to of a column as the bytes they are, not copied. */
function cutBytes(column: Column, from: number, to: number): Uint8Array {
  const part = column.subarray(from, to);
  return new Uint8Array(part.buffer, part.byteOffset, part.byteLength);
}
