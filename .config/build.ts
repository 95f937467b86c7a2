import { fileURLToPath } from 'node:url';
import { build } from 'vite';

const configFile = fileURLToPath(new URL('../electron.config.ts', import.meta.url));
for (const mode of ['main', 'renderer']) await build({ configFile, mode, logLevel: 'warn' });
