import { z } from 'zod';
import { fileFate } from './values.ts';

/** One line of the news stream: newline-delimited JSON, tagged by kind. */
export const newsLine = z.discriminatedUnion('kind', [
  /** Sent first and then every 15 s, so that a reader can tell a quiet stream from a dead one. */
  z.object({ kind: z.literal('alive') }),
  z.object({
    kind: z.literal('load progress'),
    taskId: z.number().int(),
    file: z.string(),
    filesDone: z.number().int(),
    filesTotal: z.number().int(),
    bytesDone: z.number(),
    bytesTotal: z.number(),
  }),
  z.object({ kind: z.literal('file fate'), taskId: z.number().int(), fate: fileFate }),
  z.object({ kind: z.literal('load ended'), taskId: z.number().int(), wasStopped: z.boolean() }),
  z.object({ kind: z.literal('passes changed') }),
  z.object({ kind: z.literal('areas changed') }),
  /** The host's menu or desktop asks the renderer to do something. */
  z.object({
    kind: z.literal('asked by the desktop'),
    what: z.enum(['choose files', 'day', 'dusk', 'night', 'print']),
  }),
]);
export type NewsLine = z.infer<typeof newsLine>;
