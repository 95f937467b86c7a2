import { type View, worldPx } from '../../map/view.ts';
import type { Light } from '../../state/lights.ts';
import { linkProgram, parseColour } from '../shared/webgl.ts';
import waterFragment from './water.fragment.glsl?raw';
import waterVertex from './water.vertex.glsl?raw';

/** Draws the water of the whole view from a mask of what was seen. */
export interface Water {
  draw(view: View, light: Light, seen: WebGLTexture): void;
  remove(): void;
}

/**
 * Steps between hatch lines and between dots at a whole zoom, CSS pixels. Both go a whole number of times into the
 * world, so that the pattern runs on across the date line.
 */
const LINE_STEP_PX = 512 / Math.SQRT2 / 52;
const DOT_STEP_PX = 512 / 76;

/** The water on the graphics card. */
export function createWater(gl: WebGL2RenderingContext): Water {
  const program = linkProgram(gl, waterVertex, waterFragment);
  const noAttributes = gl.createVertexArray();
  return {
    draw(view, light, seen) {
      gl.useProgram(program.program);
      gl.bindVertexArray(noAttributes);
      gl.activeTexture(gl.TEXTURE0);
      gl.bindTexture(gl.TEXTURE_2D, seen);
      gl.uniform1i(program.at('u_seen'), 0);
      gl.uniform3fv(program.at('u_sea'), parseColour(light.sea));
      gl.uniform3fv(program.at('u_unseen'), parseColour(light.unseen));
      gl.uniform3fv(program.at('u_hatch'), parseColour(light.hatch));
      gl.uniform3fv(program.at('u_stipple'), parseColour(light.hatch));
      gl.uniform2f(program.at('u_halfPx'), view.widthPx / 2, view.heightPx / 2);
      gl.uniform1f(program.at('u_devicePx'), 1 / devicePixelRatio);
      const bearing = (view.bearing * Math.PI) / 180;
      const [cos, sin] = [Math.cos(bearing), Math.sin(bearing)];
      gl.uniformMatrix2fv(program.at('u_toEarth'), false, [cos, -sin, sin, cos]);
      const apart = 2 ** (view.zoom - Math.floor(view.zoom));
      const [lineStep, dotStep] = [LINE_STEP_PX * apart, DOT_STEP_PX * apart];
      const [east, south] = [view.x * worldPx(view), view.y * worldPx(view)];
      gl.uniform1f(program.at('u_between'), apart - 1);
      gl.uniform1f(program.at('u_lineStep'), lineStep);
      gl.uniform1f(program.at('u_linePhase'), ((east + south) / Math.SQRT2) % lineStep);
      gl.uniform1f(program.at('u_dotStep'), dotStep);
      gl.uniform2f(program.at('u_dotPhase'), east % dotStep, -(south % dotStep));
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
