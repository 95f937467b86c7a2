import { readFileSync } from 'node:fs';
import { Problem } from '../problems/problem.ts';
import { asFileProblem, type FoundFile } from './find-files.ts';

/** The whole content of a file. Throws 'not-found', 'not-readable', or 'refused' for one of more than `mostBytes`. */
export function readBytes(file: FoundFile, mostBytes: number): Uint8Array<ArrayBuffer> {
  if (file.bytes > mostBytes) {
    const most = Math.floor(mostBytes / 1024 ** 2);
    throw new Problem('refused', `This file is larger than ${most} MiB, more than any swath file.`, {
      file: file.path,
    });
  }
  try {
    return new Uint8Array(readFileSync(file.path));
  } catch (thrown) {
    throw asFileProblem(thrown, file.path);
  }
}
