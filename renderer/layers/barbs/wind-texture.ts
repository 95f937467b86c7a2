import { WORDS_PER_ENTRY } from './drawing-list.ts';

/** Entries in one row of the texture; the shaders count on it (ROW_BITS). */
const ENTRIES_PER_ROW = 2048;

/** The entries of a drawing list on the graphics card, one texel each. */
export interface WindTexture {
  fill(words: Uint32Array<ArrayBuffer>): void;
  bind(): void;
  remove(): void;
}

/** An empty texture; it grows as it is filled. */
export function createWindTexture(gl: WebGL2RenderingContext): WindTexture {
  const texture = gl.createTexture();
  let rows = 0;

  function grow(wanted: number): void {
    rows = Math.max(wanted, rows * 2);
    gl.texImage2D(gl.TEXTURE_2D, 0, gl.RGBA32UI, ENTRIES_PER_ROW, rows, 0, gl.RGBA_INTEGER, gl.UNSIGNED_INT, null);
    gl.texParameteri(gl.TEXTURE_2D, gl.TEXTURE_MIN_FILTER, gl.NEAREST);
    gl.texParameteri(gl.TEXTURE_2D, gl.TEXTURE_MAG_FILTER, gl.NEAREST);
  }

  function write(row: number, width: number, height: number, words: Uint32Array): void {
    if (width * height === 0) return;
    gl.texSubImage2D(gl.TEXTURE_2D, 0, 0, row, width, height, gl.RGBA_INTEGER, gl.UNSIGNED_INT, words);
  }

  return {
    fill(words) {
      const entries = words.length / WORDS_PER_ENTRY;
      const fullRows = Math.floor(entries / ENTRIES_PER_ROW);
      gl.bindTexture(gl.TEXTURE_2D, texture);
      setUnpacking(gl);
      if (fullRows + 1 > rows) grow(fullRows + 1);
      const wordsInFullRows = fullRows * ENTRIES_PER_ROW * WORDS_PER_ENTRY;
      write(0, ENTRIES_PER_ROW, fullRows, words.subarray(0, wordsInFullRows));
      write(fullRows, entries - fullRows * ENTRIES_PER_ROW, 1, words.subarray(wordsInFullRows));
    },
    bind() {
      gl.bindTexture(gl.TEXTURE_2D, texture);
    },
    remove() {
      gl.deleteTexture(texture);
    },
  };
}

/** The map leaves its own unpacking behind; integers take none. */
function setUnpacking(gl: WebGL2RenderingContext): void {
  gl.pixelStorei(gl.UNPACK_ALIGNMENT, 4);
  gl.pixelStorei(gl.UNPACK_FLIP_Y_WEBGL, false);
  gl.pixelStorei(gl.UNPACK_PREMULTIPLY_ALPHA_WEBGL, false);
}
