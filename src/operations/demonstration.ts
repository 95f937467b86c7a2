import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { type OperationAnswer, operations } from '../contract/operations.ts';
import { findFiles } from '../files/find-files.ts';
import { Problem } from '../problems/problem.ts';

/** The demonstration's own title, clock and view. */
export type DemonstrationWatch = NonNullable<OperationAnswer<'readStatus'>['demonstration']>;

/** What a demonstration folder says of its watch, or null where there is no demonstration. */
export function readDemonstrationWatch(folder: string): DemonstrationWatch | null {
  const path = join(folder, 'watch.json');
  if (!existsSync(path)) return null;
  const { title, nowMs, view } = JSON.parse(readFileSync(path, 'utf8'));
  return operations.readStatus.answer.shape.demonstration.parse({ title, nowMs, ...view });
}

/** The swath files of a demonstration folder. Throws 'not-found' where there are none. */
export function listDemonstrationFiles(folder: string): string[] {
  const paths = findFiles([folder])
    .files.map((file) => file.path)
    .filter((path) => /\.(bufr|nc)$/.test(path));
  if (paths.length === 0) throw new Problem('not-found', 'This installation has no demonstration.', { file: folder });
  return paths;
}
