import type { View } from '../../map/view.ts';
import { setCamera, withCamera } from '../shared/camera.ts';
import { createQuadIndices } from '../shared/quad-indices.ts';
import { linkProgram } from '../shared/webgl.ts';
import type { FootprintTiles } from './footprint-tiles.ts';
import maskFragment from './mask.fragment.glsl?raw';
import maskVertex from './mask.vertex.glsl?raw';

/** The view as a picture of what was seen, one texel for each device pixel: red seen, green seen without a wind. */
export interface SeenMask {
  readonly texture: WebGLTexture;
  fill(tiles: FootprintTiles): void;
  draw(view: View): void;
  remove(): void;
}

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
  let noWindQuads = 0;
  let windQuads = 0;

  gl.bindVertexArray(layout);
  gl.bindBuffer(gl.ARRAY_BUFFER, corners);
  const mercator = gl.getAttribLocation(program.program, 'a_mercator');
  gl.enableVertexAttribArray(mercator);
  gl.vertexAttribPointer(mercator, 2, gl.FLOAT, false, 0, 0);
  gl.bindVertexArray(null);

  function takeSize(): void {
    const [width, height] = [gl.drawingBufferWidth, gl.drawingBufferHeight];
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
    },
    draw(view) {
      takeSize();
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
      drawQuads(view);
      gl.bindVertexArray(null);
      gl.bindFramebuffer(gl.FRAMEBUFFER, null);
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
