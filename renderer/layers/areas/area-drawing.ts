import type { Map as MapLibreMap, MapMouseEvent } from 'maplibre-gl';
import type { AreaOutline } from './area-outline.ts';
import { type Position, wrapRing } from './rings.ts';

const LEAST_POSITIONS = 3;

/** Clicks this close to the last position are the second half of a double click, CSS pixels. */
const SAME_PLACE_PX = 4;

/**
 * Lets the user draw a ring: a click, or Space at the cross in the middle, adds a position; Backspace takes the last one
 * back; a double click or Enter ends it, Escape gives it up. Gives the ring, first position not repeated, or null.
 */
export function drawArea(map: MapLibreMap, outline: AreaOutline, note: HTMLElement): Promise<Position[] | null> {
  const canvas = map.getCanvas();
  const positions: Position[] = [];
  let pointer: Position | null = null;

  function draw(): void {
    outline.setDrawn(pointer ? [...positions, pointer] : positions);
    note.textContent = wordsFor(positions.length);
  }

  function add(position: Position): void {
    const last = positions.at(-1);
    if (last && isSamePlace(map, last, position)) return;
    positions.push(position);
    draw();
  }

  return new Promise((resolve) => {
    function end(ring: Position[] | null): void {
      for (const listening of listenings) listening.unsubscribe();
      canvas.removeEventListener('keydown', onKey, true);
      map.doubleClickZoom.enable();
      canvas.style.cursor = '';
      outline.setDrawn(null);
      note.hidden = true;
      resolve(ring);
    }

    function finish(): void {
      if (positions.length >= LEAST_POSITIONS) end(wrapRing(positions));
    }

    function onClick(event: MapMouseEvent): void {
      add(event.lngLat.toArray());
    }

    function onPointer(event: MapMouseEvent): void {
      pointer = event.lngLat.toArray();
      draw();
    }

    function onDoubleClick(event: MapMouseEvent): void {
      event.preventDefault();
      finish();
    }

    function onKey(event: KeyboardEvent): void {
      const act = {
        ' ': () => add(map.getCenter().toArray()),
        Enter: finish,
        Escape: () => end(null),
        Backspace: takeBack,
      }[event.key];
      if (!act) return;
      event.preventDefault();
      event.stopPropagation();
      act();
    }

    function takeBack(): void {
      positions.pop();
      draw();
    }

    const listenings = [map.on('click', onClick), map.on('mousemove', onPointer), map.on('dblclick', onDoubleClick)];
    canvas.addEventListener('keydown', onKey, true);
    map.doubleClickZoom.disable();
    canvas.style.cursor = 'crosshair';
    note.hidden = false;
    canvas.focus();
    draw();
  });
}

function wordsFor(count: number): string {
  const how = 'Click, or press Space at the cross, to set a corner.';
  if (count < LEAST_POSITIONS) return `${how} Escape gives up.`;
  return `${how} Double click or Enter ends the area, Backspace takes a corner back.`;
}

function isSamePlace(map: MapLibreMap, a: Position, b: Position): boolean {
  return map.project(a).dist(map.project(b)) < SAME_PLACE_PX;
}
