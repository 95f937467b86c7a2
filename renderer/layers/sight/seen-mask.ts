import { toScreen, type View } from '../../map/view.ts';
import { setCamera, withCamera } from '../shared/camera.ts';
import { createQuadIndices } from '../shared/quad-indices.ts';
import { linkProgram } from '../shared/webgl.ts';
import type { FootprintTiles } from './footprint-tiles.ts';
import maskFragment from './mask.fragment.glsl?raw';
import maskVertex from './mask.vertex.glsl?raw';

/**
 * The view and a margin round it as a picture of what was seen, one texel for each device pixel: red seen, green seen
 * without a wind.
 */
export interface SeenMask {
  readonly texture: WebGLTexture;
  fill(tiles: FootprintTiles): void;
  /** Draws the mask for a view, unless the one there serves it still: after a short pan it only lies elsewhere. */
  draw(view: View): void;
  /** What to add to a device pixel of a view, right and up from its bottom left, to find its texel. */
  shiftFor(view: View): [right: number, up: number];
  remove(): void;
}

/** How far past the view the mask reaches, CSS pixels. */
export const MASK_MARGIN_PX = 64;

const FLOATS_PER_QUAD = 8;

/** A mask on the graphics card; it takes the size of the drawing buffer. */
export function createSeenMask(gl: WebGL2RenderingContext): SeenMask {
  const program = linkProgram(gl, withCamera(maskVertex), maskFragment);
  const texture = gl.createTexture();
  const framebuffer = gl.createFramebuffer();
  const corners = gl.createBuffer();
  const quads = createQuadIndices(gl);
  const layout = gl.createVertexArray();
  let size = { width: 0, height: 0 };
  let drawn: View | null = null;
  let noWindQuads = 0;
  let windQuads = 0;

  gl.bindVertexArray(layout);
  gl.bindBuffer(gl.ARRAY_BUFFER, corners);
  const mercator = gl.getAttribLocation(program.program, 'a_mercator');
  gl.enableVertexAttribArray(mercator);
  gl.vertexAttribPointer(mercator, 2, gl.FLOAT, false, 0, 0);
  gl.bindVertexArray(null);

  function takeSize(view: View): void {
    const width = Math.round(view.widthPx * pixelRatio(view));
    const height = Math.round(view.heightPx * pixelRatio(view));
    if (size.width === width && size.height === height) return;
    size = { width, height };
    gl.bindTexture(gl.TEXTURE_2D, texture);
    gl.texImage2D(gl.TEXTURE_2D, 0, gl.RG8, width, height, 0, gl.RG, gl.UNSIGNED_BYTE, null);
    for (const side of [gl.TEXTURE_WRAP_S, gl.TEXTURE_WRAP_T]) gl.texParameteri(gl.TEXTURE_2D, side, gl.CLAMP_TO_EDGE);
    gl.texParameteri(gl.TEXTURE_2D, gl.TEXTURE_MIN_FILTER, gl.LINEAR);
    gl.texParameteri(gl.TEXTURE_2D, gl.TEXTURE_MAG_FILTER, gl.LINEAR);
    gl.bindFramebuffer(gl.FRAMEBUFFER, framebuffer);
    gl.framebufferTexture2D(gl.FRAMEBUFFER, gl.COLOR_ATTACHMENT0, gl.TEXTURE_2D, texture, 0);
  }

  function pixelRatio(view: View): number {
    return gl.drawingBufferWidth / (view.widthPx - 2 * MASK_MARGIN_PX);
  }

  function drawQuads(view: View): void {
    gl.useProgram(program.program);
    setCamera(gl, program, view);
    gl.uniform1f(program.at('u_noWind'), 1);
    quads.draw(0, noWindQuads);
    gl.uniform1f(program.at('u_noWind'), 0);
    quads.draw(noWindQuads, windQuads);
  }

  return {
    texture,
    fill(tiles) {
      noWindQuads = tiles.noWind.length / FLOATS_PER_QUAD;
      windQuads = tiles.wind.length / FLOATS_PER_QUAD;
      const floats = new Float32Array(tiles.noWind.length + tiles.wind.length);
      floats.set(tiles.noWind);
      floats.set(tiles.wind, tiles.noWind.length);
      gl.bindVertexArray(layout);
      gl.bindBuffer(gl.ARRAY_BUFFER, corners);
      gl.bufferData(gl.ARRAY_BUFFER, floats, gl.DYNAMIC_DRAW);
      quads.bind(noWindQuads + windQuads);
      gl.bindVertexArray(null);
      drawn = null;
    },
    draw(view) {
      if (drawn && serves(drawn, view)) return;
      drawn = grow(view);
      takeSize(drawn);
      gl.bindFramebuffer(gl.FRAMEBUFFER, framebuffer);
      gl.viewport(0, 0, size.width, size.height);
      gl.disable(gl.BLEND);
      gl.disable(gl.DEPTH_TEST);
      gl.disable(gl.STENCIL_TEST);
      gl.disable(gl.SCISSOR_TEST);
      gl.disable(gl.CULL_FACE);
      gl.colorMask(true, true, true, true);
      gl.clearColor(0, 0, 0, 0);
      gl.clear(gl.COLOR_BUFFER_BIT);
      gl.bindVertexArray(layout);
      drawQuads(drawn);
      gl.bindVertexArray(null);
      gl.bindFramebuffer(gl.FRAMEBUFFER, null);
      gl.viewport(0, 0, gl.drawingBufferWidth, gl.drawingBufferHeight);
    },
    shiftFor(view) {
      const [rightPx, downPx] = drawn ? apartPx(drawn, view) : [0, 0];
      const ratio = pixelRatio(grow(view));
      return [Math.round((MASK_MARGIN_PX - rightPx) * ratio), Math.round((MASK_MARGIN_PX + downPx) * ratio)];
    },
    remove() {
      gl.deleteProgram(program.program);
      gl.deleteTexture(texture);
      gl.deleteFramebuffer(framebuffer);
      gl.deleteBuffer(corners);
      quads.remove();
      gl.deleteVertexArray(layout);
    },
  };
}

function grow(view: View): View {
  const more = 2 * MASK_MARGIN_PX;
  return { ...view, widthPx: view.widthPx + more, heightPx: view.heightPx + more };
}

/** Whether a mask drawn for one view, margin and all, holds another. */
function serves(drawn: View, view: View): boolean {
  const grown = grow(view);
  const isSameSize = drawn.widthPx === grown.widthPx && drawn.heightPx === grown.heightPx;
  const isSameScale = drawn.zoom === view.zoom && drawn.bearing === view.bearing;
  return isSameSize && isSameScale && apartPx(drawn, view).every((px) => Math.abs(px) < MASK_MARGIN_PX - 1);
}

/** Where the middle of what is drawn lies in a view, CSS pixels right of and below its middle. */
function apartPx(drawn: View, view: View): [rightPx: number, downPx: number] {
  const [xPx, yPx] = toScreen(view, drawn.x, drawn.y);
  return [xPx - view.widthPx / 2, yPx - view.heightPx / 2];
}
