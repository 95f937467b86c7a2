import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach } from 'vitest';
import { type Archive, openArchive } from '../../../src/store/archive.ts';
import type { SourceFile } from '../../../src/store/keep-pass.ts';

/** A fresh archive for each test of a file. */
export interface ArchiveBench {
  readonly archive: Archive;
  /** Closes the archive and opens it again, as the next start of the program does. */
  reopen(): void;
}

export function atArchive(): ArchiveBench {
  let folder: string;
  let archive: Archive;
  beforeEach(() => {
    folder = mkdtempSync(join(tmpdir(), 'crosstrack-store-'));
    archive = openArchive(join(folder, 'archive.db'));
  });
  afterEach(() => {
    archive.close();
    rmSync(folder, { recursive: true });
  });
  return {
    get archive() {
      return archive;
    },
    reopen() {
      archive.close();
      archive = openArchive(archive.path);
    },
  };
}

/** A file of one pass, told apart by its content. */
export function fileOf(content: string, more: Partial<SourceFile> = {}): SourceFile {
  const name = `${content}.bufr`;
  return { hash: content, name, bytes: 100, parts: 1, isDemonstration: false, loadedAtMs: 1_000, ...more };
}
