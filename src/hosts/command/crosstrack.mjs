#!/usr/bin/env node
import { runUnderNode24 } from '../node24.mjs';

await runUnderNode24(new URL('./main.ts', import.meta.url));
