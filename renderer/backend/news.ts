import { type NewsLine, newsLine } from '../../src/contract/news.ts';
import { routes } from '../../src/contract/routes.ts';
import type { Door } from './door.ts';

/** The host says 'alive' every 15 s; a stream quiet for this long is dead. */
const LONGEST_SILENCE_MS = 40_000;
const RECONNECT_MS = [300, 1000, 2000, 5000] as const;

/** Who hears the news, and whether the stream is up. News told while it was down is lost: read again what may have changed. */
export interface NewsListener {
  hear(line: NewsLine): void;
  linkChanged(isUp: boolean): void;
}

/** Listens to the host's news, connecting again whenever the stream ends, until the returned stop is called. */
export function listenToNews(door: Door, listener: NewsListener): () => void {
  const ending = new AbortController();
  void keepListening(door, listener, ending.signal);
  return () => ending.abort();
}

async function keepListening(door: Door, listener: NewsListener, ended: AbortSignal): Promise<void> {
  let failures = 0;
  while (!ended.aborted) {
    await readStream(door, ended, (line) => {
      if (line.kind === 'alive') listener.linkChanged(true);
      else listener.hear(line);
      failures = 0;
    });
    if (ended.aborted) return;
    listener.linkChanged(false);
    await wait(RECONNECT_MS[Math.min(failures++, RECONNECT_MS.length - 1)], ended);
  }
}

/** Reads one stream to its end, however it ends. */
async function readStream(door: Door, ended: AbortSignal, hear: (line: NewsLine) => void): Promise<void> {
  const silence = new AbortController();
  let timer = setTimeout(() => silence.abort(), LONGEST_SILENCE_MS);
  try {
    const signal = AbortSignal.any([ended, silence.signal]);
    const response = await fetch(door.origin + routes.news, { headers: door.headers, signal });
    if (!response.ok || !response.body) return;
    const reader = response.body.pipeThrough(new TextDecoderStream()).getReader();
    let unfinished = '';
    for (;;) {
      const { done, value } = await reader.read();
      if (done) return;
      clearTimeout(timer);
      timer = setTimeout(() => silence.abort(), LONGEST_SILENCE_MS);
      const lines = (unfinished + value).split('\n');
      unfinished = lines.pop() ?? '';
      for (const line of lines) if (line) hear(newsLine.parse(JSON.parse(line)));
    }
  } catch {
    // A stream that breaks or talks nonsense is begun again; linkChanged tells the user.
  } finally {
    clearTimeout(timer);
  }
}

function wait(lengthMs: number, ended: AbortSignal): Promise<void> {
  return new Promise((resolve) => {
    const timer = setTimeout(resolve, lengthMs);
    ended.addEventListener(
      'abort',
      () => {
        clearTimeout(timer);
        resolve();
      },
      { once: true },
    );
  });
}
