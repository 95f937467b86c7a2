import { fileURLToPath } from 'node:url';
import type { Desk } from '../../operations/desk.ts';
import { openOwnDesk } from '../shared/open-own-desk.ts';

const projectFolder = fileURLToPath(new URL('../../..', import.meta.url));

/** Does something at a desk over an archive (the default one when undefined), and closes the desk whatever came of it. */
export async function atDesk<Result>(
  archivePath: string | undefined,
  act: (desk: Desk) => Promise<Result>,
): Promise<Result> {
  const desk = openOwnDesk({ projectFolder, archivePath });
  try {
    return await act(desk);
  } finally {
    await desk.close();
  }
}
