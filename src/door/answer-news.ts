import type { NewsLine } from '../contract/news.ts';
import type { Desk } from '../operations/desk.ts';
import { respond } from './responses.ts';

/** How often a quiet stream shows that it lives, ms (contract/news). */
const ALIVE_EVERY_MS = 15_000;

/** Lines that may wait for a reader who does not read before the stream is cut. */
const MOST_LINES_WAITING = 10_000;

/** The news of the desk as newline-delimited JSON, until the reader leaves or the signal ends it. */
export function streamNews(desk: Desk, signal: AbortSignal): Response {
  const encoder = new TextEncoder();
  let end = () => {};
  const body = new ReadableStream<Uint8Array>({
    start(controller) {
      const write = (line: NewsLine) => {
        controller.enqueue(encoder.encode(`${JSON.stringify(line)}\n`));
        if ((controller.desiredSize ?? 0) < -MOST_LINES_WAITING) close();
      };
      const stop = desk.hearNews(write);
      const timer = setInterval(() => write({ kind: 'alive' }), ALIVE_EVERY_MS);
      // A stream that somebody forgot must not keep the process from ending.
      timer.unref();
      end = () => {
        stop();
        clearInterval(timer);
        signal.removeEventListener('abort', close);
      };
      const close = () => {
        end();
        controller.close();
      };
      signal.addEventListener('abort', close);
      write({ kind: 'alive' });
    },
    cancel: () => end(),
  });
  return respond(body, 200, { 'content-type': 'application/x-ndjson' });
}
