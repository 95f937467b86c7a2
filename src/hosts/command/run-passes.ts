import type { PassSummary } from '../../contract/values.ts';
import { toProblem } from '../../problems/problem.ts';
import { toWholeKnots } from '../../wind/units.ts';
import { formatClock, formatDate, formatPosition } from '../../wind/words.ts';
import { atDesk } from './at-desk.ts';
import { describeCautions } from './describe-cautions.ts';
import type { Terminal } from './terminal.ts';
import type { Words } from './words.ts';

/** Lists the passes in the archive, newest first. */
export async function runPasses({ given, isJson, archivePath }: Words, terminal: Terminal): Promise<number> {
  if (given.length > 0) {
    terminal.stderr.write("'passes' lists them all and takes no names.\n");
    return 2;
  }
  const { passes } = await atDesk(archivePath, (desk) => desk.perform('listPasses', {}));
  if (isJson) terminal.stdout.write(`${JSON.stringify(passes, null, 2)}\n`);
  else if (passes.length === 0) terminal.stdout.write('The archive holds no passes.\n');
  else terminal.stdout.write(`${[...passes.map(describePass), '', describeCautions()].join('\n')}\n`);
  return 0;
}

/** Removes passes by their numbers; what is not there is told and the rest removed all the same. */
export async function runRemove({ given, archivePath }: Words, terminal: Terminal): Promise<number> {
  if (given.length === 0 || !given.every((word) => /^[1-9]\d{0,14}$/.test(word))) {
    terminal.stderr.write("Name passes by the numbers that 'crosstrack passes' lists: crosstrack remove PASS...\n");
    return 2;
  }
  return atDesk(archivePath, async (desk) => {
    let code = 0;
    for (const word of given) {
      try {
        await desk.perform('removePass', { passId: Number(word) });
        terminal.stdout.write(`Pass ${word} was removed.\n`);
      } catch (thrown) {
        terminal.stderr.write(`${toProblem(thrown).message}\n`);
        code = 1;
      }
    }
    return code;
  });
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
