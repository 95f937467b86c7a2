/** Floats in a row, growing as pairs are added. */
export class FloatList {
  private floats = new Float32Array(1024);
  private length = 0;

  /** Adds two. */
  add(first: number, second: number): void {
    if (this.length + 2 > this.floats.length) {
      const grown = new Float32Array(this.floats.length * 2);
      grown.set(this.floats);
      this.floats = grown;
    }
    this.floats[this.length++] = first;
    this.floats[this.length++] = second;
  }

  /** All that were added. */
  taken(): Float32Array {
    return this.floats.subarray(0, this.length);
  }
}
