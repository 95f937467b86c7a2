import './areas.css';
import { type GeoJSONSource, type Map as MapLibreMap, Marker } from 'maplibre-gl';
import type { Light } from '../../state/lights.ts';
import { type Position, unwrapRing } from './rings.ts';

/** The kept watch area and the one being drawn, as dashed lines: solid and dotted outlines say how a danger ends. */
export interface AreaOutline {
  /** Puts source and layers on the map below another layer, where they are not there yet. */
  add(below: string): void;
  setKept(area: { ring: readonly Position[]; name: string } | null): void;
  /** Positions drawn so far, the last one still moving; null ends it. */
  setDrawn(positions: readonly Position[] | null): void;
  setLight(light: Light): void;
}

const SOURCE = 'areas';

/** No area yet. */
export function createAreaOutline(map: MapLibreMap, firstLight: Light): AreaOutline {
  let light = firstLight;
  let kept: Position[] | null = null;
  let drawn: Position[] | null = null;
  const label = document.createElement('div');
  label.className = 'area-name';
  const marker = new Marker({ element: label, anchor: 'bottom-left', offset: [4, -2] });

  function draw(): void {
    const lines = [kept, drawn].filter((ring) => ring !== null).map((ring) => [...ring, ring[0]]);
    const source = map.getSource(SOURCE) as GeoJSONSource | undefined;
    source?.setData({ type: 'MultiLineString', coordinates: lines });
  }

  return {
    add(below) {
      if (map.getSource(SOURCE)) return;
      map.addSource(SOURCE, { type: 'geojson', data: { type: 'MultiLineString', coordinates: [] } });
      const halo = { 'line-width': 5, 'line-opacity': 0.7 };
      const line = { 'line-width': 1.75, 'line-dasharray': [7, 3] };
      map.addLayer({ id: 'area-halo', type: 'line', source: SOURCE, paint: halo }, below);
      map.addLayer({ id: 'area-line', type: 'line', source: SOURCE, paint: line }, below);
      this.setLight(light);
      draw();
    },
    setKept(area) {
      kept = area && unwrapRing(area.ring);
      draw();
      if (!area || !kept) {
        marker.remove();
        return;
      }
      label.textContent = area.name;
      marker.setLngLat(kept.reduce((top, position) => (position[1] > top[1] ? position : top))).addTo(map);
    },
    setDrawn(positions) {
      drawn = positions && positions.length > 0 ? unwrapRing(positions) : null;
      draw();
    },
    setLight(next) {
      light = next;
      if (!map.getLayer('area-line')) return;
      map.setPaintProperty('area-line', 'line-color', light.ink);
      map.setPaintProperty('area-halo', 'line-color', light.sea);
    },
  };
}
