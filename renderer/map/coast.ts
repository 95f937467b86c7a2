/** Land as the base map's files hold it: polygons cut at the date line (RFC 7946 section 3.1.9). */
export interface Land {
  type: 'MultiPolygon';
  coordinates: [lon: number, lat: number][][][];
}

/**
 * Coast lines of land: the edges of its rings but for those that run along the cut at 180 degrees or along the edge of
 * the map at a pole, which are no coast. Rings that lose no edge come out closed.
 */
export function coastLines(land: Land): [lon: number, lat: number][][] {
  return land.coordinates.flatMap((rings) => rings.flatMap(splitRing));
}

function splitRing(ring: [number, number][]): [number, number][][] {
  const lines: [number, number][][] = [];
  let line: [number, number][] = [];
  for (let i = 1; i < ring.length; i++) {
    if (isCutEdge(ring[i - 1], ring[i])) {
      if (line.length > 1) lines.push(line);
      line = [];
      continue;
    }
    if (line.length === 0) line.push(ring[i - 1]);
    line.push(ring[i]);
  }
  if (line.length > 1) lines.push(line);
  return lines;
}

function isCutEdge(from: [number, number], to: [number, number]): boolean {
  const isOnDateLine = Math.abs(from[0]) === 180 && to[0] === from[0];
  const isOnPole = Math.abs(from[1]) >= POLE_EDGE && Math.abs(to[1]) >= POLE_EDGE;
  return isOnDateLine || isOnPole;
}

/** The cut polygons reach the pole itself; the last thousandth is rounding. */
const POLE_EDGE = 89.999;
