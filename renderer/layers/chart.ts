import './chart.css';
import type { DrawBlock } from '../../src/contract/packed-swath.ts';
import type { GeoBox } from '../../src/contract/values.ts';
import { type Camera, createBaseMap } from '../map/base-map.ts';
import type { CoastScale } from '../map/land.ts';
import { LOWEST_LAND_LAYER, landLayers } from '../map/map-style.ts';
import { boxOf, toScreen } from '../map/view.ts';
import { type Light, type LightName, lights } from '../state/lights.ts';
import { drawArea } from './areas/area-drawing.ts';
import { createAreaOutline } from './areas/area-outline.ts';
import type { Position } from './areas/rings.ts';
import { createBarbLayer } from './barbs/barb-layer.ts';
import { sortWinds, thinWinds } from './barbs/thinning.ts';
import { pickCell } from './picking/pick-cell.ts';
import { createSelectionMark } from './selection/selection-mark.ts';
import { joinBlocks, placeOf } from './shared/cells.ts';
import { type Shown, sortCells } from './shared/shown.ts';
import { createSightLayer } from './sight/sight-layer.ts';
import { findUnseenPlaces } from './sight/unseen-places.ts';
import { createUnseenWords } from './sight/words.ts';

export interface ChartOptions {
  light: LightName;
  camera: Camera;
  /** Where the base map's land is read from, of the page's own origin. */
  coastlineUrl: (scale: CoastScale) => string;
  /** Hears why the base map could not be read. */
  failed?: (reason: unknown) => void;
}

/** A cell on the chart; row and column are counted from 1. */
export interface ChartPlace {
  passId: number;
  row: number;
  column: number;
  lon: number;
  lat: number;
}

export interface Chart {
  /** All blocks now held. Nothing is done where they are the very blocks given before. */
  setBlocks(blocks: readonly DrawBlock[]): void;
  /** Draws nothing but the base map until it was called once. */
  setShown(shown: Shown): void;
  setLight(name: LightName): void;
  setSelected(place: ChartPlace | null): void;
  setWatchArea(area: { ring: readonly Position[]; name: string } | null): void;
  /** Lets the user draw a ring, by pointer or keys. Null when it was given up. One at a time. */
  startDrawingArea(): Promise<Position[] | null>;
  goTo(place: { lon: number; lat: number; zoom?: number }): void;
  frameBox(box: GeoBox): void;
  camera(): Camera;
  /** What is in view; west > east across the date line, -180 to 180 when a world or more is. */
  box(): GeoBox;
  /** Called four times a second while the camera moves, and when it rests. Returns its stop. */
  onMove(listener: () => void): () => void;
  /** Called with the cell that was clicked, or lay under the cross when Enter was pressed; null where nobody looked. Returns its stop. */
  onPick(listener: (place: ChartPlace | null) => void): () => void;
  /** Winds drawn in view and the strongest of them, for tests. */
  drawnCounts(): { barbs: number; maxSpeedMs: number | null };
  /** Settles once everything asked for is drawn. */
  idle(): Promise<void>;
  remove(): void;
}

const MOVE_NEWS_MS = 250;

