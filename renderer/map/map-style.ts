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
  const layers: LayerSpecification[] = [
    { id: 'water', type: 'background' },
    ...coastScales.map(landLayer),
    ...coastScales.map(coastLayer),
    { id: 'graticule', type: 'line', source: 'graticule', paint: { 'line-width': 1, 'line-opacity': 0.13 } },
  ];
  for (const { layer, property, colour } of baseColours(light)) {
    const styled = layers.find(({ id }) => id === layer);
    if (styled) styled.paint = { ...styled.paint, [property]: colour };
  }
  return { version: 8, sources, layers };
}

/** The colours of the base map in a light. */
export function baseColours(light: Light): { layer: string; property: BaseColour; colour: string }[] {
  return [
    { layer: 'water', property: 'background-color', colour: light.unseen },
    { layer: 'graticule', property: 'line-color', colour: light.ink },
    ...coastScales.flatMap((scale) => [
      { layer: `land-${scale}`, property: 'fill-color' as const, colour: light.land },
      { layer: `coast-${scale}`, property: 'line-color' as const, colour: light.coast },
    ]),
  ];
}

type BaseColour = 'background-color' | 'fill-color' | 'line-color';

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
