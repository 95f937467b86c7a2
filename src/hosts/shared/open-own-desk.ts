import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { type Desk, openDesk } from '../../operations/desk.ts';

/** What a host knows that opens a desk over this installation. */
interface OwnDeskOptions {
  /** The folder that holds package.json, assets/ and dist/. */
  projectFolder: string;
  /** The archive the user chose; the platform's own place when undefined. */
  archivePath: string | undefined;
  /** The entry of the loading thread where it is a bundle; the source's own when undefined. */
  workerUrl?: URL;
}

/** Opens a desk over this installation's own assets. Throws a Problem when the archive cannot be opened. */
export function openOwnDesk({ projectFolder, archivePath, workerUrl }: OwnDeskOptions): Desk {
  const { version } = JSON.parse(readFileSync(join(projectFolder, 'package.json'), 'utf8')) as { version: string };
  return openDesk({
    archivePath,
    demoFolder: join(projectFolder, 'assets', 'demo'),
    coastlineFolder: join(projectFolder, 'assets', 'coastline'),
    workerUrl,
    appVersion: version,
  });
}

/** Begins to load the demonstration into an archive that holds no pass and that nobody has used yet. */
export async function loadDemonstrationIfUnused(desk: Desk): Promise<void> {
  const { passCount, hasDemonstration } = await desk.perform('readStatus', {});
  if (passCount > 0 || !hasDemonstration) return;
  const { settings } = await desk.perform('readSettings', {});
  if (settings === null) await desk.perform('loadDemonstration', {});
}
