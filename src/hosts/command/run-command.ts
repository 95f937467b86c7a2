import { toProblem } from '../../problems/problem.ts';
import { helpText } from './help-text.ts';
import { runInspect } from './run-inspect.ts';
import { runLoad } from './run-load.ts';
import { runPasses, runRemove } from './run-passes.ts';
import type { Terminal } from './terminal.ts';
import { readWords, type Words } from './words.ts';

type Run = (words: Words, terminal: Terminal) => number | Promise<number>;

const runs: Readonly<Record<string, Run>> = {
  inspect: runInspect,
  load: runLoad,
  passes: runPasses,
  remove: runRemove,
};

/** Runs one command and gives its exit code: 0 done, 1 not all of it could be done, 2 not understood. */
export async function runCommand(words: readonly string[], terminal: Terminal): Promise<number> {
  const [name, ...rest] = words;
  if (name === 'help' || name === '--help' || rest.includes('--help')) {
    terminal.stdout.write(helpText);
    return 0;
  }
  if (name === undefined || !Object.hasOwn(runs, name)) {
    terminal.stderr.write(`${name === undefined ? 'No command was given' : `There is no command '${name}'`}.\n`);
    terminal.stderr.write(helpText);
    return 2;
  }
  const parsed = readWords(rest);
  if (typeof parsed === 'string') {
    terminal.stderr.write(`${parsed}\nSee: crosstrack help\n`);
    return 2;
  }
  try {
    return await runs[name](parsed, terminal);
  } catch (thrown) {
    const { code, message, place } = toProblem(thrown);
    terminal.stderr.write(`${message}${place.file ? ` (${place.file})` : ''} [${code}]\n`);
    return 1;
  }
}
