import { type Problem, toProblem } from '../../../problems/problem.ts';
import { type BufrMessage, readHeader } from './read-header.ts';

/** A message and what to call it: 'message 3', counted from 1 along the file, damaged ones too. */
export interface FoundMessage extends BufrMessage {
  part: string;
}

/** The whole messages of a file, and what is wrong with those that are not whole. */
export interface FoundMessages {
  messages: FoundMessage[];
  problems: Problem[];
}

/**
 * Finds the messages of a file whatever stands around them: bulletin headings, padding, cut or damaged messages.
 * Nothing is assumed of where a message begins; the letters 'BUFR' in other text are passed over.
 */
export function findMessages(bytes: Uint8Array): FoundMessages {
  const messages: FoundMessage[] = [];
  const problems: Problem[] = [];
  let at = indexOfBufr(bytes, 0);
  while (at >= 0) {
    const part = `message ${messages.length + problems.length + 1}`;
    let next = at + 4;
    try {
      const message = readHeader(bytes, at);
      messages.push({ ...message, part });
      next = message.endByte;
    } catch (thrown) {
      if (!isOtherText(bytes, at)) problems.push(toProblem(thrown, { part, byte: at }));
    }
    at = indexOfBufr(bytes, next);
  }
  return { messages, problems };
}

const [B, U, F, R] = [0x42, 0x55, 0x46, 0x52];

function indexOfBufr(bytes: Uint8Array, from: number): number {
  for (let at = bytes.indexOf(B, from); at >= 0; at = bytes.indexOf(B, at + 1)) {
    if (bytes[at + 1] === U && bytes[at + 2] === F && bytes[at + 3] === R) return at;
  }
  return -1;
}

/** The edition follows the four letters and a length at most; in text, a printed character stands there. */
function isOtherText(bytes: Uint8Array, at: number): boolean {
  return bytes[at + 7] >= 0x20;
}
