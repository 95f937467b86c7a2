/**
 * Bins fixed to the earth: the Web Mercator world halved again and again, first into north and south, then
 * into west and east (the oblong bins between lie along most winds). A bin of one level holds two whole bins of the next.
 * A cell's key is its bin at the finest level, in Morton order: its first n bits name its bin at level n.
 */
export const FINEST_LEVEL = 26;

/** Drawn at no level: only where nothing is thinned. */
export const NO_LEVEL = FINEST_LEVEL + 1;

/** A bin of the level in use covers at least so many square CSS pixels, and less than twice as many. */
const LEAST_BIN_PX2 = 18 * 18;

/** The level whose bins suit a world so many pixels wide; `NO_LEVEL` once the finest bins are too wide apart to thin. */
export function levelFor(worldPx: number): number {
  return Math.max(0, Math.min(NO_LEVEL, Math.floor(Math.log2(worldPx ** 2 / LEAST_BIN_PX2))));
}

/** The key of a position in Web Mercator 0..1. */
export function binKey(x: number, y: number): number {
  return (spreadBits(binOf(y)) << 1) | spreadBits(binOf(x));
}

/**
 * The lowest level at which each of the cells is drawn: there, and at every finer level, it is the strongest of its bin.
 * `sorted` holds cells by rising key, `keys` their keys; the answer is by place in `sorted`. One walk for each level over
 * the cells still standing, from the finest up.
 */
export function findFirstLevels(
  sorted: Uint32Array,
  keys: Uint32Array,
  isStronger: (cell: number, than: number) => boolean,
): Uint8Array {
  const firstLevels = new Uint8Array(sorted.length);
  const standing = new Uint32Array(sorted.length);
  for (let place = 0; place < standing.length; place++) standing[place] = place;
  let count = standing.length;
  for (let level = FINEST_LEVEL; level >= 0; level--) {
    const shift = FINEST_LEVEL - level;
    let kept = 0;
    for (let i = 0; i < count; i++) {
      const place = standing[i];
      const rival = kept > 0 ? standing[kept - 1] : -1;
      if (rival < 0 || keys[place] >>> shift !== keys[rival] >>> shift) standing[kept++] = place;
      else if (isStronger(sorted[place], sorted[rival])) {
        firstLevels[rival] = level + 1;
        standing[kept - 1] = place;
      } else firstLevels[place] = level + 1;
    }
    count = kept;
  }
  return firstLevels;
}

/** Sorts cells by key, smallest first, in place and keeping the order of equals: a radix sort of two rounds. */
export function sortByKey(sorted: Uint32Array, keys: Uint32Array): void {
  let from: { cells: Uint32Array; keys: Uint32Array } = { cells: sorted, keys };
  let to: typeof from = { cells: new Uint32Array(sorted.length), keys: new Uint32Array(sorted.length) };
  for (const shift of [0, HALF_KEY_BITS]) {
    const starts = new Uint32Array((1 << HALF_KEY_BITS) + 1);
    for (const key of from.keys) starts[((key >>> shift) & HALF_KEY_MASK) + 1]++;
    for (let i = 1; i < starts.length; i++) starts[i] += starts[i - 1];
    for (let i = 0; i < from.cells.length; i++) {
      const place = starts[(from.keys[i] >>> shift) & HALF_KEY_MASK]++;
      to.cells[place] = from.cells[i];
      to.keys[place] = from.keys[i];
    }
    [from, to] = [to, from];
  }
}

const BITS_PER_AXIS = FINEST_LEVEL / 2;
const HALF_KEY_BITS = FINEST_LEVEL / 2;
const HALF_KEY_MASK = (1 << HALF_KEY_BITS) - 1;

function binOf(share: number): number {
  const bins = 2 ** BITS_PER_AXIS;
  return Math.max(0, Math.min(bins - 1, Math.floor(share * bins)));
}

/** Puts an empty bit above each of 13 bits. */
function spreadBits(bits: number): number {
  let spread = bits;
  spread = (spread | (spread << 8)) & 0x00ff00ff;
  spread = (spread | (spread << 4)) & 0x0f0f0f0f;
  spread = (spread | (spread << 2)) & 0x33333333;
  return (spread | (spread << 1)) & 0x55555555;
}
