import { Problem } from '../problems/problem.ts';

/**
 * Walks big-endian values through a file's bytes. A read past the end is a Problem 'truncated' that names the place;
 * nothing is allocated before the bytes are known to be there.
 */
export class ByteReader {
  /** Offset of the next byte to read, from 0. */
  position = 0;
  /** What is being read, in the file's own terms; part of every Problem's place. */
  part: string | undefined;
  private readonly bytes: Uint8Array;
  private readonly view: DataView;
  private readonly fileName: string;

  constructor(bytes: Uint8Array, fileName: string) {
    this.bytes = bytes;
    this.view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
    this.fileName = fileName;
  }

  /** The next byte. */
  uint8(): number {
    return this.view.getUint8(this.take(1));
  }

  /** The next 4 bytes as an unsigned number. */
  uint32(): number {
    return this.view.getUint32(this.take(4));
  }

  /** The next 8 bytes as an unsigned number; what a number cannot hold exactly is 'damaged', for no file is so long. */
  uint64(): number {
    const start = this.take(8);
    const value = this.view.getUint32(start) * 2 ** 32 + this.view.getUint32(start + 4);
    if (value > Number.MAX_SAFE_INTEGER) throw this.damaged(`a size or place of ${value} is impossible`, start);
    return value;
  }

  /** Steps over the next bytes and gives the offset of the first. */
  take(length: number): number {
    const start = this.position;
    if (!(length <= this.bytes.length - start)) {
      throw new Problem(
        'truncated',
        `The file ends at byte ${this.bytes.length}, but ${length} more are needed from byte ${start}.`,
        this.place(start),
      );
    }
    this.position += length;
    return start;
  }

  /** The next bytes, as a view of the file's own. */
  view8(length: number): Uint8Array {
    const start = this.take(length);
    return this.bytes.subarray(start, start + length);
  }

  /** A Problem 'damaged' at a byte, by default the next one. */
  damaged(sentence: string, byte = this.position): Problem {
    return new Problem('damaged', `The file is damaged: ${sentence}.`, this.place(byte));
  }

  private place(byte: number) {
    return this.part === undefined ? { file: this.fileName, byte } : { file: this.fileName, part: this.part, byte };
  }
}
