#!/usr/bin/env node
import { spawn } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { askForNode24, findNode24 } from '../node24.mjs';

const node = findNode24();
if (node === null) {
  process.stderr.write(`${askForNode24}\n`);
  process.exitCode = 2;
} else if (node === process.execPath) {
  const { runCommand } = await import('./run-command.ts');
  process.exitCode = await runCommand(process.argv.slice(2), process);
} else {
  // An interrupt reaches both; the child ends its work in order and this one waits for it.
  process.on('SIGINT', () => {});
  const child = spawn(node, [fileURLToPath(import.meta.url), ...process.argv.slice(2)], { stdio: 'inherit' });
  child.on('exit', (code) => {
    process.exitCode = code ?? 1;
  });
}
