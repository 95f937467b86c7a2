#!/usr/bin/env node
import { askForNode24, findNode24, runUnder } from '../node24.mjs';

const node = findNode24();
if (node === process.execPath) {
  const { runCommand } = await import('./run-command.ts');
  process.exitCode = await runCommand(process.argv.slice(2), process);
} else if (node !== null) {
  process.exitCode = await runUnder(node, import.meta.url);
} else {
  process.stderr.write(`${askForNode24}\n`);
  process.exitCode = 2;
}
