import { Problem } from '../../../problems/problem.ts';
import { type Swath, type Viewing, WIND } from '../../../swath/swath.ts';
import { openMessage } from '../../containers/bufr/open-message.ts';
import { arrangePasses, isPlaced } from './arrange-passes.ts';
import { type CellTable, createCellTable, fillCells } from './cell-table.ts';
import { chooseWinds } from './choose-winds.ts';
import { dropEmptyParts } from './drop-empty-parts.ts';
import { findFlagTable } from './flag-tables.ts';
import { readFlags } from './read-flags.ts';
import { readLikelihoods } from './read-likelihoods.ts';
import type { SurveyedMessage } from './survey-message.ts';
import { takeCells } from './take-cells.ts';

/** Reads messages of one kind into passes. Cells that are damaged or cannot be placed are counted in `problems`. */
export function readPasses(bytes: Uint8Array, messages: readonly SurveyedMessage[], problems: Problem[]): Swath[] {
  const { viewing, flagDescriptor } = messages[0];
  const table = readTable(bytes, messages);
  const { cells } = table;
  if (table.outside.size > 0) problems.push(describeOutside(table.outside));
  const notes: string[] = [];
  if (cells.solutions && !readLikelihoods(cells.solutions, viewing !== 'fan-beam')) {
    notes.push('The likelihoods of this file are no probabilities of the solutions, so none are given.');
  }
  const choices = chooseWinds(table);
  if (choices.unselected > 0) {
    const cellsTold = `Cells with winds of which none is selected: ${choices.unselected}`;
    notes.push(`${cellsTold}. They show the likeliest speed and no direction.`);
  }
  if (choices.withoutDirection > 0) {
    notes.push(`Cells whose selected wind has no usable direction: ${choices.withoutDirection}.`);
  }
  dropEmptyParts(cells);
  if (!cells.solutions) notes.push('The file holds radar looks but no winds.');
  if (viewing === 'pencil-beam' && cells.beams) notes.push('Azimuths and noise of the looks are not read.');
  tellUnplaced(table, problems);
  return arrangePasses(table).map((pass) => {
    const swath = takeCells(cells, pass);
    describePass(swath, viewing, table, pass.cellAt[pass.cellAt.findIndex((cell) => cell >= 0)]);
    swath.notes = [...notes];
    readFlags(swath, findFlagTable(flagDescriptor));
    return swath;
  });
}

function readTable(bytes: Uint8Array, messages: readonly SurveyedMessage[]): CellTable {
  const total = { cells: 0, looks: 0, solutions: 0 };
  for (const { size } of messages) {
    total.cells += size.cells;
    total.looks = Math.max(total.looks, size.looks);
    total.solutions = Math.max(total.solutions, size.solutions);
  }
  const table = createCellTable(total);
  let firstCell = 0;
  for (const { message, size, open } of messages) {
    const { reader, blocks } = open ?? openMessage(bytes, message);
    for (const block of blocks) fillCells(table, firstCell + block.firstSubset, reader, block);
    firstCell += size.cells;
  }
  return table;
}

function describeOutside(outside: ReadonlyMap<string, number>): Problem {
  const list = [...outside].map(([kind, count]) => `${kind} (${count})`).join(', ');
  const message = `Values outside their physical range are left out and their cells marked: ${list}.`;
  return new Problem('values-out-of-range', message);
}

/** Cells without a place cannot be drawn or searched; that they exist, and how strong their wind is, must not be lost. */
function tellUnplaced(table: CellTable, problems: Problem[]): void {
  let [unplaced, winds, strongestMs] = [0, 0, 0];
  for (let cell = 0; cell < table.cellNumber.length; cell++) {
    if (isPlaced(table, cell)) continue;
    unplaced++;
    if (table.cells.state[cell] !== WIND) continue;
    winds++;
    strongestMs = Math.max(strongestMs, table.cells.speedMs[cell]);
  }
  if (unplaced === 0) return;
  const strongest = winds > 0 ? `, of which ${winds} with a wind of up to ${strongestMs.toFixed(1)} m/s` : '';
  const message = `Cells left out for want of a usable position, time or cell number: ${unplaced}${strongest}.`;
  problems.push(new Problem('damaged', message));
}

function describePass(swath: Swath, viewing: Viewing | null, table: CellTable, firstCell: number): void {
  const platformCode = table.platformCode[firstCell];
  swath.viewing = viewing;
  // The sequences of fan-beam winds are of C-band radars, those of pencil beams of Ku-band ones (FM 94 table D, 3 12).
  swath.band = viewing && ({ 'fan-beam': 'C', 'pencil-beam': 'Ku' } as const)[viewing];
  swath.platformCode = Number.isNaN(platformCode) ? null : platformCode;
  swath.cellSizeM = table.cellSizeM[firstCell];
  // FM 94 table B, class 11: wind directions are those from which the wind blows.
  swath.isDirectionStated = true;
}
