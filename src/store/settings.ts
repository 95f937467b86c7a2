import type { Archive } from './archive.ts';

/** A kept value by its name, as it was given, or null when none was ever kept. */
export function readSetting(archive: Archive, name: string): unknown {
  const text = archive.database.prepare('SELECT value FROM settings WHERE name = ?').pluck().get(name);
  return text === undefined ? null : JSON.parse(text as string);
}

/** Keeps a value (anything JSON can hold) under a name, in place of what was there. */
export function keepSetting(archive: Archive, name: string, value: unknown): void {
  archive.database
    .prepare('INSERT INTO settings VALUES (?, ?) ON CONFLICT (name) DO UPDATE SET value = excluded.value')
    .run(name, JSON.stringify(value));
}
