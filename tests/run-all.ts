import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { existsSync, readFileSync, rmSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { findChromium } from '../.config/find-chromium.ts';
import { findElectronPackage, findElectronProgram } from '../src/hosts/launch/electron-runtime.ts';

/** How many tests of a run went which way. */
interface Counts {
  passed: number;
  failed: number;
  skipped: number;
}

/** The parts that we read of the reports of both runners: Vitest's are at the top, Playwright's in stats. */
type Report = Record<string, number> & { stats: Record<string, number> };

const root = fileURLToPath(new URL('..', import.meta.url));
const isWindows = process.platform === 'win32';

process.chdir(root);
process.exitCode = await runAll();

/** Checks, builds and runs every test; gives the exit code. A step that the tests need and that fails counts as one failure. */
async function runAll(): Promise<number> {
  rmSync('test-results', { recursive: true, force: true });
  const isReady =
    (await run('npm', ['run', 'check'])) &&
    (await run(process.execPath, ['.config/build.ts'])) &&
    (await haveChromium());
  const all = isReady ? await runTests() : { passed: 0, failed: 1, skipped: 0 };
  print(`${all.passed} passed, ${all.failed} failed, ${all.skipped} skipped`);
  return all.failed === 0 && all.passed > 0 ? 0 : 1;
}

async function runTests(): Promise<Counts> {
  const isUnitWell = await run(process.execPath, [
    'node_modules/vitest/vitest.mjs',
    'run',
    '--config=.config/vitest.config.ts',
    '--reporter=default',
    '--reporter=json',
    '--outputFile.json=test-results/unit.json',
  ]);
  const areJourneysWell = await run(process.execPath, [
    'node_modules/@playwright/test/cli.js',
    'test',
    '--config=.config/playwright.config.ts',
  ]);
  sayWhetherElectronRan();
  const unit = readCounts('test-results/unit.json', isUnitWell, (report) => ({
    passed: report.numPassedTests,
    failed: report.numFailedTests,
    skipped: report.numPendingTests + report.numTodoTests,
  }));
  const journeys = readCounts('test-results/journeys.json', areJourneysWell, ({ stats }) => ({
    passed: stats.expected,
    failed: stats.unexpected + stats.flaky,
    skipped: stats.skipped,
  }));
  return {
    passed: unit.passed + journeys.passed,
    failed: unit.failed + journeys.failed,
    skipped: unit.skipped + journeys.skipped,
  };
}

/** The counts of a runner's report. A runner that failed without a failed test, or left no report, counts as one failure. */
function readCounts(file: string, isWell: boolean, pick: (report: Report) => Counts): Counts {
  const counts = existsSync(file) ? pick(JSON.parse(readFileSync(file, 'utf8'))) : { passed: 0, failed: 1, skipped: 0 };
  return isWell || counts.failed > 0 ? counts : { ...counts, failed: 1 };
}

function sayWhetherElectronRan(): void {
  const packageFolder = findElectronPackage();
  if (packageFolder && findElectronProgram(packageFolder)) return;
  print('The journeys did not run in Electron: its runtime is not on this machine. They ran in the loopback host.');
}

/** Whether there is a Chromium to drive, after installing one where that is needed and can be done. */
async function haveChromium(): Promise<boolean> {
  if (findChromium() !== undefined) return true;
  if (process.getuid?.() === 0 && existsSync('/usr/bin/apt-get')) {
    print('No Chromium here: installing it by the package manager.');
    const install = ['install', '--yes', '--no-install-recommends', 'chromium'];
    const isInstalled =
      (await run('apt-get', install)) || ((await run('apt-get', ['update'])) && (await run('apt-get', install)));
    if (isInstalled && findChromium() !== undefined) return true;
  }
  print('No Chromium here: installing it by Playwright.');
  await run(process.execPath, ['node_modules/@playwright/test/cli.js', 'install', 'chromium'], 120_000);
  if (findChromium() !== undefined) return true;
  print('The journeys need a Chromium and none could be installed: install one, or name one in CROSSTRACK_BROWSER.');
  return false;
}

/** Runs a command with this terminal and tells whether it ended well; one that is silent for too long is ended. */
async function run(command: string, args: string[], patienceMs?: number): Promise<boolean> {
  const child = spawn(command, args, {
    stdio: ['ignore', 'pipe', 'inherit'],
    shell: isWindows && command === 'npm',
    env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive', CROSSTRACK_NO_FETCH: '1' },
  });
  let timer: NodeJS.Timeout | undefined;
  const wait = () => {
    clearTimeout(timer);
    if (patienceMs !== undefined) timer = setTimeout(() => child.kill(), patienceMs);
  };
  wait();
  child.stdout.on('data', (chunk) => {
    wait();
    process.stdout.write(chunk);
  });
  try {
    const [code] = await once(child, 'close');
    return code === 0;
  } catch (thrown) {
    print(`${command} did not start: ${(thrown as Error).message}`);
    return false;
  } finally {
    clearTimeout(timer);
  }
}

function print(line: string): void {
  process.stdout.write(`${line}\n`);
}
