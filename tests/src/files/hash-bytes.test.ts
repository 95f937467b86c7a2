import { expect, test } from 'vitest';
import { hashBytes } from '../../../src/files/hash-bytes.ts';

// The example 'abc' of NIST's Secure Hash Standard, FIPS 180-4 (SHA-256 example values).
test('hashes as the standard says', () => {
  expect(hashBytes(new TextEncoder().encode('abc'))).toBe(
    'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad',
  );
});
