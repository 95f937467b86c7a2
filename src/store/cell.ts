import { viewBlocks } from '../contract/packed-swath.ts';
import { Problem } from '../problems/problem.ts';
import type { Archive } from './archive.ts';

/** Everything stored of one cell; NaN where the file did not say. */
export interface StoredCell {
  /** NEVER_LOOKED, LOOKED_NO_WIND or WIND (swath/swath). */
  state: number;
  lon: number;
  lat: number;
  timeMs: number;
  speedMs: number;
  directionFrom: number;
  flags: number;
  rawFlags: number;
  /** Counted from 1; 0 where none. */
  chosenSolution: number;
  solutions: { speedMs: number; directionFrom: number; probability: number; fitDistance: number }[];
  beams: { incidenceDeg: number; azimuthDeg: number; backscatterDb: number; noisePercent: number }[];
  background: { speedMs: number; directionFrom: number } | null;
  iceProbability: number;
}

/** One cell of a pass by its row and column, counted from 0. Throws 'not-stored' outside the pass. */
export function readCell(archive: Archive, passId: number, row: number, column: number): StoredCell {
  const found = archive.database
    .prepare('SELECT * FROM blocks WHERE passId = ? AND firstRow <= ? AND firstRow + rows > ?')
    .get(passId, row, row) as { blockId: number; firstRow: number; drawing: Buffer } | undefined;
  if (found === undefined) throw new Problem('not-stored', `Pass ${passId} has no row ${row + 1} in the archive.`);
  const [block] = viewBlocks(new Uint8Array(found.drawing).buffer);
  if (column >= block.columns) {
    throw new Problem('not-stored', `Pass ${passId} has ${block.columns} columns, not ${column + 1}.`);
  }
  const cell = (row - found.firstRow) * block.columns + column;
  const { slots, ...solutions } = readGroup(archive, 'blockSolutions', found.blockId);
  const { count, ...beams } = readGroup(archive, 'blockBeams', found.blockId);
  return {
    state: block.state[cell],
    speedMs: block.speedMs[cell],
    directionFrom: block.directionFrom[cell],
    flags: block.flags[cell],
    ...readDetails(archive, found.blockId, cell),
    solutions: readEntries(solutions as Record<SolutionColumn, Buffer>, solutionColumns, cell, Number(slots ?? 0)),
    beams: readEntries(beams as Record<BeamColumn, Buffer>, beamColumns, cell, Number(count ?? 0)),
    ...readBackground(archive, found.blockId, cell),
  };
}

const solutionColumns = ['speedMs', 'directionFrom', 'probability', 'fitDistance'] as const;
type SolutionColumn = (typeof solutionColumns)[number];

const beamColumns = ['incidenceDeg', 'azimuthDeg', 'backscatterDb', 'noisePercent'] as const;
type BeamColumn = (typeof beamColumns)[number];

type Group = Record<string, Buffer | number | null>;

function readGroup(
  archive: Archive,
  table: 'blockDetails' | 'blockSolutions' | 'blockBeams' | 'blockBackgrounds',
  blockId: number,
): Group {
  return (archive.database.prepare(`SELECT * FROM ${table} WHERE blockId = ?`).get(blockId) as Group | undefined) ?? {};
}

function readDetails(archive: Archive, blockId: number, cell: number) {
  const details = readGroup(archive, 'blockDetails', blockId) as Record<string, Buffer>;
  return {
    lon: details.lon.readDoubleLE(cell * 8),
    lat: details.lat.readDoubleLE(cell * 8),
    timeMs: details.timeMs.readDoubleLE(cell * 8),
    rawFlags: details.rawFlags.readUInt32LE(cell * 4),
    chosenSolution: details.chosenSolution[cell],
  };
}

function readBackground(archive: Archive, blockId: number, cell: number) {
  const { speedMs, directionFrom, iceProbability } = readGroup(archive, 'blockBackgrounds', blockId);
  const at = (column: unknown) => (column instanceof Buffer ? column.readFloatLE(cell * 4) : Number.NaN);
  return {
    background: speedMs ? { speedMs: at(speedMs), directionFrom: at(directionFrom) } : null,
    iceProbability: at(iceProbability),
  };
}

/** The entries of one cell out of columns that hold `width` of them for each cell. */
function readEntries<Name extends string>(
  columns: Record<Name, Buffer>,
  names: readonly Name[],
  cell: number,
  width: number,
): Record<Name, number>[] {
  return Array.from({ length: width }, (_, entry) => {
    const values = names.map((name) => [name, columns[name].readFloatLE((cell * width + entry) * 4)]);
    return Object.fromEntries(values) as Record<Name, number>;
  });
}
