import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { findProfileParent } from './browsers.ts';
import { listWindowFlags } from './quiet-flags.ts';

/**
 * Opens an address as an app window with a profile of its own, which makes this process the window's and goes with it.
 * Resolves when the window is closed or could not be opened; the signal closes it.
 */
export async function openBrowser(browser: string, url: string, signal: AbortSignal): Promise<void> {
  const profileFolder = mkdtempSync(join(findProfileParent(browser, tmpdir()), 'crosstrack-window-'));
  const isRoot = process.getuid?.() === 0;
  const window = spawn(browser, listWindowFlags(url, profileFolder, isRoot), { stdio: 'ignore' });
  const close = () => void window.kill();
  signal.addEventListener('abort', close, { once: true });
  try {
    // 'error' rejects: the program could not be started at all.
    await once(window, 'exit');
  } finally {
    signal.removeEventListener('abort', close);
    rmSync(profileFolder, { recursive: true, force: true, maxRetries: 5, retryDelay: 200 });
  }
}
