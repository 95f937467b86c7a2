import { parseArgs } from 'node:util';

/** What the user typed after a command's name. */
export interface Words {
  /** Files, folders or ids. */
  given: string[];
  isJson: boolean;
  archivePath: string | undefined;
}

/** The words as options and the rest, or a sentence that says what is wrong with them. */
export function readWords(args: string[]): Words | string {
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
