import { Problem } from '../problems/problem.ts';

/** Room after the last readable byte, so that a field is always fetched by whole words without leaving the buffer. */
const SPARE_BYTES = 8;

/** The widest field a number holds exactly. */
export const MOST_BITS = 53;

/** Where numbers are packed, and how each is to be written. */
export interface ScaledRun {
  widthBits: number;
  strideBits: number;
  count: number;
  add: number;
  factor: number;
  least: number;
  most: number;
  missing: number;
}

/** The widest field that bit operations hold. */
const MOST_WORD_BITS = 32;

/** The widest field that one 32-bit word holds wherever in a byte it begins. */
export const MOST_SCALED_BITS = 25;

/** Reads fields of any number of bits, most significant bit first, and never outside the bytes it was given. */
export class BitReader {
  private readonly view: DataView;
  private readonly startByte: number;
  private readonly lengthBits: number;
  private at = 0;

  /** Reads bytes[startByte] up to, not including, bytes[endByte]. Positions count bits from startByte. */
  constructor(bytes: Uint8Array, startByte: number, endByte: number) {
    if (startByte < 0 || startByte > endByte || endByte > bytes.length) {
      throw new Problem('truncated', 'A part of the file lies outside it.', { byte: startByte });
    }
    this.startByte = startByte;
    this.lengthBits = (endByte - startByte) * 8;
    this.view = viewWithSpare(bytes, startByte, endByte);
  }

  /** Bits from the start to the next field. */
  get position(): number {
    return this.at;
  }

  get remainingBits(): number {
    return this.lengthBits - this.at;
  }

  /** The byte in the whole file where the next field begins. */
  get byte(): number {
    return this.startByte + Math.floor(this.at / 8);
  }

  moveTo(position: number): void {
    this.at = 0;
    this.skip(position);
  }

  skip(bits: number): void {
    if (!(bits >= 0 && bits <= this.remainingBits)) this.refuse(bits);
    this.at += bits;
  }

  /** An unsigned number of 0 to 53 bits. */
  read(widthBits: number): number {
    const at = this.at;
    this.skip(widthBits);
    if (widthBits <= MOST_WORD_BITS) return fetchField(this.view, at, widthBits);
    const highBits = widthBits - 32;
    return fetchField(this.view, at, highBits) * 2 ** 32 + fetchField(this.view, at + highBits, 32);
  }

  /** Whole octets, which need not begin on a byte. */
  readOctets(count: number): Uint8Array {
    if (count * 8 > this.remainingBits) this.refuse(count * 8);
    const octets = new Uint8Array(count);
    for (let i = 0; i < count; i++) octets[i] = this.read(8);
    return octets;
  }

  /** Reads `count` numbers of 0 to 53 bits to the front of `into`, each beginning `strideBits` after the one before. */
  readRun(widthBits: number, strideBits: number, count: number, into: Float64Array): void {
    const { view, at } = this;
    if (count > 0) this.skip((count - 1) * strideBits + widthBits);
    if (widthBits <= MOST_WORD_BITS) {
      for (let i = 0, bit = at; i < count; i++, bit += strideBits) into[i] = fetchField(view, bit, widthBits);
    } else {
      for (let i = 0; i < count; i++) {
        this.at = at + i * strideBits;
        into[i] = this.read(widthBits);
      }
    }
  }

  /**
   * Reads `count` numbers of 1 to 25 bits as `readRun` does and writes each as (number + add) * factor, from
   * `into[first]` on, `step` apart. A number that is not from `least` to `most` becomes NaN. Tells whether any of those was
   * another number than `missing`.
   */
  readScaledRun(run: ScaledRun, into: Float32Array, first: number, step: number): boolean {
    const { widthBits, strideBits, count, add, factor, least, most, missing } = run;
    const { view } = this;
    const drop = 32 - widthBits;
    let bit = this.at;
    let isAnyOutside = false;
    if (count > 0) this.skip((count - 1) * strideBits + widthBits);
    for (let i = 0, place = first; i < count; i++, bit += strideBits, place += step) {
      const field = (view.getInt32(bit >>> 3) << (bit & 7)) >>> drop;
      if (field >= least && field <= most) {
        into[place] = (field + add) * factor;
      } else {
        into[place] = Number.NaN;
        if (field !== missing) isAnyOutside = true;
      }
    }
    return isAnyOutside;
  }

  private refuse(bits: number): never {
    throw new Problem('truncated', `The data end before a field of ${bits} bits.`, { byte: this.byte });
  }
}

function viewWithSpare(bytes: Uint8Array, startByte: number, endByte: number): DataView {
  if (endByte + SPARE_BYTES <= bytes.length) {
    return new DataView(bytes.buffer, bytes.byteOffset + startByte, endByte + SPARE_BYTES - startByte);
  }
  const copy = new Uint8Array(endByte - startByte + SPARE_BYTES);
  copy.set(bytes.subarray(startByte, endByte));
  return new DataView(copy.buffer);
}

/** A field of 0 to 32 bits. Five bytes hold it wherever it begins in the first of them. */
function fetchField(view: DataView, at: number, widthBits: number): number {
  if (widthBits === 0) return 0;
  const byte = at >>> 3;
  const shift = at & 7;
  return ((view.getUint32(byte) << shift) | (view.getUint8(byte + 4) >>> (8 - shift))) >>> (32 - widthBits);
}
