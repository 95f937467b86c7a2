import type { NewsLine } from '../contract/news.ts';

/** Where news is said and heard. */
export interface NewsBoard {
  say(line: NewsLine): void;
  /** Hears every line until the given function is called. */
  hear(listener: (line: NewsLine) => void): () => void;
}

/** A news board without listeners. */
export function openNewsBoard(): NewsBoard {
  const listeners = new Set<(line: NewsLine) => void>();
  return {
    say(line) {
      for (const listener of listeners) listener(line);
    },
    hear(listener) {
      // Wrapped, so that one function heard twice can be stopped once.
      const own = (line: NewsLine) => listener(line);
      listeners.add(own);
      return () => listeners.delete(own);
    },
  };
}
