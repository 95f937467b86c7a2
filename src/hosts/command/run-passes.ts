import type { PassSummary } from '../../contract/values.ts';
import { openDesk } from '../../operations/desk.ts';
import { describeInstallation } from '../../operations/installation.ts';
import { toWholeKnots } from '../../wind/units.ts';
import { formatClock, formatDate, formatPosition } from '../../wind/words.ts';
import type { Words } from './run-command.ts';
import { describeCautions } from './run-inspect.ts';
import type { Terminal } from './terminal.ts';

/** Lists the passes in the archive, newest first. */
export async function runPasses({ given, isJson, archivePath }: Words, terminal: Terminal): Promise<number> {
  if (given.length > 0) {
    terminal.stderr.write("'passes' lists them all and takes no names.\n");
    return 2;
  }
  const desk = openDesk({ ...describeInstallation(), archivePath });
  try {
    const { passes } = await desk.perform('listPasses', {});
    if (isJson) terminal.stdout.write(`${JSON.stringify(passes, null, 2)}\n`);
    else if (passes.length === 0) terminal.stdout.write('The archive holds no passes.\n');
    else terminal.stdout.write(`${[...passes.map(describePass), '', describeCautions()].join('\n')}\n`);
    return 0;
  } finally {
    await desk.close();
  }
}

/** Removes passes by their numbers; what is not there is told and the rest removed all the same. */
export async function runRemove({ given, archivePath }: Words, terminal: Terminal): Promise<number> {
  if (given.length === 0 || !given.every((word) => /^[1-9]\d{0,14}$/.test(word))) {
    terminal.stderr.write("Name passes by the numbers that 'crosstrack passes' lists: crosstrack remove PASS...\n");
    return 2;
  }
  const desk = openDesk({ ...describeInstallation(), archivePath });
  let code = 0;
  try {
    for (const word of given) {
      const removed = desk.perform('removePass', { passId: Number(word) });
      const outcome = await removed.then(
        () => `Pass ${word} was removed.`,
        (problem: Error) => problem,
      );
      if (typeof outcome === 'string') terminal.stdout.write(`${outcome}\n`);
      else {
        terminal.stderr.write(`${outcome.message}\n`);
        code = 1;
      }
    }
    return code;
  } finally {
    await desk.close();
  }
}

function describePass(pass: PassSummary): string {
  const when = `${formatDate(pass.startMs)} ${formatClock(pass.startMs)} to ${formatClock(pass.endMs)} UTC`;
  const counts = `${pass.cells} cells, ${pass.winds} winds, ${pass.galeWinds} of gale force or more`;
  const demonstration = pass.isDemonstration ? ' (demonstration, invented data)' : '';
  return `${pass.passId}  ${when}  ${pass.band ?? 'unknown'} band  ${counts}, ${describeStrongest(pass)}  ${pass.file}${demonstration}`;
}

function describeStrongest({ maxSpeedMs, maxLon, maxLat }: PassSummary): string {
  if (maxSpeedMs === null || maxLon === null || maxLat === null) return 'no wind';
  return `strongest ${toWholeKnots(maxSpeedMs)} kt at ${formatPosition(maxLon, maxLat)}`;
}
