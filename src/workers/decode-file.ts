import { LARGEST_FILE_BYTES } from '../contract/routes.ts';
import { readFileSwaths } from '../decode/read-file.ts';
import type { ReadSwaths } from '../decode/read-swaths.ts';
import { findFiles } from '../files/find-files.ts';
import { readBytes } from '../files/read-bytes.ts';
import { Problem } from '../problems/problem.ts';

/** Reads and decodes one file without storing it. Throws what reading and decoding throw, 'not-readable' for a folder. */
export function decodeFile(path: string): ReadSwaths {
  const { files, problems } = findFiles([path]);
  if (problems.length > 0) throw problems[0];
  const [file] = files;
  if (file?.path !== path) throw new Problem('not-readable', 'This is a folder, not a file.', { file: path });
  return readFileSwaths(readBytes(file, LARGEST_FILE_BYTES), path);
}
