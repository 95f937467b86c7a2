import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

/** One comparison of a bench: ours against a rival in the same run, with the bound that its ratio must keep. */
interface Comparison {
  name: string;
  oursMs: number;
  rivalMs: number;
  /** Ours must be at least so many times faster than the rival. */
  atLeast?: number;
  /** Ours may take at most so many times as long as the rival. */
  atMost?: number;
}

/** What a bench gives: its comparisons. It throws, naming the tool, where a rival is not on this machine. */
type Bench = () => Promise<Comparison[]>;

const benches: readonly [file: string, name: string][] = [
  ['decode-bufr.ts', 'benchBufr'],
  ['decode-netcdf.ts', 'benchNetcdf'],
  ['store-blocks.ts', 'benchStore'],
  ['frame.ts', 'benchFrames'],
];

/** Parts of file names, when only some are wanted: `npm run bench -- decode`. */
const wanted = process.argv.slice(2);

let measured = 0;
let shortfalls = 0;
for (const [file, name] of benches.filter(
  ([file]) => wanted.length === 0 || wanted.some((part) => file.includes(part)),
)) {
  const path = new URL(file, import.meta.url);
  if (!existsSync(fileURLToPath(path))) {
    fallShort(`${file} is not there: nothing of it was measured`);
    continue;
  }
  const bench: Bench = (await import(path.href))[name];
  try {
    for (const comparison of await bench()) tell(comparison);
  } catch (thrown) {
    fallShort(`${file} could not be measured: ${(thrown as Error).message}`);
  }
}
if (measured === 0) fallShort('Nothing was measured');
console.log(shortfalls === 0 ? 'Every bound is kept.' : `${shortfalls} fell short.`);
process.exitCode = shortfalls === 0 ? 0 : 1;

function tell({ name, oursMs, rivalMs, atLeast, atMost }: Comparison): void {
  const isSpeedup = atLeast !== undefined;
  const ratio = isSpeedup ? rivalMs / oursMs : oursMs / rivalMs;
  const isKept = isSpeedup ? ratio >= atLeast : atMost !== undefined && ratio <= atMost;
  const wording = isSpeedup
    ? `${ratio.toFixed(1)} times faster (at least ${atLeast})`
    : `${ratio.toFixed(2)} times as long (at most ${atMost})`;
  console.log(
    `${name}\n    ours ${formatMs(oursMs)}, rival ${formatMs(rivalMs)}: ${wording}: ${isKept ? 'kept' : 'FELL SHORT'}`,
  );
  measured += 1;
  if (!isKept) shortfalls += 1;
}

function fallShort(sentence: string): void {
  console.log(`${sentence}: FELL SHORT`);
  shortfalls += 1;
}

function formatMs(lengthMs: number): string {
  return `${lengthMs.toFixed(lengthMs < 10 ? 2 : 0)} ms`;
}
