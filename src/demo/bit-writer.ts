/** Writes fields of any number of bits, most significant bit first, into bytes that grow as needed. */
export class BitWriter {
  private bytes = new Uint8Array(4096);
  private bits = 0;

  /** An unsigned number of 0 to 53 bits. */
  write(value: number, widthBits: number): void {
    this.reserve(widthBits);
    let rest = value;
    for (let left = widthBits; left > 0; ) {
      const room = 8 - (this.bits & 7);
      const taken = Math.min(room, left);
      const head = Math.floor(rest / 2 ** (left - taken));
      this.bytes[this.bits >>> 3] |= head << (room - taken);
      rest -= head * 2 ** (left - taken);
      this.bits += taken;
      left -= taken;
    }
  }

  writeOctets(octets: Uint8Array): void {
    for (const octet of octets) this.write(octet, 8);
  }

  /** The bytes written, the last one filled up with zero bits. */
  finish(): Uint8Array {
    return this.bytes.slice(0, Math.ceil(this.bits / 8));
  }

  private reserve(widthBits: number): void {
    const needed = Math.ceil((this.bits + widthBits) / 8);
    if (needed <= this.bytes.length) return;
    const grown = new Uint8Array(needed * 2);
    grown.set(this.bytes);
    this.bytes = grown;
  }
}
