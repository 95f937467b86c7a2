import { expect, test } from 'vitest';
import { ByteReader } from '../../../src/bytes/byte-reader.ts';

const bytes = Uint8Array.of(0xff, 0x80, 0x00, 0x00, 0x01, 0x00, 0x00, 0x00, 0x00, 0x80, 0x00, 0x00, 0x02);

test('reads unsigned big-endian numbers one after another', () => {
  const reader = new ByteReader(bytes, 'a.nc');
  expect([reader.uint8(), reader.uint32(), reader.uint64(), reader.position]).toEqual([
    255, 0x80000001, 0x80000002, 13,
  ]);
});

test('reads from bytes that lie inside a larger buffer', () => {
  expect(new ByteReader(bytes.subarray(9), 'a.nc').uint32()).toBe(0x80000002);
});

test('says file, part and byte where the file ends too early, and stays where it is', () => {
  const reader = new ByteReader(bytes, 'a.nc');
  reader.position = 10;
  reader.part = 'variable w';
  expect(() => reader.uint32()).toThrow(
    expect.objectContaining({ code: 'truncated', place: { file: 'a.nc', part: 'variable w', byte: 10 } }),
  );
  expect(reader.position).toBe(10);
});

test('refuses lengths that no file has', () => {
  const reader = new ByteReader(Uint8Array.of(0, 0x20, 0, 0, 0, 0, 0, 0), 'a.nc');
  // 2^53 is the first whole number that a double may confuse with its neighbour.
  expect(() => reader.uint64()).toThrow(expect.objectContaining({ code: 'damaged' }));
  expect(() => reader.view8(Number.POSITIVE_INFINITY)).toThrow(expect.objectContaining({ code: 'truncated' }));
  expect(() => reader.view8(Number.NaN)).toThrow(expect.objectContaining({ code: 'truncated' }));
});
