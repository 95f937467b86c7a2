import { z } from 'zod';
import {
  cellCard,
  geoBox,
  moment,
  passSummary,
  settings,
  switches,
  timeWindow,
  watchArea,
  watchReport,
  watchWater,
} from './values.ts';

/** Version of this contract; the renderer refuses to speak to another. */
export const CONTRACT_VERSION = 1;

const nothing = z.object({});
const id = z.number().int().positive();

/** Every question the renderer may ask: the check of its input and of its answer. Types come from the checks. */
export const operations = {
  /** Who answers, and the state of the archive. */
  readStatus: {
    input: nothing,
    answer: z.object({
      contractVersion: z.number().int(),
      appVersion: z.string(),
      archivePath: z.string(),
      passCount: z.number().int(),
      /** The demonstration's own clock and view while it is loaded, else null. */
      demonstration: z
        .object({ title: z.string(), nowMs: moment, lon: z.number(), lat: z.number(), zoom: z.number() })
        .nullable(),
      /** Whether demonstration files are part of this installation. */
      hasDemonstration: z.boolean(),
    }),
  },
  listPasses: { input: nothing, answer: z.object({ passes: z.array(passSummary) }) },
  removePass: { input: z.object({ passId: id }), answer: nothing },
  /** The blocks of drawn cells in a box and window, by id; their bytes come as the payload 'blocks'. */
  findBlocks: {
    input: z.object({ box: geoBox, window: timeWindow }),
    answer: z.object({ blocks: z.array(z.object({ blockId: id, passId: id, cells: z.number().int() })) }),
  },
  /** Everything known of one cell; row and column are counted from 1. */
  readCell: { input: z.object({ passId: id, row: id, column: id }), answer: cellCard },
  /** The watch line and the figures behind it. */
  readWatch: {
    input: z.object({
      water: watchWater,
      window: timeWindow,
      nowMs: moment,
      speedUnit: settings.shape.speedUnit,
      switches,
      hiddenPassIds: z.array(z.number().int()),
    }),
    answer: watchReport,
  },
  listWatchAreas: { input: nothing, answer: z.object({ areas: z.array(watchArea) }) },
  keepWatchArea: { input: watchArea.omit({ areaId: true }), answer: watchArea },
  removeWatchArea: { input: z.object({ areaId: id }), answer: nothing },
  readSettings: { input: nothing, answer: z.object({ settings: settings.nullable() }) },
  keepSettings: { input: z.object({ settings }), answer: nothing },
  /** Loads files that lie on this machine; progress and fates come as news. */
  loadPaths: {
    input: z.object({ paths: z.array(z.string().min(1)).min(1).max(10_000) }),
    answer: z.object({ taskId: id }),
  },
  stopTask: { input: z.object({ taskId: id }), answer: nothing },
  /** Loads the demonstration watch into the archive; progress and fates come as news. */
  loadDemonstration: { input: nothing, answer: z.object({ taskId: id }) },
  /** Removes every pass of the demonstration, and nothing else. */
  clearDemonstration: { input: nothing, answer: nothing },
} as const;

export type OperationName = keyof typeof operations;
export type OperationInput<Name extends OperationName> = z.infer<(typeof operations)[Name]['input']>;
export type OperationAnswer<Name extends OperationName> = z.infer<(typeof operations)[Name]['answer']>;
