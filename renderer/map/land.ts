import type { GeoJSONSource, Map as MapLibreMap } from 'maplibre-gl';
import { coastLines, type Land } from './coast.ts';

/** The scales of the base map's land, coarse to fine: one to 110, 50 and 10 million. */
export const coastScales = ['110m', '50m', '10m'] as const;
export type CoastScale = (typeof coastScales)[number];

/** Zoom from which each scale is wanted. */
const zoomFrom: Record<CoastScale, number> = { '110m': 0, '50m': 2.5, '10m': 5 };

/** The scale wanted at a zoom. */
export function scaleWanted(zoom: number): CoastScale {
  return coastScales.findLast((scale) => zoom >= zoomFrom[scale]) ?? coastScales[0];
}

/**
 * Keeps the land on the map at the scale its zoom wants: a scale is loaded when it is first wanted, and until its tiles
 * stand the one before stays. `failed` hears when a file cannot be read. Returns its stop.
 */
export function keepLand(
  map: MapLibreMap,
  coastlineUrl: (scale: CoastScale) => string,
  failed: (reason: unknown) => void,
): () => void {
  const asked = new Map<CoastScale, 'loading' | 'given'>();
  let shown: CoastScale | null = null;

  function follow(): void {
    const wanted = scaleWanted(map.getZoom());
    if (!asked.has(wanted)) void load(wanted);
    if (wanted === shown || asked.get(wanted) !== 'given') return;
    setVisible(map, wanted, true);
    if (!map.isSourceLoaded(`land-${wanted}`)) return;
    if (shown) setVisible(map, shown, false);
    shown = wanted;
  }

  async function load(scale: CoastScale): Promise<void> {
    asked.set(scale, 'loading');
    try {
      const land = await readLand(coastlineUrl(scale));
      (map.getSource(`land-${scale}`) as GeoJSONSource).setData(landAndCoast(land));
      asked.set(scale, 'given');
      follow();
    } catch (thrown) {
      failed(thrown);
    }
  }

  map.on('zoom', follow);
  map.on('sourcedata', follow);
  follow();
  return () => {
    map.off('zoom', follow);
    map.off('sourcedata', follow);
  };
}

async function readLand(url: string): Promise<Land> {
  const response = await fetch(url);
  if (!response.ok) throw new Error(`the base map ${url} answered ${response.status}`);
  return response.json();
}

function landAndCoast(land: Land): Parameters<GeoJSONSource['setData']>[0] {
  const coast = { type: 'MultiLineString' as const, coordinates: coastLines(land) };
  return {
    type: 'FeatureCollection',
    features: [
      { type: 'Feature', properties: { is: 'land' }, geometry: land },
      { type: 'Feature', properties: { is: 'coast' }, geometry: coast },
    ],
  };
}

function setVisible(map: MapLibreMap, scale: CoastScale, isVisible: boolean): void {
  for (const layer of [`land-${scale}`, `coast-${scale}`]) {
    map.setLayoutProperty(layer, 'visibility', isVisible ? 'visible' : 'none');
  }
}
