import {
  CONTRACT_VERSION,
  type OperationAnswer,
  type OperationInput,
  type OperationName,
} from '../contract/operations.ts';
import { settings, type WatchArea } from '../contract/values.ts';
import { Problem } from '../problems/problem.ts';
import type { Archive } from '../store/archive.ts';
import { findBlocks } from '../store/blocks.ts';
import { countPasses, listPasses, removeDemonstration, removePass } from '../store/passes.ts';
import { keepSetting, readSetting } from '../store/settings.ts';
import { keepWatchArea, listWatchAreas, removeWatchArea } from '../store/watch-areas.ts';
import { formatPosition } from '../wind/words.ts';
import type { Loader } from '../workers/start-loader.ts';
import type { Coastline } from './coastline.ts';
import { listDemonstrationFiles, readDemonstrationWatch } from './demonstration.ts';
import { describeCell } from './describe-cell.ts';
import type { NewsBoard } from './news-board.ts';

/** What an operation works with. */
export interface DeskParts {
  archive: Archive;
  loader: Loader;
  news: NewsBoard;
  coastline: Coastline;
  readWatch: (input: OperationInput<'readWatch'>) => OperationAnswer<'readWatch'>;
  options: { appVersion: string; demoFolder: string };
}

type Performers = {
  [Name in OperationName]: (
    parts: DeskParts,
    input: OperationInput<Name>,
  ) => OperationAnswer<Name> | Promise<OperationAnswer<Name>>;
};

/** How each operation of the contract is done. */
export const performers: Performers = {
  readStatus: ({ archive, options }) => {
    const count = countPasses(archive);
    const watch = readDemonstrationWatch(options.demoFolder);
    return {
      contractVersion: CONTRACT_VERSION,
      appVersion: options.appVersion,
      archivePath: archive.path,
      passCount: count.passes,
      demonstration: count.demonstration > 0 ? watch : null,
      hasDemonstration: watch !== null,
    };
  },
  listPasses: ({ archive }) => ({ passes: listPasses(archive) }),
  removePass: ({ archive, news }, { passId }) => {
    removePass(archive, passId);
    news.say({ kind: 'passes changed' });
    return {};
  },
  findBlocks: ({ archive }, { box, window }) => ({ blocks: findBlocks(archive, box, window) }),
  readCell: ({ archive, coastline }, place) => describeCell(archive, coastline.fine(), place),
  readWatch: ({ readWatch }, input) => readWatch(input),
  listWatchAreas: ({ archive }) => ({ areas: listWatchAreas(archive) }),
  keepWatchArea: async ({ archive, news }, area) => {
    await refuseCrossing(area.ring);
    const kept = keepWatchArea(archive, area);
    news.say({ kind: 'areas changed' });
    return kept;
  },
  removeWatchArea: ({ archive, news }, { areaId }) => {
    removeWatchArea(archive, areaId);
    news.say({ kind: 'areas changed' });
    return {};
  },
  readSettings: ({ archive }) => {
    // Settings kept by another version may have another shape: then there are none.
    const kept = settings.safeParse(readSetting(archive, 'screen'));
    return { settings: kept.success ? kept.data : null };
  },
  keepSettings: ({ archive }, input) => {
    keepSetting(archive, 'screen', input.settings);
    return {};
  },
  loadPaths: ({ loader }, { paths }) => {
    return {
      taskId: loader.load(
        paths.map((path) => ({ path })),
        false,
      ),
    };
  },
  stopTask: ({ loader }, { taskId }) => {
    loader.stop(taskId);
    return {};
  },
  loadDemonstration: ({ loader, options }) => {
    const paths = listDemonstrationFiles(options.demoFolder);
    return {
      taskId: loader.load(
        paths.map((path) => ({ path })),
        true,
      ),
    };
  },
  clearDemonstration: ({ archive, news }) => {
    removeDemonstration(archive);
    news.say({ kind: 'passes changed' });
    return {};
  },
};

/** An area whose edges cross has no certain inside. The geometry library is large, so it is read only when needed. */
async function refuseCrossing(ring: WatchArea['ring']): Promise<void> {
  const { findCrossing } = await import('../geometry/find-crossing.ts');
  const crossing = findCrossing(ring);
  if (crossing === null) return;
  const place = { part: `at ${formatPosition(...crossing)}` };
  throw new Problem(
    'bad-input',
    'The edges of this area cross, so its inside is in doubt. Draw it without a crossing.',
    place,
  );
}
