import { Problem } from '../problems/problem.ts';
import { isHdf4, isHdf5 } from './containers/netcdf-classic/sniff-netcdf.ts';
import { readBufrSwaths } from './products/bufr-winds/read-bufr-swaths.ts';
import { readCfSwaths } from './products/cf-swath/read-cf-swaths.ts';
import type { ReadSwaths } from './read-swaths.ts';

/**
 * Reads the swaths of a file. Content, not name, says what it is. Throws 'unknown-format' for what no reader knows,
 * 'unsupported-format' for a neighbour of what is read, and what the readers throw.
 */
export function readFileSwaths(bytes: Uint8Array, fileName: string): ReadSwaths {
  if (bytes.length === 0) throw new Problem('no-cells', 'This file is empty.', { file: fileName });
  if (startsWith(bytes, 'CDF') || isHdf5(bytes) || isHdf4(bytes)) return readCfSwaths(bytes, fileName);
  if (isBufr(bytes)) return readBufrSwaths(bytes, fileName);
  if (startsWith(bytes, '\x1f\x8b')) {
    throw new Problem('unsupported-format', 'This file is packed with gzip: unpack it first.', { file: fileName });
  }
  throw new Problem('unknown-format', `This file is in no format known here; it begins with ${showHead(bytes)}.`, {
    file: fileName,
    byte: 0,
  });
}

function startsWith(bytes: Uint8Array, magic: string, at = 0): boolean {
  for (let index = 0; index < magic.length; index++) {
    if (bytes[at + index] !== magic.charCodeAt(index)) return false;
  }
  return true;
}

/** How far into a file its first message may begin: bulletin headings and padding come before it. */
const LONGEST_HEADING_BYTES = 16 * 1024;

/** Whether a message begins near the beginning; in mere text about BUFR a printed character stands in the edition's place. */
function isBufr(bytes: Uint8Array): boolean {
  const end = Math.min(bytes.length, LONGEST_HEADING_BYTES);
  for (let at = 0; at < end; at++) {
    if (startsWith(bytes, 'BUFR', at) && !(bytes[at + 7] >= 0x20)) return true;
  }
  return false;
}

/** The first bytes as text where they are printable, else in hexadecimal: "'Hello'" or 'ff 00 12'. */
function showHead(bytes: Uint8Array): string {
  const head = bytes.subarray(0, 8);
  if (head.every((byte) => byte >= 0x20 && byte < 0x7f)) return `'${String.fromCharCode(...head)}'`;
  return [...head].map((byte) => byte.toString(16).padStart(2, '0')).join(' ');
}
