import { readdirSync, type Stats, statSync } from 'node:fs';
import { basename, join } from 'node:path';
import { Problem } from '../problems/problem.ts';

/** A file that waits to be read. */
export interface FoundFile {
  path: string;
  name: string;
  bytes: number;
}

/** What was found, and what was asked for in vain. */
export interface FoundFiles {
  files: FoundFile[];
  problems: Problem[];
}

/**
 * The files at some paths, in the order given; a folder stands for all files below it, sorted by name, those whose names
 * begin with a dot left out. A path that cannot be read becomes a problem and the rest is found all the same.
 */
export function findFiles(paths: readonly string[]): FoundFiles {
  const found: FoundFiles = { files: [], problems: [] };
  for (const path of paths) visit(path, found);
  return found;
}

function visit(path: string, found: FoundFiles): void {
  try {
    const stats = statSync(path);
    if (stats.isDirectory()) visitFolder(path, found);
    else found.files.push(describeFile(path, stats));
  } catch (thrown) {
    found.problems.push(asFileProblem(thrown, path));
  }
}

function visitFolder(folder: string, found: FoundFiles): void {
  const entries = readdirSync(folder, { withFileTypes: true }).filter((entry) => !entry.name.startsWith('.'));
  entries.sort((one, other) => (one.name < other.name ? -1 : 1));
  for (const entry of entries) {
    // A link to a folder may lead back up: only real folders are walked.
    if (entry.isSymbolicLink() && statSync(join(folder, entry.name), { throwIfNoEntry: false })?.isDirectory())
      continue;
    visit(join(folder, entry.name), found);
  }
}

function describeFile(path: string, stats: Stats): FoundFile {
  if (!stats.isFile()) throw new Problem('not-readable', 'This is neither a file nor a folder.', { file: path });
  return { path, name: basename(path), bytes: stats.size };
}

/** What the file system said, as a Problem: 'not-found' where there is nothing, else 'not-readable'. */
export function asFileProblem(thrown: unknown, path: string): Problem {
  if (thrown instanceof Problem) return thrown;
  const { code, message } = thrown as NodeJS.ErrnoException;
  if (code === 'ENOENT' || code === 'ENOTDIR') {
    return new Problem('not-found', 'There is no such file or folder.', { file: path });
  }
  if (code === 'EACCES' || code === 'EPERM') {
    return new Problem('not-readable', 'This may not be read by the present user.', { file: path });
  }
  return new Problem('not-readable', `This cannot be read: ${message}.`, { file: path });
}
