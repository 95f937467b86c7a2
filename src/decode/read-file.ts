import { Problem } from '../problems/problem.ts';
import type { ReadSwaths } from './read-swaths.ts';

/** Reads the swaths of a file. Content, not name, says what it is; what no reader here knows is refused 'unknown-format'. */
export function readFileSwaths(bytes: Uint8Array, fileName: string): ReadSwaths {
  if (bytes.length === 0) throw new Problem('no-cells', 'This file is empty.', { file: fileName });
  if (startsWith(bytes, 'CDF') && bytes[3] <= 5) return refuse('netCDF classic', fileName);
  if (startsWith(bytes, '\x89HDF\r\n\x1a\n')) return refuse('HDF5 (netCDF-4)', fileName);
  if (startsWith(bytes, '\x0e\x03\x13\x01')) return refuse('HDF4', fileName);
  if (startsWith(bytes, '\x1f\x8b')) return refuse('gzip-compressed data: unpack it first', fileName);
  if (findBufr(bytes) >= 0) return refuse('BUFR', fileName);
  throw new Problem('unknown-format', `This file is in no format known here; it begins with ${showHead(bytes)}.`, {
    file: fileName,
    byte: 0,
  });
}

function refuse(format: string, fileName: string): never {
  throw new Problem('unsupported-format', `This file is ${format}, which is not read here.`, { file: fileName });
}

function startsWith(bytes: Uint8Array, magic: string, at = 0): boolean {
  for (let index = 0; index < magic.length; index++) {
    if (bytes[at + index] !== magic.charCodeAt(index)) return false;
  }
  return true;
}

/** How far into a file its first message may begin: bulletin headings and padding come before it. */
const LONGEST_HEADING_BYTES = 16 * 1024;

/** Where the letters 'BUFR' first stand, near the beginning; -1 where they do not. */
function findBufr(bytes: Uint8Array): number {
  const end = Math.min(bytes.length, LONGEST_HEADING_BYTES);
  for (let at = 0; at < end; at++) if (startsWith(bytes, 'BUFR', at)) return at;
  return -1;
}

/** The first bytes as text where they are printable, else in hexadecimal: "'Hello'" or 'ff 00 12'. */
function showHead(bytes: Uint8Array): string {
  const head = bytes.subarray(0, 8);
  if (head.every((byte) => byte >= 0x20 && byte < 0x7f)) return `'${String.fromCharCode(...head)}'`;
  return [...head].map((byte) => byte.toString(16).padStart(2, '0')).join(' ');
}
