import { createHash } from 'node:crypto';

/** SHA-256 of some bytes (FIPS 180-4), hexadecimal: what tells whether two files are the same. */
export function hashBytes(bytes: Uint8Array): string {
  return createHash('sha256').update(bytes).digest('hex');
}
