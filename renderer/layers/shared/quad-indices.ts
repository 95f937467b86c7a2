/** Corners of a quad in the order of its two triangles; corner c lies right of the middle for bit 0, above it for bit 1. */
const CORNERS = [0, 1, 2, 2, 1, 3];

/** Indices that draw quads of four corners each, one after another. */
export interface QuadIndices {
  /** Ties the indices to the vertex array now bound, enough of them for so many quads. */
  bind(quads: number): void;
  /** Draws so many quads from a first one, of those last bound. */
  draw(first: number, count: number): void;
  remove(): void;
}

/** Indices on the graphics card; they grow as more quads are asked for. */
export function createQuadIndices(gl: WebGL2RenderingContext): QuadIndices {
  const buffer = gl.createBuffer();
  let held = 0;
  return {
    bind(quads) {
      gl.bindBuffer(gl.ELEMENT_ARRAY_BUFFER, buffer);
      if (quads <= held) return;
      held = Math.max(quads, held * 2);
      gl.bufferData(gl.ELEMENT_ARRAY_BUFFER, indicesFor(held), gl.STATIC_DRAW);
    },
    draw(first, count) {
      if (count === 0) return;
      const skipped = first * CORNERS.length * Uint32Array.BYTES_PER_ELEMENT;
      gl.drawElements(gl.TRIANGLES, count * CORNERS.length, gl.UNSIGNED_INT, skipped);
    },
    remove: () => gl.deleteBuffer(buffer),
  };
}

function indicesFor(quads: number): Uint32Array<ArrayBuffer> {
  const indices = new Uint32Array(quads * CORNERS.length);
  for (let i = 0; i < indices.length; i++)
    indices[i] = Math.floor(i / CORNERS.length) * 4 + CORNERS[i % CORNERS.length];
  return indices;
}
