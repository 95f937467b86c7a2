import type { CustomLayerInterface, Map as MapLibreMap } from 'maplibre-gl';
import { holdsReach, nearTo, type Reach, reachOf, type View } from '../../map/view.ts';
import type { Light } from '../../state/lights.ts';
import type { Cells } from '../shared/cells.ts';
import { tileFootprints } from './footprint-tiles.ts';
import { createSeenMask, MASK_MARGIN_PX, type SeenMask } from './seen-mask.ts';
import { createWater, type Water } from './water.ts';

export interface SightLayer extends CustomLayerInterface {
  /** Cells and what the chart makes of each (shared/shown). */
  setSight(cells: Cells, kinds: Uint8Array): void;
  setLight(light: Light): void;
}

/** The map's own background, which this layer covers. */
const BACKGROUND_LAYER = 'water';

/** Footprints are laid out for a view grown by so many CSS pixels, so that a short pan lays out nothing. */
const GROWN_PX = 384;

/**
 * The water itself: hatched where nobody looked, stippled where a look gave no wind, clean where a wind was seen. A wind
 * seen by any pass wins over a look without one. Covers the whole view; land is drawn over it.
 */
export function createSightLayer(view: () => View, firstLight: Light): SightLayer {
  let light = firstLight;
  let sight: { cells: Cells; kinds: Uint8Array } | null = null;
  let laidOut: { sight: object; most: number; reach: Reach } | null = null;
  let mask: SeenMask | null = null;
  let water: Water | null = null;
  let onMap: MapLibreMap | null = null;

  /** Until it is known what was seen, the map's plain background says nothing. */
  function coverBackground(): void {
    if (sight) onMap?.setLayoutProperty(BACKGROUND_LAYER, 'visibility', 'none');
  }

  function layOut(now: View): void {
    if (!sight || !mask) return;
    const most = mostPerTile(now.zoom);
    if (laidOut?.sight === sight && laidOut.most === most) {
      const needed = reachOf(nearTo(laidOut.reach, now), MASK_MARGIN_PX);
      if (holdsReach(laidOut.reach, needed)) return;
    }
    laidOut = { sight, most, reach: reachOf(now, GROWN_PX) };
    mask.fill(tileFootprints(sight.cells, sight.kinds, most, laidOut.reach));
  }

  return {
    id: 'sight',
    type: 'custom',
    renderingMode: '2d',
    setSight(cells, kinds) {
      sight = { cells, kinds };
      coverBackground();
    },
    setLight(next) {
      light = next;
    },
    onAdd(map, gl) {
      onMap = map;
      coverBackground();
      mask = createSeenMask(gl);
      water = createWater(gl);
      laidOut = null;
    },
    onRemove() {
      mask?.remove();
      water?.remove();
      mask = null;
      water = null;
      onMap = null;
    },
    prerender() {
      const now = view();
      layOut(now);
      if (laidOut) mask?.draw(nearTo(laidOut.reach, now));
    },
    render() {
      if (!mask || !laidOut) return;
      const now = view();
      water?.draw(now, light, mask.texture, mask.shiftFor(nearTo(laidOut.reach, now)));
    },
  };
}

/**
 * How many neighbours by how many may share a quad: as many as keep the bow of a row (a great circle, L²·tan φ / 8R at
 * latitude φ) within about half a pixel at 75 degrees for cells of 25 km.
 */
function mostPerTile(zoom: number): number {
  if (zoom < 2.2) return 8;
  if (zoom < 4.2) return 4;
  return zoom < 6.2 ? 2 : 1;
}
