import { Problem } from '../../../problems/problem.ts';
import { descriptorFromOctets } from './descriptor.ts';

/** A message as its sections 0, 1 and 3 describe it. Offsets are bytes of the whole file. */
export interface BufrMessage {
  edition: number;
  startByte: number;
  /** The byte after its closing 7777. */
  endByte: number;
  masterTableVersion: number;
  localTableVersion: number;
  centre: number;
  subCentre: number;
  category: number;
  subsetCount: number;
  isCompressed: boolean;
  /** Section 3: F X Y written as one number, two octets each from `descriptorsByte`. */
  descriptors: number[];
  descriptorsByte: number;
  /** Section 4 without its head. */
  dataByte: number;
  dataEndByte: number;
}

/**
 * Reads the message that begins with 'BUFR' at `startByte` (WMO-No. 306, FM 94 sections 0 to 5, editions 0 to 4).
 * Throws 'truncated' where the file ends inside it, 'damaged' where its lengths contradict each other, and
 * 'unsupported-format' for another edition or another master table.
 */
export function readHeader(bytes: Uint8Array, startByte: number): BufrMessage {
  const edition = octetAt(bytes, startByte + 7);
  if (edition > 4) {
    throw new Problem('unsupported-format', `BUFR edition ${edition} is not known.`, { byte: startByte + 7 });
  }
  // Editions 0 and 1 state no total length: section 0 is 4 octets, and octet 8 of the message is octet 4 of section 1.
  const statesLength = edition >= 2;
  const section1 = startByte + (statesLength ? 8 : 4);
  const statedEnd = statesLength ? startByte + lengthAt(bytes, startByte + 4) : bytes.length;
  if (statedEnd > bytes.length) {
    const missing = statedEnd - bytes.length;
    throw new Problem('truncated', `The file ends ${missing} bytes before the message does.`, { byte: startByte });
  }
  const identification = readSection1(bytes, section1, edition);
  const section2 = endOfSection(bytes, section1, edition === 4 ? 22 : 17, statedEnd);
  const section3 = identification.hasSection2 ? endOfSection(bytes, section2, 4, statedEnd) : section2;
  const section4 = endOfSection(bytes, section3, 7, statedEnd);
  const dataEndByte = endOfSection(bytes, section4, 4, statedEnd);
  const endByte = statesLength ? statedEnd : dataEndByte + 4;
  if (!endsWith7777(bytes, endByte) || endByte < dataEndByte + 4) {
    throw new Problem('damaged', 'The message does not close with 7777 where its length says.', { byte: endByte - 4 });
  }
  return {
    edition,
    startByte,
    endByte,
    ...identification.said,
    ...readSection3(bytes, section3, section4),
    dataByte: section4 + 4,
    dataEndByte,
  };
}

function readSection1(bytes: Uint8Array, at: number, edition: number) {
  const octet = (number: number) => octetAt(bytes, at + number - 1);
  const pair = (number: number) => octet(number) * 256 + octet(number + 1);
  const masterTable = edition < 2 ? 0 : octet(4);
  if (masterTable !== 0) {
    throw new Problem('unsupported-format', `Master table ${masterTable} is not the meteorological one.`, {
      byte: at + 3,
    });
  }
  // Octet numbers: FM 94 section 1, as each edition has them. Edition 3 alone halves the pair into sub-centre and centre.
  if (edition === 4) {
    const said = { centre: pair(5), subCentre: pair(7), category: octet(11) };
    const versions = { masterTableVersion: octet(14), localTableVersion: octet(15) };
    return { hasSection2: octet(10) >= 128, said: { ...said, ...versions } };
  }
  const centres = edition === 3 ? { centre: octet(6), subCentre: octet(5) } : { centre: pair(5), subCentre: 0 };
  const versions = { masterTableVersion: octet(11), localTableVersion: octet(12) };
  return { hasSection2: octet(8) >= 128, said: { ...centres, category: octet(9), ...versions } };
}

function readSection3(bytes: Uint8Array, at: number, endByte: number) {
  const descriptorsByte = at + 7;
  const descriptors: number[] = [];
  // An odd octet that closes the section is padding, and so are octets of zero.
  for (let byte = descriptorsByte; byte + 1 < endByte; byte += 2) {
    descriptors.push(descriptorFromOctets(bytes[byte], bytes[byte + 1]));
  }
  while (descriptors.at(-1) === 0) descriptors.pop();
  return {
    subsetCount: octetAt(bytes, at + 4) * 256 + octetAt(bytes, at + 5),
    isCompressed: (octetAt(bytes, at + 6) & 0x40) !== 0,
    descriptors,
    descriptorsByte,
  };
}

/** Where a section that states its length in its first three octets ends. */
function endOfSection(bytes: Uint8Array, at: number, leastLength: number, limit: number): number {
  const length = lengthAt(bytes, at);
  const end = at + length;
  if (length >= leastLength && end <= limit) return end;
  if (length < leastLength) {
    const message = `A section states a length of ${length} bytes, less than its head has.`;
    throw new Problem('damaged', message, { byte: at });
  }
  const isCut = limit === bytes.length;
  const message = `A section states a length of ${length} bytes, more than the ${isCut ? 'file' : 'message'} has left.`;
  throw new Problem(isCut ? 'truncated' : 'damaged', message, { byte: at });
}

function endsWith7777(bytes: Uint8Array, endByte: number): boolean {
  if (endByte > bytes.length) return false;
  for (let i = 1; i <= 4; i++) if (bytes[endByte - i] !== 0x37) return false;
  return true;
}

function lengthAt(bytes: Uint8Array, at: number): number {
  return octetAt(bytes, at) * 65_536 + octetAt(bytes, at + 1) * 256 + octetAt(bytes, at + 2);
}

function octetAt(bytes: Uint8Array, at: number): number {
  if (at < bytes.length) return bytes[at];
  throw new Problem('truncated', 'The file ends inside the head of a message.', { byte: bytes.length });
}
