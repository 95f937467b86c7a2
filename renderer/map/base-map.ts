import 'maplibre-gl/dist/maplibre-gl.css';
import './map.css';
import { type GeoJSONSource, Map as MapLibreMap, setWorkerUrl } from 'maplibre-gl';
import workerUrl from 'maplibre-gl/dist/maplibre-gl-worker.mjs?url';
import type { Light } from '../state/lights.ts';
import { graticuleStep, linesIn } from './graticule.ts';
import { type CoastScale, keepLand } from './land.ts';
import { baseColours, mapStyle } from './map-style.ts';
import { drawMargin } from './margin.ts';
import { mercatorX, mercatorY } from './mercator.ts';
import { type View, worldPx } from './view.ts';

export interface Camera {
  lon: number;
  lat: number;
  zoom: number;
  bearing: number;
}

export interface BaseMap {
  map: MapLibreMap;
  view(): View;
  setLight(light: Light): void;
  remove(): void;
}

/** Past this zoom one cell of the finest swaths fills the view. */
const CLOSEST_ZOOM = 11;

/**
 * The offline base map in a container: land, coast, graticule, and in the margin the names of its lines and a scale bar.
 * Seen straight down in Web Mercator; it may be turned, never tilted. Asks only for `coastlineUrl`; `failed` hears what
 * could not be read or drawn.
 */
export function createBaseMap(
  container: HTMLElement,
  firstLight: Light,
  camera: Camera,
  coastlineUrl: (scale: CoastScale) => string,
  failed: (reason: unknown) => void,
): BaseMap {
  setWorkerUrl(new URL(workerUrl, location.href).href);
  container.classList.add('chart');
  const canvasPlace = document.createElement('div');
  canvasPlace.className = 'chart-canvas';
  container.append(canvasPlace);
  const map = new MapLibreMap({
    container: canvasPlace,
    style: mapStyle(firstLight),
    center: [camera.lon, camera.lat],
    zoom: camera.zoom,
    bearing: camera.bearing,
    minZoom: 0.5,
    maxZoom: CLOSEST_ZOOM,
    maxPitch: 0,
    pitchWithRotate: false,
    touchPitch: false,
    rollEnabled: false,
    attributionControl: false,
    fadeDuration: 0,
    canvasContextAttributes: { antialias: false },
  });
  const margin = drawMargin(container);
  const view = () => viewOf(map);
  const drawGraticule = keepGraticule(map);
  let stopLand = () => {};
  let isStyled = false;
  let light = firstLight;

  function paint(): void {
    if (!isStyled) return;
    for (const { layer, property, colour } of baseColours(light)) map.setPaintProperty(layer, property, colour);
  }

  map.once('style.load', () => {
    isStyled = true;
    paint();
    stopLand = keepLand(map, coastlineUrl, failed);
    drawGraticule(view());
  });
  map.on('error', ({ error }) => failed(error));
  map.on('move', () => {
    margin.draw(view());
    if (isStyled) drawGraticule(view());
  });
  map.on('resize', () => margin.draw(view()));
  margin.draw(view());

  return {
    map,
    view,
    setLight(next) {
      light = next;
      paint();
    },
    remove() {
      stopLand();
      map.remove();
      margin.remove();
      canvasPlace.remove();
      container.classList.remove('chart');
    },
  };
}

function viewOf(map: MapLibreMap): View {
  const { lng, lat } = map.getCenter();
  const { clientWidth, clientHeight } = map.getContainer();
  return {
    x: mercatorX(lng),
    y: mercatorY(lat),
    zoom: map.getZoom(),
    bearing: map.getBearing(),
    widthPx: clientWidth,
    heightPx: clientHeight,
  };
}

/** How far past the view the graticule is drawn, as a share of the view, before it is drawn again. */
const GRATICULE_REACH = 1;

/** Draws the graticule round a view, and again once the view leaves it or wants another step. */
function keepGraticule(map: MapLibreMap): (view: View) => void {
  let drawn: { step: number; view: View } | null = null;
  return (view) => {
    const step = graticuleStep(view.zoom);
    if (drawn && drawn.step === step && isNear(drawn.view, view)) return;
    drawn = { step, view };
    const { meridians, parallels } = linesIn(view, step, GRATICULE_REACH * Math.max(view.widthPx, view.heightPx));
    const west = meridians[0];
    // The map repeats what is drawn once round the world; twice would be twice as dark.
    const east = Math.min(west + 360, meridians[meridians.length - 1]);
    const coordinates = [
      ...meridians
        .filter((lon) => lon < west + 360)
        .map((lon) => [
          [lon, -89],
          [lon, 89],
        ]),
      ...parallels.map((lat) => [
        [west, lat],
        [east, lat],
      ]),
    ];
    (map.getSource('graticule') as GeoJSONSource).setData({ type: 'MultiLineString', coordinates });
  };
}

function isNear(drawn: View, view: View): boolean {
  const px = worldPx(view);
  const reach = (GRATICULE_REACH * Math.max(view.widthPx, view.heightPx)) / 2;
  return (
    Math.abs(drawn.x - view.x) * px < reach && Math.abs(drawn.y - view.y) * px < reach && view.zoom > drawn.zoom - 0.5
  );
}
