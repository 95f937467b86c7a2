import { spawn } from 'node:child_process';
import { once } from 'node:events';

/** Electron that ends with an error this soon never got as far as a window, ms. */
const EARLY_MS = 15_000;

/** How the Electron host is started. */
interface ElectronRun {
  program: string;
  /** Passed on to the Electron host: the project's folder, then its options. */
  args: string[];
  signal: AbortSignal;
}

/**
 * Runs the Electron host until its window is closed. Resolves with undefined when it ran, or with the reason in words
 * when it could not start.
 */
export async function runElectron({ program, args, signal }: ElectronRun): Promise<string | undefined> {
  const startedMs = Date.now();
  // Electron asked to be plain Node would open no window.
  const { ELECTRON_RUN_AS_NODE: _, ...variables } = process.env;
  const isRootOnLinux = process.platform === 'linux' && process.getuid?.() === 0;
  const electron = spawn(program, [...args, ...(isRootOnLinux ? ['--no-sandbox'] : [])], {
    stdio: 'inherit',
    env: variables,
  });
  const close = () => void electron.kill();
  signal.addEventListener('abort', close, { once: true });
  try {
    const [code, endedBy] = await once(electron, 'exit');
    if (code === 0 || signal.aborted || Date.now() - startedMs > EARLY_MS) return undefined;
    return `it ended at once (${code === null ? endedBy : `code ${code}`})`;
  } catch (thrown) {
    return (thrown as Error).message;
  } finally {
    signal.removeEventListener('abort', close);
  }
}
