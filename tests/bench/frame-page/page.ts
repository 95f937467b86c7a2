import type { GeoJSONSource, Map as MapLibreMap } from 'maplibre-gl';
import { createBarbLayer } from '../../../renderer/layers/barbs/barb-layer.ts';
import { barbShape, fivesOf, PENNANT_BASE_PX } from '../../../renderer/layers/barbs/barb-shape.ts';
import { sortWinds, thinWinds } from '../../../renderer/layers/barbs/thinning.ts';
import { joinBlocks } from '../../../renderer/layers/shared/cells.ts';
import { sortCells } from '../../../renderer/layers/shared/shown.ts';
import { createSightLayer } from '../../../renderer/layers/sight/sight-layer.ts';
import { type BaseMap, createBaseMap } from '../../../renderer/map/base-map.ts';
import { LOWEST_LAND_LAYER } from '../../../renderer/map/map-style.ts';
import { lights } from '../../../renderer/state/lights.ts';
import type { DrawBlock } from '../../../src/contract/packed-swath.ts';
import { showEverything } from '../../../src/wind/switches.ts';
import { toWholeKnots } from '../../../src/wind/units.ts';
import { inventPass, scatterCells } from './invented-cells.ts';

const WARM_UPS = 2;
const light = lights.day;

/** What is drawn over the empty map, and of how many cells. */
export interface Subject {
  /**
   * Nothing; every barb of ours; the same as icons of the map library's symbol layer; or the chart as it is used, thinned
   * barbs over the water.
   */
  draws: 'nothing' | 'barbs' | 'symbols' | 'chart';
  cells: number;
}

/**
 * Median times of a frame of each subject, milliseconds, from its start until its pixels can be read; after a small pan
 * where `isPanning`, else of the same view again. The maps stand side by side and take turns, so that whatever else the
 * machine does falls on all of them.
 */
export async function timeFrames(subjects: readonly Subject[], tries: number, isPanning: boolean): Promise<number[]> {
  const places = subjects.map(() => document.body.appendChild(document.createElement('div')));
  const bases = places.map(openMap);
  try {
    await Promise.all(bases.map((base) => base.map.once('idle')));
    for (const [i, base] of bases.entries()) await cover(base, subjects[i]);
    const times = bases.map((): number[] => []);
    for (let n = 0; n < WARM_UPS + tries; n++) {
      for (const [i, base] of bases.entries()) times[i].push(frameMs(base.map, isPanning ? n * 0.05 : 0));
    }
    for (const base of bases) checkGraphics(base.map);
    return times.map((all) => all.slice(WARM_UPS).sort((a, b) => a - b)[tries >> 1]);
  } finally {
    for (const base of bases) base.remove();
    for (const place of places) place.remove();
  }
}
Object.assign(window, { timeFrames });

function openMap(place: HTMLElement): BaseMap {
  place.className = 'map';
  const camera = { lon: 0, lat: 20, zoom: 1.2, bearing: 0 };
  const failed = (reason: unknown) => console.error(reason);
  return createBaseMap(place, light, camera, (scale) => `coastline/land-${scale}.json`, failed);
}

async function cover({ map, view }: BaseMap, { draws, cells: count }: Subject): Promise<void> {
  if (draws === 'barbs') {
    const barbs = createBarbLayer(view, light, false);
    barbs.setWinds(windsOf(scatterCells(count)).winds);
    map.addLayer(barbs);
    if (barbs.drawnIn(view()).length < count / 2) throw new Error('barbs were left out');
  }
  if (draws === 'symbols') addSymbols(map, scatterCells(count));
  if (draws === 'chart') {
    const { cells, kinds, winds } = windsOf(inventPass(count));
    const sight = createSightLayer(view, light);
    const barbs = createBarbLayer(view, light);
    sight.setSight(cells, kinds);
    barbs.setWinds(winds);
    map.addLayer(sight, LOWEST_LAND_LAYER);
    map.addLayer(barbs);
  }
  map.triggerRepaint();
  await map.once('idle');
}

function frameMs(map: MapLibreMap, lon: number): number {
  const gl = graphicsOf(map);
  map.jumpTo({ center: [lon, 20] });
  const startMs = performance.now();
  map.redraw();
  gl.readPixels(0, 0, 1, 1, gl.RGBA, gl.UNSIGNED_BYTE, new Uint8Array(4));
  return performance.now() - startMs;
}

function windsOf(blocks: DrawBlock[]) {
  const cells = joinBlocks(blocks);
  const window = { fromMs: 0, toMs: Number.MAX_SAFE_INTEGER };
  const kinds = sortCells(cells, { switches: showEverything(), hiddenPassIds: [], window });
  return { cells, kinds, winds: { cells, ...thinWinds(cells, sortWinds(cells), kinds) } };
}

function checkGraphics(map: MapLibreMap): void {
  const gl = graphicsOf(map);
  const error = gl.getError();
  if (error !== gl.NO_ERROR) throw new Error(`the graphics context tells of error ${error}`);
}

function graphicsOf(map: MapLibreMap): WebGL2RenderingContext {
  return map.getCanvas().getContext('webgl2') as WebGL2RenderingContext;
}

function addSymbols(map: MapLibreMap, blocks: DrawBlock[]): void {
  const drawn = new Set<number>();
  const features = blocks.flatMap((block) =>
    Array.from({ length: block.cells }, (_, cell) => {
      const fives = fivesOf(toWholeKnots(block.speedMs[cell]));
      if (!drawn.has(fives)) map.addImage(`barb-${fives}`, drawIcon(fives));
      drawn.add(fives);
      return {
        type: 'Feature' as const,
        properties: { icon: `barb-${fives}`, turn: block.directionFrom[cell] },
        geometry: {
          type: 'Point' as const,
          coordinates: [block.lonE5[cell] / 1e5, block.latE5[cell] / 1e5],
        },
      };
    }),
  );
  map.addSource('winds', { type: 'geojson', data: { type: 'FeatureCollection', features: [] } });
  map.addLayer({
    id: 'winds',
    type: 'symbol',
    source: 'winds',
    layout: {
      'icon-image': ['get', 'icon'],
      'icon-rotate': ['get', 'turn'],
      'icon-rotation-alignment': 'map',
      'icon-allow-overlap': true,
      'icon-ignore-placement': true,
    },
  });
  (map.getSource('winds') as GeoJSONSource).setData({ type: 'FeatureCollection', features });
}

/** A barb as an icon that points north, its position in the middle. */
function drawIcon(fives: number): ImageData {
  const size = 64;
  const context = new OffscreenCanvas(size, size).getContext('2d') as OffscreenCanvasRenderingContext2D;
  const { strokes, pennants } = barbShape(fives);
  const at = (x: number, y: number): [number, number] => [size / 2 + x, size / 2 - y];
  context.strokeStyle = light.windInks[2];
  context.fillStyle = light.windInks[2];
  context.lineWidth = 1.35;
  for (const { from, to } of strokes) {
    context.beginPath();
    context.moveTo(...at(...from));
    context.lineTo(...at(...to));
    context.stroke();
  }
  for (const { from, to } of pennants) {
    context.beginPath();
    context.moveTo(...at(from[0], from[1] - PENNANT_BASE_PX / 2));
    context.lineTo(...at(from[0], from[1] + PENNANT_BASE_PX / 2));
    context.lineTo(...at(...to));
    context.fill();
  }
  return context.getImageData(0, 0, size, size);
}
