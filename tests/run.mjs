import { runUnderNode24 } from '../src/hosts/node24.mjs';

await runUnderNode24(new URL('./run-all.ts', import.meta.url));
