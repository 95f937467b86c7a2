import type { Settings } from '../../src/contract/values.ts';
import type { Backend } from '../backend/backend.ts';
import { reasonOf } from './reasons.ts';
import type { SeenStore } from './seen.ts';

const REST_MS = 300;

/** Keeps the settings in the archive whenever they rest, and at once when `flush` is called. */
export function keepSettings(
  seen: SeenStore,
  backend: Backend,
  onFailure: (reason: string) => void,
): { flush(): void; stop(): void } {
  let kept: Settings = seen.get().settings;
  let timer: ReturnType<typeof setTimeout> | undefined;

  function keep(keepalive: boolean): void {
    clearTimeout(timer);
    const { settings } = seen.get();
    if (settings === kept) return;
    kept = settings;
    backend.ask('keepSettings', { settings }, { keepalive }).catch((thrown: unknown) => {
      if (!keepalive) onFailure(reasonOf(thrown));
    });
  }

  const stopListening = seen.listen(['settings'], () => {
    clearTimeout(timer);
    timer = setTimeout(() => keep(false), REST_MS);
  });
  return {
    flush: () => keep(true),
    stop() {
      stopListening();
      clearTimeout(timer);
    },
  };
}
