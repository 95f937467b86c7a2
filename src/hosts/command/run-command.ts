import { parseArgs } from 'node:util';
import { toProblem } from '../../problems/problem.ts';
import { helpText } from './help-text.ts';
import { runInspect } from './run-inspect.ts';
import { runLoad } from './run-load.ts';
import { runPasses, runRemove } from './run-passes.ts';
import type { Terminal } from './terminal.ts';

/** What the user typed after the command's name. */
export interface Words {
  /** Files, folders or ids. */
  given: string[];
  isJson: boolean;
  archivePath: string | undefined;
}

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
  const parsed = parseWords(rest);
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

/** The words as options and the rest, or a sentence that says what is wrong with them. */
function parseWords(args: string[]): Words | string {
  try {
    const { values, positionals } = parseArgs({
      args,
      allowPositionals: true,
      options: { json: { type: 'boolean' }, archive: { type: 'string' } },
    });
    return { given: positionals, isJson: values.json ?? false, archivePath: values.archive };
  } catch (thrown) {
    return (thrown as Error).message.split('. ')[0];
  }
}
