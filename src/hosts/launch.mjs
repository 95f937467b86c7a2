import { runUnderNode24 } from './node24.mjs';

await runUnderNode24(new URL('./launch/start.ts', import.meta.url));
