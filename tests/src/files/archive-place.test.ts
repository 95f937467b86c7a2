import { join, resolve } from 'node:path';
import { expect, test } from 'vitest';
import { placeOfArchive } from '../../../src/files/archive-place.ts';

const home = join('/home', 'ann');
const on = (platform: NodeJS.Platform, variables: Record<string, string> = {}) => ({ platform, home, variables });

// XDG Base Directory Specification 0.8: $XDG_DATA_HOME, else $HOME/.local/share; relative paths are to be ignored.
test('lies on Linux where the XDG specification puts data', () => {
  expect(placeOfArchive(undefined, on('linux'))).toBe('/home/ann/.local/share/crosstrack/archive.db');
  expect(placeOfArchive(undefined, on('linux', { XDG_DATA_HOME: '/data' }))).toBe('/data/crosstrack/archive.db');
  expect(placeOfArchive(undefined, on('linux', { XDG_DATA_HOME: 'here' }))).toContain('/home/ann/.local/share/');
});

// Apple, File System Programming Guide: ~/Library/Application Support. Microsoft, Known Folders: APPDATA is roaming data.
test('lies on macOS and Windows where these keep the data of applications', () => {
  expect(placeOfArchive(undefined, on('darwin'))).toContain('/home/ann/Library/Application Support/Crosstrack/');
  expect(placeOfArchive(undefined, on('win32', { APPDATA: '/roaming' }))).toContain('/roaming/Crosstrack/');
});

test('lies where the user says, first by choice, then by variable', () => {
  const around = on('linux', { CROSSTRACK_ARCHIVE: '/mine/a.db' });
  expect(placeOfArchive('/chosen/b.db', around)).toBe('/chosen/b.db');
  expect(placeOfArchive(undefined, around)).toBe('/mine/a.db');
  expect(placeOfArchive('c.db', around)).toBe(resolve('c.db'));
});
