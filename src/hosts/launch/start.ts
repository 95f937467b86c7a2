import { fileURLToPath } from 'node:url';
import { type ServedDesk, serveOwnDesk } from '../loopback/serve-own-desk.ts';
import { findBrowser, hasDisplay } from './browsers.ts';
import { buildIfStale } from './build-if-stale.ts';
import { findElectronPackage, findElectronProgram } from './electron-runtime.ts';
import { fetchElectron } from './fetch-electron.ts';
import { findCacheFolder } from './folders.ts';
import { openBrowser } from './open-browser.ts';
import { type LaunchOptions, launchHelp, readLaunchOptions } from './options.ts';
import { runElectron } from './run-electron.ts';

const projectFolder = fileURLToPath(new URL('../../..', import.meta.url));

process.exit(await launch(process.argv.slice(2), listenForStop()));

/** Opens the application and resolves with the exit code once the user has closed or stopped it. */
async function launch(args: string[], stop: AbortSignal): Promise<number> {
  let options: LaunchOptions;
  try {
    options = readLaunchOptions(args);
  } catch (thrown) {
    process.stderr.write(`${(thrown as Error).message}\n\n${launchHelp}`);
    return 2;
  }
  if (options.isHelpAsked) {
    say(launchHelp.trimEnd());
    return 0;
  }
  try {
    await buildIfStale(projectFolder, say);
    if (options.isWindowWanted && options.port === undefined && hasDisplay()) {
      const reason = await openElectron(options, stop).catch((thrown: Error) => thrown.message);
      if (reason === undefined || stop.aborted) return 0;
      say(`Electron is not used here (${reason}): opening a browser's window instead.`);
    }
    await openInBrowser(options, stop);
    return 0;
  } catch (thrown) {
    process.stderr.write(`Crosstrack could not start: ${(thrown as Error).message}\n`);
    return 1;
  }
}

/** Resolves with undefined when Electron ran, else with the reason why it did not. */
async function openElectron(options: LaunchOptions, stop: AbortSignal): Promise<string | undefined> {
  const packageFolder = findElectronPackage();
  if (packageFolder === undefined) return 'its package is not installed';
  if (findElectronProgram(packageFolder) === undefined) {
    const cacheFolder = findCacheFolder();
    const failure = await fetchElectron({
      packageFolder,
      cacheFolder,
      isAsked: options.isFetchAsked,
      signal: stop,
      say,
    });
    if (failure !== undefined) return failure;
  }
  const program = findElectronProgram(packageFolder);
  if (program === undefined) return 'its runtime is not on this machine';
  const args = [projectFolder];
  if (options.archivePath !== undefined) args.push(`--archive=${options.archivePath}`);
  if (!options.isDemonstrationWanted) args.push('--no-demonstration');
  return runElectron({ program, args, signal: stop });
}

async function openInBrowser(options: LaunchOptions, stop: AbortSignal): Promise<void> {
  const served = await serveOwnDesk({ projectFolder, ...options });
  try {
    const reason = await showWindow(served, options, stop);
    if (reason === undefined || stop.aborted) return;
    say(`Crosstrack is served ${reason}: ${served.url}\nEnd it with Ctrl-C.`);
    await new Promise((resolve) => stop.addEventListener('abort', resolve));
  } finally {
    await served.close();
  }
}

/** Resolves with undefined once a window was opened and closed again, else with why there was none. */
async function showWindow(served: ServedDesk, options: LaunchOptions, stop: AbortSignal): Promise<string | undefined> {
  if (!options.isWindowWanted) return 'here';
  if (!hasDisplay()) return 'here, for there is no display';
  const browser = findBrowser();
  if (browser === undefined) return 'here, for no browser of the Chromium family was found';
  try {
    await openBrowser(browser, served.url, stop);
  } catch (thrown) {
    return `here, for ${browser} did not start (${(thrown as Error).message})`;
  }
  return served.wasVisited() ? undefined : `here, for ${browser} opened no window`;
}

/** Aborted by the first signal to end; the second ends the process as it is. */
function listenForStop(): AbortSignal {
  const stop = new AbortController();
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) {
    process.on(signal, () => {
      if (stop.signal.aborted) process.exit(1);
      stop.abort();
    });
  }
  return stop.signal;
}

function say(line: string): void {
  process.stdout.write(`${line}\n`);
}
