import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createInterface } from 'node:readline';
import { fileURLToPath } from 'node:url';
import { _electron, type BrowserContext, test as base, type Page } from '@playwright/test';

export { expect } from '@playwright/test';

/** Set by the project of Playwright's configuration, or by a journey with `test.use`. */
export interface JourneyOptions {
  host: 'loopback' | 'electron';
  electronProgram: string | undefined;
  /** Whether an unused archive is given the demonstration, as a user's is. */
  withDemonstration: boolean;
}

/** The application under test, on an archive of its own in a temporary folder. */
export interface Application {
  page: Page;
  archivePath: string;
  /** A temporary folder that goes when the journey ends; the archive lies in it. */
  folder: string;
  /** Ends the application and starts it again on the same archive; gives its new page. */
  restart(): Promise<Page>;
}

interface Started {
  page: Page;
  stop(): Promise<void>;
}

const projectFolder = fileURLToPath(new URL('../../..', import.meta.url));

/**
 * A test whose `page` stands at the running application. Each test gets an application and an archive of its own,
 * empty unless `test.use({ withDemonstration: true })`.
 */
export const test = base.extend<JourneyOptions & { application: Application }>({
  host: ['loopback', { option: true }],
  electronProgram: [undefined, { option: true }],
  withDemonstration: [false, { option: true }],
  application: async ({ host, electronProgram, withDemonstration, context }, use) => {
    const folder = mkdtempSync(join(tmpdir(), 'crosstrack-journey-'));
    const archivePath = join(folder, 'archive.db');
    const start = () =>
      host === 'electron' && electronProgram !== undefined
        ? startElectron(electronProgram, archivePath, withDemonstration)
        : startInBrowser(context, archivePath, withDemonstration);
    let started = await start();
    await use({
      archivePath,
      folder,
      page: started.page,
      restart: async () => {
        await started.stop();
        started = await start();
        return started.page;
      },
    });
    await started.stop();
    rmSync(folder, { recursive: true, force: true });
  },
  page: async ({ application }, use) => use(application.page),
});

async function startInBrowser(
  context: BrowserContext,
  archivePath: string,
  withDemonstration: boolean,
): Promise<Started> {
  const host = await startHost(archivePath, withDemonstration);
  const page = await context.newPage();
  await page.goto(host.url);
  return {
    page,
    stop: async () => {
      await page.close();
      await host.stop();
    },
  };
}

async function startElectron(program: string, archivePath: string, withDemonstration: boolean): Promise<Started> {
  const isRootOnLinux = process.platform === 'linux' && process.getuid?.() === 0;
  const application = await _electron.launch({
    executablePath: program,
    args: [
      projectFolder,
      `--archive=${archivePath}`,
      ...(withDemonstration ? [] : ['--no-demonstration']),
      ...(isRootOnLinux ? ['--no-sandbox'] : []),
    ],
  });
  return { page: await application.firstWindow(), stop: () => application.close() };
}

/** A loopback host in a process of its own, as a user starts it. */
export interface Host {
  url: string;
  stop(): Promise<void>;
}

/** Starts the launcher without a window, as `npm start -- --no-window` does, and reads the address it prints. */
export async function startHost(
  archivePath: string,
  withDemonstration: boolean,
  variables: Record<string, string> = {},
): Promise<Host> {
  const child = spawn(
    process.execPath,
    [
      join(projectFolder, 'src/hosts/launch.mjs'),
      '--no-window',
      `--archive=${archivePath}`,
      ...(withDemonstration ? [] : ['--no-demonstration']),
    ],
    { env: { ...process.env, CROSSTRACK_NO_FETCH: '1', ...variables }, stdio: ['ignore', 'pipe', 'inherit'] },
  );
  const url = await readAddress(child);
  return {
    url,
    stop: async () => {
      const ended = once(child, 'exit');
      child.kill('SIGTERM');
      await ended;
    },
  };
}

async function readAddress(child: ChildProcess): Promise<string> {
  if (child.stdout === null) throw new Error('the host has no output to read');
  const told: string[] = [];
  for await (const line of createInterface(child.stdout)) {
    const address = line.match(/http:\/\/127\.0\.0\.1:\d+\/#\S+/);
    if (address) return address[0];
    told.push(line);
  }
  throw new Error(`the host ended before it served:\n${told.join('\n')}`);
}