/** The chart in a container: base map, seen water, barbs, the chosen cell and the watch area. */
export function createChart(container: HTMLElement, options: ChartOptions): Chart {
  let light = lights[options.light];
  const base = createBaseMap(container, light, options.camera, options.coastlineUrl, options.failed ?? (() => {}));
  const { map, view } = base;
  const sight = createSightLayer(view, light);
  const barbs = createBarbLayer(view, light);
  const areas = createAreaOutline(map, light);
  const selection = createSelectionMark(map);
  const words = createUnseenWords(container);
  const cross = addElement(container, 'chart-cross');
  const note = addElement(container, 'area-note');
  note.hidden = true;
  note.role = 'status';

  const moveListeners = new Set<() => void>();
  const pickListeners = new Set<(place: ChartPlace | null) => void>();
  let blocks: readonly DrawBlock[] = [];
  let cells = joinBlocks([]);
  let sorted = sortWinds(cells);
  let shown: Shown | null = null;
  let kinds = new Uint8Array(0);
  let areWordsStale = true;
  let isDrawing = false;

  function show(areCellsNew: boolean): void {
    if (!shown) return;
    const before = kinds;
    kinds = sortCells(cells, shown);
    if (!areCellsNew && areEqual(kinds, before)) return;
    sight.setSight(cells, kinds);
    barbs.setWinds({ cells, ...thinWinds(cells, sorted, kinds) });
    words.place([], view());
    areWordsStale = true;
    map.triggerRepaint();
  }

  function placeWords(): void {
    if (!shown || !areWordsStale) return;
    areWordsStale = false;
    const now = view();
    const places = findUnseenPlaces(cells, kinds, now).filter(({ x, y }) => !isLandAbout(toScreen(now, x, y)));
    words.place(places, now);
  }

  function isLandAbout([xPx, yPx]: [number, number]): boolean {
    const [right, down] = [56, 14];
    const box: [[number, number], [number, number]] = [
      [xPx - right, yPx - down],
      [xPx + right, yPx + down],
    ];
    return map.queryRenderedFeatures(box, { layers: landLayers }).length > 0;
  }

  function pickAt(xPx: number, yPx: number): void {
    if (isDrawing) return;
    const now = view();
    const cell = pickCell(cells, kinds, barbs.drawnIn(now), now, { xPx, yPx });
    const place = cell === null ? null : placeOf(cells, cell);
    for (const listener of [...pickListeners]) listener(place);
  }

  function onKey(event: KeyboardEvent): void {
    if (event.key === 'Enter') pickAt(view().widthPx / 2, view().heightPx / 2);
  }

  function tellMoved(): void {
    for (const listener of [...moveListeners]) listener();
  }

  let toldMs = 0;
  map.on('style.load', () => {
    // Also after a lost graphics context, which takes our layers with it. Barbs first: seen water without its winds would
    // be taken for calm.
    map.addLayer(barbs);
    areas.add(barbs.id);
    map.addLayer(sight, LOWEST_LAND_LAYER);
  });
  map.on('move', () => {
    words.follow(view());
    areWordsStale = true;
    if (performance.now() - toldMs < MOVE_NEWS_MS) return;
    toldMs = performance.now();
    tellMoved();
  });
  map.on('moveend', tellMoved);
  map.on('resize', tellMoved);
  map.on('sourcedata', ({ sourceId }) => {
    if (sourceId?.startsWith('land-')) areWordsStale = true;
  });
  map.on('idle', placeWords);
  map.on('click', (event) => pickAt(event.point.x, event.point.y));
  map.getCanvas().addEventListener('keydown', onKey);
  dress(container, light);

  return {
    setBlocks(next) {
      if (next.length === blocks.length && next.every((block, i) => block === blocks[i])) return;
      blocks = next;
      cells = joinBlocks(next);
      sorted = sortWinds(cells);
      show(true);
    },
    setShown(next) {
      const isFirst = shown === null;
      shown = next;
      show(isFirst);
    },
    setLight(name) {
      light = lights[name];
      dress(container, light);
      for (const part of [base, sight, barbs, areas]) part.setLight(light);
      map.triggerRepaint();
    },
    setSelected: (place) => selection.set(place),
    setWatchArea: (area) => areas.setKept(area),
    async startDrawingArea() {
      if (isDrawing) return null;
      isDrawing = true;
      try {
        return await drawArea(map, areas, note);
      } finally {
        isDrawing = false;
      }
    },
    goTo({ lon, lat, zoom }) {
      map.jumpTo({ center: [lon, lat], ...(zoom !== undefined && { zoom }) });
    },
    frameBox({ west, south, east, north }) {
      const eastOfWest = east < west ? east + 360 : east;
      map.fitBounds([west, south, eastOfWest, north], { animate: false, padding: 32, bearing: map.getBearing() });
    },
    camera() {
      const { lng, lat } = map.getCenter();
      return { lon: lng, lat, zoom: map.getZoom(), bearing: map.getBearing() };
    },
    box: () => boxOf(view()),
    onMove: (listener) => listen(moveListeners, listener),
    onPick: (listener) => listen(pickListeners, listener),
    drawnCounts() {
      const drawn = barbs.drawnIn(view());
      const strongest = drawn.reduce((most, cell) => Math.max(most, cells.speedMs[cell]), -1);
      return { barbs: drawn.length, maxSpeedMs: drawn.length > 0 ? strongest : null };
    },
    async idle() {
      map.triggerRepaint();
      await map.once('idle');
    },
    remove() {
      map.getCanvas().removeEventListener('keydown', onKey);
      base.remove();
      words.remove();
      cross.remove();
      note.remove();
    },
  };
}

function areEqual(a: Uint8Array, b: Uint8Array): boolean {
  return a.length === b.length && a.every((kind, i) => kind === b[i]);
}

function listen<Listener>(listeners: Set<Listener>, listener: Listener): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

function addElement(container: HTMLElement, className: string): HTMLElement {
  const element = document.createElement('div');
  element.className = className;
  container.append(element);
  return element;
}

/** Gives the text over the chart the colours of a light. */
function dress(container: HTMLElement, light: Light): void {
  const { ink, soft, paper, sea, unseen } = light;
  for (const [name, token] of Object.entries({ ink, soft, paper, unseen, halo: sea })) {
    container.style.setProperty(`--chart-${name}`, token);
  }
}
