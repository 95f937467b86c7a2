import { expect, test } from 'vitest';
import { readFileSwaths } from '../../../src/decode/read-file.ts';
import { buildBufrFile, buildCfFile } from '../operations/build-files.ts';

const ascii = (text: string) => Uint8Array.from(text, (letter) => letter.charCodeAt(0));

function joined(...parts: Uint8Array[]): Uint8Array {
  return Uint8Array.from(parts.flatMap((part) => [...part]));
}

test('goes by content, whatever the name says', () => {
  expect(readFileSwaths(buildCfFile(), 'wind.bufr').format).toBe('netCDF classic (CDF-1)');
  expect(readFileSwaths(buildBufrFile(), 'wind.nc').format).toBe('BUFR edition 4');
});

test('finds BUFR behind kilobytes of heading text', () => {
  const heading = ascii('0000000123\x01\r\r\n001\r\r\nISXA01 ABCD 170600\r\r\n'.repeat(80));
  const { swaths, problems } = readFileSwaths(joined(heading, buildBufrFile()), 'bulletin');
  expect([swaths.length, problems]).toEqual([1, []]);
});

test.each([
  ['mere text about BUFR', 'A file in BUFR or netCDF.', "it begins with 'A file i'"],
  ['a picture', '\x89PNG\r\n\x1a\n', 'it begins with 89 50 4e 47 0d 0a 1a 0a'],
  ['a very short file', 'C', "it begins with 'C'"],
])('refuses %s and shows its first bytes', (_what, content, head) => {
  expect(() => readFileSwaths(ascii(content), 'x')).toThrow(
    expect.objectContaining({
      code: 'unknown-format',
      message: expect.stringContaining(head),
      place: { file: 'x', byte: 0 },
    }),
  );
});

// Signatures: HDF5 File Format Specification II.A, HDF4 Specification (magic number), RFC 1952 for gzip.
test.each([
  ['netCDF-4', '\x89HDF\r\n\x1a\n', 'netCDF-4'],
  ['HDF4', '\x0e\x03\x13\x01', 'HDF4'],
  ['gzip', '\x1f\x8b\x08', 'gzip'],
])('names %s and refuses it', (_what, content, name) => {
  expect(() => readFileSwaths(ascii(content), 'x')).toThrow(
    expect.objectContaining({ code: 'unsupported-format', message: expect.stringContaining(name) }),
  );
});

test('says of an empty file that it is empty', () => {
  expect(() => readFileSwaths(new Uint8Array(), 'x')).toThrow(expect.objectContaining({ code: 'no-cells' }));
});
