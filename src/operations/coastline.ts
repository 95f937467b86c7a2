import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { createLand, type Land } from '../geometry/land.ts';

/** The land of the base map, read when first asked for. */
export interface Coastline {
  /** 1:50 million: shares of sea. */
  coarse(): Land;
  /** 1:10 million: distances to land, and sea in small boxes. */
  fine(): Land;
}

/** The coastline files in a folder (assets/coastline). Throws what reading throws, when first asked. */
export function openCoastline(folder: string): Coastline {
  return { coarse: readOnce(join(folder, 'land-50m.json')), fine: readOnce(join(folder, 'land-10m.json')) };
}

function readOnce(path: string): () => Land {
  let land: Land | undefined;
  return () => {
    land ??= createLand(JSON.parse(readFileSync(path, 'utf8')).coordinates);
    return land;
  };
}
