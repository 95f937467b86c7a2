import { expect, test } from 'vitest';
import { BitReader } from '../../../src/bytes/bit-reader.ts';
import { Problem } from '../../../src/problems/problem.ts';

/** Bytes from a picture of their bits; blanks are for the eye. */
function bits(picture: string): Uint8Array {
  const digits = picture.replaceAll(' ', '').padEnd(Math.ceil(picture.replaceAll(' ', '').length / 8) * 8, '0');
  return Uint8Array.from(digits.match(/.{8}/g) ?? [], (byte) => Number.parseInt(byte, 2));
}

function readerOf(picture: string): BitReader {
  const bytes = bits(picture);
  return new BitReader(bytes, 0, bytes.length);
}

test('reads fields that begin and end anywhere in a byte, most significant bit first', () => {
  const reader = readerOf('101 00001 1110 000000000111 1');
  expect([reader.read(3), reader.read(5), reader.read(4), reader.read(12), reader.read(1)]).toEqual([5, 1, 14, 7, 1]);
});

test('reads fields of 32 bits from an odd place, and of 53 bits exactly', () => {
  const wide = `${'1'.repeat(52)}0`;
  expect(readerOf(`1 ${'10'.repeat(16)}`).read(1)).toBe(1);
  const reader = readerOf(`1 ${'10'.repeat(16)} 0 ${wide}`);
  reader.skip(1);
  expect([reader.read(32), reader.read(1), reader.read(53)]).toEqual([0xaaaaaaaa, 0, 2 ** 53 - 2]);
});

test('reads a run of fields one behind the other, or each some bits after the one before', () => {
  const values = new Float64Array(3);
  readerOf('001 010 011').readRun(3, 3, 3, values);
  expect([...values]).toEqual([1, 2, 3]);
  readerOf('001 11 010 11 011 11').readRun(3, 5, 3, values);
  expect([...values]).toEqual([1, 2, 3]);
});

test('scales a run, leaves out what is outside, and tells whether any of that was not the missing field', () => {
  const values = new Float32Array(8);
  const run = { widthBits: 3, strideBits: 3, count: 4, add: -10, factor: 0.5, least: 1, most: 5, missing: 7 };
  expect(readerOf('001 101 111 010').readScaledRun(run, values, 1, 2)).toBe(false);
  expect([values[1], values[3], values[5], values[7]]).toEqual([-4.5, -2.5, Number.NaN, -4]);
  expect(readerOf('001 110 111 010').readScaledRun(run, values, 0, 1)).toBe(true);
  expect([...values.subarray(0, 4)]).toEqual([-4.5, Number.NaN, Number.NaN, -4]);
});

test('reads the same at the very end of a file as within it', () => {
  const bytes = bits('11111111 10101010 00000001');
  const within = new BitReader(Uint8Array.from([...bytes, ...new Array(20).fill(0xff)]), 0, 3);
  const atEnd = new BitReader(bytes, 0, 3);
  for (const reader of [within, atEnd]) expect([reader.read(9), reader.read(15)]).toEqual([0x1ff, 0x2a01]);
});

test('refuses to read past its end, and says at which byte of the file', () => {
  const reader = new BitReader(new Uint8Array(10), 4, 6);
  reader.skip(12);
  expect(() => reader.read(5)).toThrow(Problem);
  try {
    reader.readRun(2, 2, 3, new Float64Array(3));
  } catch (thrown) {
    expect((thrown as Problem).place).toEqual({ byte: 5 });
  }
  expect(() => reader.moveTo(17)).toThrow(Problem);
  expect(() => reader.moveTo(-1)).toThrow(Problem);
  expect(reader.read(4)).toBe(0);
});

test('refuses a part that is not within the bytes', () => {
  expect(() => new BitReader(new Uint8Array(4), 2, 5)).toThrow(Problem);
  expect(() => new BitReader(new Uint8Array(4), 3, 2)).toThrow(Problem);
});
