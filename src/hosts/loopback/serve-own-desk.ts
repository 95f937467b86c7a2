import { join } from 'node:path';
import { createAnswer } from '../../door/answer.ts';
import { loadDemonstrationIfUnused, openOwnDesk } from '../shared/open-own-desk.ts';
import { startLoopback } from './start-loopback.ts';

/** What is to be served, and where. */
interface ServeOptions {
  projectFolder: string;
  archivePath: string | undefined;
  port: number | undefined;
  isDemonstrationWanted: boolean;
}

/** The application served to a browser, until closed. */
export interface ServedDesk {
  url: string;
  /** Whether anything has been asked for yet. */
  wasVisited(): boolean;
  /** Stops serving, then loading, and closes the archive. */
  close(): Promise<void>;
}

/** Opens this installation's desk and serves it at 127.0.0.1. Throws a Problem when the archive or the port cannot be had. */
export async function serveOwnDesk(options: ServeOptions): Promise<ServedDesk> {
  const { projectFolder, archivePath, port, isDemonstrationWanted } = options;
  const desk = openOwnDesk({ projectFolder, archivePath });
  try {
    const answer = createAnswer(desk, { staticFolder: join(projectFolder, 'dist', 'renderer') });
    let wasVisited = false;
    const loopback = await startLoopback((request) => {
      wasVisited = true;
      return answer(request);
    }, port);
    if (isDemonstrationWanted) await loadDemonstrationIfUnused(desk);
    return {
      url: loopback.url,
      wasVisited: () => wasVisited,
      close: async () => {
        await loopback.close();
        await desk.close();
      },
    };
  } catch (thrown) {
    await desk.close();
    throw thrown;
  }
}
