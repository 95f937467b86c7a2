import { type View, worldPx } from '../../map/view.ts';
import type { Light } from '../../state/lights.ts';
import { linkProgram, type Program, parseColour } from '../shared/webgl.ts';
import waterFragment from './water.fragment.glsl?raw';
import waterVertex from './water.vertex.glsl?raw';

/** Draws the water of the whole view from a mask of what was seen. */
export interface Water {
  /** `shift` is what to add to a device pixel to find its texel in the mask. */
  draw(view: View, light: Light, seen: WebGLTexture, shift: [right: number, up: number]): void;
  remove(): void;
}

/**
 * Lines and dots round the world at zoom 0, every other of them faint. Whole and even numbers, so that the pattern runs
 * on across the date line. At a whole zoom the strong lines are 7 CSS pixels apart and the strong dots 6.7.
 */
const LINES_PER_WORLD = 104;
const DOTS_PER_WORLD = 152;

/** The water on the graphics card. */
export function createWater(gl: WebGL2RenderingContext): Water {
  const program = linkProgram(gl, waterVertex, waterFragment);
  const noAttributes = gl.createVertexArray();
  return {
    draw(view, light, seen, shift) {
      gl.useProgram(program.program);
      gl.bindVertexArray(noAttributes);
      gl.activeTexture(gl.TEXTURE0);
      gl.bindTexture(gl.TEXTURE_2D, seen);
      gl.uniform1i(program.at('u_seen'), 0);
      gl.uniform2f(program.at('u_shift'), ...shift);
      gl.uniform3fv(program.at('u_sea'), parseColour(light.sea));
      gl.uniform3fv(program.at('u_unseen'), parseColour(light.unseen));
      gl.uniform3fv(program.at('u_hatch'), parseColour(light.hatch));
      gl.uniform1f(program.at('u_devicePx'), 1 / devicePixelRatio);
      setPattern(gl, program, view);
      gl.disable(gl.BLEND);
      gl.drawArrays(gl.TRIANGLES, 0, 3);
      gl.enable(gl.BLEND);
      gl.bindVertexArray(null);
    },
    remove() {
      gl.deleteProgram(program.program);
      gl.deleteVertexArray(noAttributes);
    },
  };
}

function setPattern(gl: WebGL2RenderingContext, program: Program, view: View): void {
  const bearing = (view.bearing * Math.PI) / 180;
  const [cos, sin] = [Math.cos(bearing), Math.sin(bearing)];
  gl.uniform2f(program.at('u_halfPx'), view.widthPx / 2, view.heightPx / 2);
  gl.uniformMatrix2fv(program.at('u_toEarth'), false, [cos, -sin, sin, cos]);
  gl.uniform1f(program.at('u_between'), 2 ** (view.zoom - Math.floor(view.zoom)) - 1);
  const lines = LINES_PER_WORLD * 2 ** Math.floor(view.zoom);
  const dots = DOTS_PER_WORLD * 2 ** Math.floor(view.zoom);
  gl.uniform1f(program.at('u_linePx'), worldPx(view) / Math.SQRT2 / lines);
  gl.uniform1f(program.at('u_linesAtCentre'), ((view.x + view.y) * lines) % 2);
  gl.uniform1f(program.at('u_dotPx'), worldPx(view) / dots);
  gl.uniform2f(program.at('u_dotsAtCentre'), (view.x * dots) % 2, -((view.y * dots) % 2));
}
