import './selection.css';
import { type Map as MapLibreMap, Marker } from 'maplibre-gl';

const RING = `<svg viewBox="-40 -40 80 80" width="80" height="80" aria-hidden="true">
  <g class="halo"><circle r="15"/><path d="M15 0H36"/></g>
  <g class="line"><circle r="15"/><path d="M15 0H36"/></g>
</svg>`;

/** A ring about the chosen cell, with a line that leads the eye to it. */
export function createSelectionMark(map: MapLibreMap): { set(place: { lon: number; lat: number } | null): void } {
  const element = document.createElement('div');
  element.className = 'selection-mark';
  element.innerHTML = RING;
  const marker = new Marker({ element, anchor: 'center' });
  return {
    set(place) {
      if (place) marker.setLngLat([place.lon, place.lat]).addTo(map);
      else marker.remove();
    },
  };
}
