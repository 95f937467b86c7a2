import { type InspectedFile, type InspectedPass, inspectFiles } from '../../operations/inspect-files.ts';
import { type FlagName, flagWords } from '../../wind/flags.ts';
import { toWholeKnots } from '../../wind/units.ts';
import { formatPosition } from '../../wind/words.ts';
import { describeCautions } from './describe-cautions.ts';
import type { Terminal } from './terminal.ts';
import type { Words } from './words.ts';

/** Says what files hold: as one JSON array, or in plain words with the cautions below. */
export function runInspect({ given, isJson }: Words, terminal: Terminal): number {
  if (given.length === 0) {
    terminal.stderr.write('Name the files to inspect: crosstrack inspect FILE... [--json]\n');
    if (isJson) terminal.stdout.write('[]\n');
    return 2;
  }
  const files = inspectFiles(given);
  if (isJson) terminal.stdout.write(`${JSON.stringify(files, null, 2)}\n`);
  else terminal.stdout.write(`${[...files.map(describeFile), describeCautions()].join('\n')}\n`);
  const hasCells = (file: InspectedFile) => file.passes.some((pass) => pass.cells > 0);
  return files.every(hasCells) ? 0 : 1;
}

function describeFile({ file, format, passes, problems }: InspectedFile): string {
  return [
    `${file}: ${format ?? 'not read'}`,
    ...passes.flatMap((pass, index) => describePass(pass, index + 1)),
    ...problems.map(({ code, message, where }) => `  Problem: ${message} (${where}) [${code}]`),
    '',
  ].join('\n');
}

function describePass(pass: InspectedPass, number: number): string[] {
  const flags = Object.entries(pass.flagCounts).map(([name, count]) => `${flagWords[name as FlagName]} ${count}`);
  return [
    `  Pass ${number}: ${pass.start} to ${pass.end}, ${pass.rows} rows of ${pass.columns}`,
    `    ${pass.cells} cells looked at, ${pass.winds} with a wind, ${pass.windsOfGale} of gale force or more`,
    `    ${describeStrongest(pass)}`,
    `    ${describeSolutions(pass)}`,
    `    Flags: ${flags.length > 0 ? flags.join(', ') : 'none set'}`,
    ...(pass.directionStated ? [] : ['    The file does not say which way its directions point.']),
    ...pass.notes.map((note) => `    Note: ${note}`),
  ];
}

function describeSolutions({ beams, solutionsMax, windsNotFirstSolution }: InspectedPass): string {
  const looks = beams > 0 ? `${beams} radar looks in a cell` : 'No radar looks';
  if (solutionsMax === 0) return `${looks}; no solutions beside the wind itself.`;
  return `${looks}; up to ${solutionsMax} solutions, of which not the first was chosen in ${windsNotFirstSolution} cells.`;
}

function describeStrongest({ maxSpeedMs, maxLon, maxLat, maxTime }: InspectedPass): string {
  if (maxSpeedMs === null || maxLon === null || maxLat === null) return 'No wind, so no strongest wind.';
  const place = formatPosition(maxLon, maxLat);
  return `Strongest wind ${toWholeKnots(maxSpeedMs)} kt (${maxSpeedMs.toFixed(2)} m/s) at ${place}, ${maxTime}`;
}
