import type { LayerSpecification, StyleSpecification } from 'maplibre-gl';
import type { Light } from '../state/lights.ts';
import { type CoastScale, coastScales } from './land.ts';

/** The layers of land, one for each scale. */
export const landLayers = coastScales.map((scale) => `land-${scale}`);

/** The layer below which the water is drawn. */
export const LOWEST_LAND_LAYER = landLayers[0];

/** The base map with no land loaded yet. Text is drawn beside the map, so the style names no glyphs and asks for nothing. */
export function mapStyle(light: Light): StyleSpecification {
  const sources: StyleSpecification['sources'] = { graticule: emptySource() };
  for (const scale of coastScales) sources[`land-${scale}`] = { ...emptySource(), maxzoom: 9 };
  return {
    version: 8,
    sources,
    layers: [
      { id: 'water', type: 'background', paint: { 'background-color': light.unseen } },
      ...coastScales.map(landLayer),
      ...coastScales.map(coastLayer),
      { id: 'graticule', type: 'line', source: 'graticule', paint: { 'line-width': 1 } },
    ],
  };
}

/** The paint of the base map in a light: layer, property and value. */
export function basePaint(light: Light): [layer: string, property: string, value: unknown][] {
  return [
    ['water', 'background-color', light.unseen],
    ['graticule', 'line-color', light.ink],
    ['graticule', 'line-opacity', 0.13],
    ...coastScales.flatMap((scale): [string, string, unknown][] => [
      [`land-${scale}`, 'fill-color', light.land],
      [`coast-${scale}`, 'line-color', light.coast],
    ]),
  ];
}

function landLayer(scale: CoastScale): LayerSpecification {
  return {
    id: `land-${scale}`,
    type: 'fill',
    source: `land-${scale}`,
    filter: ['==', ['get', 'is'], 'land'],
    layout: { visibility: 'none' },
  };
}

function coastLayer(scale: CoastScale): LayerSpecification {
  return {
    id: `coast-${scale}`,
    type: 'line',
    source: `land-${scale}`,
    filter: ['==', ['get', 'is'], 'coast'],
    layout: { visibility: 'none', 'line-join': 'round' },
    paint: { 'line-width': ['interpolate', ['linear'], ['zoom'], 1, 0.6, 6, 1.1] },
  };
}

function emptySource() {
  return { type: 'geojson' as const, data: { type: 'FeatureCollection' as const, features: [] } };
}
