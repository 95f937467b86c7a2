import { type View, worldPx } from '../../map/view.ts';
import camera from './camera.glsl?raw';
import type { Program } from './webgl.ts';

/** A vertex shader with `placeOnScreen` in it: what camera.glsl declares goes in after the source's first line. */
export function withCamera(vertexSource: string): string {
  const firstLineEnd = vertexSource.indexOf('\n') + 1;
  return `${vertexSource.slice(0, firstLineEnd)}precision highp float;\n${camera}${vertexSource.slice(firstLineEnd)}`;
}

/** Sets the camera of a program in use to a view. */
export function setCamera(gl: WebGL2RenderingContext, program: Program, view: View): void {
  const bearing = (view.bearing * Math.PI) / 180;
  gl.uniform2f(program.at('u_centre'), view.x, view.y);
  gl.uniform1f(program.at('u_worldPx'), worldPx(view));
  gl.uniformMatrix2fv(program.at('u_turn'), false, turnOf(bearing));
  gl.uniform2f(program.at('u_clipPerPx'), 2 / view.widthPx, 2 / view.heightPx);
}

/** Columns of the matrix that takes east and north to right and up, for a bearing in radians. */
function turnOf(bearing: number): [number, number, number, number] {
  return [Math.cos(bearing), Math.sin(bearing), -Math.sin(bearing), Math.cos(bearing)];
}
