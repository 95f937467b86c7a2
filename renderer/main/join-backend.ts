import type { NewsLine } from '../../src/contract/news.ts';
import type { Backend } from '../backend/backend.ts';
import { readAreas } from '../state/areas.ts';
import { attempt } from '../state/attempt.ts';
import { keepBlocksFresh } from '../state/blocks.ts';
import { runSystemClock } from '../state/clock.ts';
import { keepSettings } from '../state/keep-settings.ts';
import type { Loading } from '../state/loading.ts';
import { oneAtATime } from '../state/one-at-a-time.ts';
import { readPasses } from '../state/passes.ts';
import { changeSettings, type SeenStore } from '../state/seen.ts';
import { keepWatchFresh } from '../state/watch.ts';

/** News of many files comes in a burst. */
const NEWS_REST_MS = 400;

/** Keeps what is seen true to the host, and the settings kept in it, while the page lives. */
export function joinBackend(seen: SeenStore, backend: Backend, loading: Loading, chooseFiles: () => void): void {
  keepBlocksFresh(seen, backend);
  keepWatchFresh(seen, backend);
  runSystemClock(seen, Date.now);
  const keeping = keepSettings(seen, backend, (reason) => {
    seen.change({ trouble: `The settings could not be kept: ${reason}.` });
  });
  addEventListener('pagehide', keeping.flush);
  const passesChanged = oneAtATime(() => readPassesAgain(seen, backend), NEWS_REST_MS);
  const areasChanged = oneAtATime(() => readAreasAgain(seen, backend), NEWS_REST_MS);
  let wasLinked = false;
  backend.listenToNews({
    hear(line) {
      if (line.kind === 'passes changed') passesChanged();
      if (line.kind === 'areas changed') areasChanged();
      if (line.kind === 'asked by the desktop') obey(seen, line.what, chooseFiles);
      loading.hear(line);
    },
    linkChanged(isLinked) {
      // What changed before the news were heard, the first time too, nobody will tell again.
      if (isLinked && !wasLinked) readAgain(seen, backend);
      wasLinked = isLinked;
      seen.change({ isLinked });
    },
  });
}

/** Reads the passes and areas again; blocks and watch follow them. */
export function readAgain(seen: SeenStore, backend: Backend): void {
  void readPassesAgain(seen, backend);
  void readAreasAgain(seen, backend);
}

function readPassesAgain(seen: SeenStore, backend: Backend): Promise<boolean> {
  return attempt(seen, 'The passes could not be read', readPasses(seen, backend));
}

function readAreasAgain(seen: SeenStore, backend: Backend): Promise<boolean> {
  return attempt(seen, 'The areas could not be read', readAreas(seen, backend));
}

type Wish = Extract<NewsLine, { kind: 'asked by the desktop' }>['what'];

/** Does what the host's menu asks for. */
function obey(seen: SeenStore, wish: Wish, chooseFiles: () => void): void {
  if (wish === 'print') print();
  else if (wish === 'choose files') chooseFiles();
  else changeSettings(seen, { light: wish });
}
