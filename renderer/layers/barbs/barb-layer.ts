import type { CustomLayerInterface } from 'maplibre-gl';
import { nearTo, reachOf, type View } from '../../map/view.ts';
import { inkWeightsPx, type Light } from '../../state/lights.ts';
import { barbSizeAt } from '../shared/barb-size.ts';
import { setCamera, withCamera } from '../shared/camera.ts';
import { isInReach } from '../shared/cells.ts';
import { createQuadIndices } from '../shared/quad-indices.ts';
import { linkProgram, type Program, parseColour } from '../shared/webgl.ts';
import barbFragment from './barb.fragment.glsl?raw';
import barbVertex from './barb.vertex.glsl?raw';
import { barbShape, MOST_FIVES, PENNANT_BASE_PX } from './barb-shape.ts';
import type { Run } from './drawing-list.ts';
import { isLaidOutFor, type Layout, layOutWinds, type Winds } from './layout.ts';
import markFragment from './mark.fragment.glsl?raw';
import markVertex from './mark.vertex.glsl?raw';
import { createWindTexture, type WindTexture } from './wind-texture.ts';

export interface BarbLayer extends CustomLayerInterface {
  setWinds(winds: Winds): void;
  setLight(light: Light): void;
  /** The cells whose wind is drawn in a view. */
  drawnIn(view: View): number[];
}

/** A mark reaches so far from its position, CSS pixels. */
const MARK_REACH_PX = 8;

/**
 * The winds as barbs and marks in one WebGL2 layer, vertices pulled from a data texture. `isThinned` false draws every
 * wind at every zoom.
 */
export function createBarbLayer(view: () => View, light: Light, isThinned = true): BarbLayer {
  let inks = light.windInks.flatMap(parseColour);
  let winds: Winds | null = null;
  let layout: Layout | null = null;
  let given: Layout | null = null;
  let drawing: Drawing | null = null;

  function layOutFor(now: View): Layout | null {
    if (winds && !(layout && isLaidOutFor(layout, winds, now, isThinned))) layout = layOutWinds(winds, now, isThinned);
    return layout;
  }

  return {
    id: 'barbs',
    type: 'custom',
    renderingMode: '2d',
    setWinds(next) {
      winds = next;
    },
    setLight(next) {
      inks = next.windInks.flatMap(parseColour);
    },
    drawnIn(now) {
      const laidOut = layOutFor(now);
      const reach = reachOf(now);
      return laidOut ? laidOut.drawn.filter((cell) => isInReach(laidOut.winds.cells, cell, reach)) : [];
    },
    onAdd(_map, gl) {
      drawing = createDrawing(gl);
      given = null;
    },
    onRemove() {
      drawing?.remove();
      drawing = null;
    },
    render() {
      const now = view();
      const laidOut = layOutFor(now);
      if (!laidOut || !drawing) return;
      if (given !== laidOut) drawing.texture.fill(laidOut.list.words);
      given = laidOut;
      drawing.draw(laidOut.list.runs, nearTo(laidOut.reach, now), inks);
    },
  };
}

interface Drawing {
  texture: WindTexture;
  draw(runs: readonly Run[], view: View, inks: number[]): void;
  remove(): void;
}

function createDrawing(gl: WebGL2RenderingContext): Drawing {
  const barbs = linkProgram(gl, withCamera(barbVertex), barbFragment);
  const marks = linkProgram(gl, withCamera(markVertex), markFragment);
  const texture = createWindTexture(gl);
  const noAttributes = gl.createVertexArray();
  const quads = createQuadIndices(gl);

  function begin(program: Program, view: View, inks: number[]): void {
    gl.useProgram(program.program);
    setCamera(gl, program, view);
    gl.uniform1f(program.at('u_devicePx'), 1 / devicePixelRatio);
    gl.uniform1f(program.at('u_size'), barbSizeAt(view.zoom));
    gl.uniform1f(program.at('u_reach'), MARK_REACH_PX * barbSizeAt(view.zoom));
    gl.uniform1fv(program.at('u_weight'), inkWeightsPx);
    gl.uniform3fv(program.at('u_ink'), inks);
    gl.uniform1i(program.at('u_winds'), 0);
  }

  function drawRun({ shape, first, count }: Run): void {
    const program = 'mark' in shape ? marks : barbs;
    gl.uniform1i(program.at('u_first'), first);
    if ('mark' in shape) {
      gl.uniform1i(program.at('u_mark'), shape.mark);
      quads.draw(0, count);
      return;
    }
    const { pennants, strokes } = barbShape(Math.min(shape.fives, MOST_FIVES));
    for (const [pieces, baseHalf] of [
      [pennants, PENNANT_BASE_PX / 2],
      [strokes, 0],
    ] as const) {
      gl.uniform1f(program.at('u_baseHalf'), baseHalf);
      for (const { from, to } of pieces) {
        gl.uniform4f(program.at('u_piece'), ...from, ...to);
        quads.draw(0, count);
      }
    }
  }

  return {
    texture,
    draw(runs, view, inks) {
      gl.bindVertexArray(noAttributes);
      quads.bind(runs.reduce((most, { count }) => Math.max(most, count), 0));
      gl.activeTexture(gl.TEXTURE0);
      texture.bind();
      gl.enable(gl.BLEND);
      gl.blendFunc(gl.ONE, gl.ONE_MINUS_SRC_ALPHA);
      for (const program of [marks, barbs]) {
        begin(program, view, inks);
        for (const run of runs) if ('mark' in run.shape === (program === marks)) drawRun(run);
      }
      gl.bindVertexArray(null);
    },
    remove() {
      gl.deleteProgram(barbs.program);
      gl.deleteProgram(marks.program);
      gl.deleteVertexArray(noAttributes);
      quads.remove();
      texture.remove();
    },
  };
}
