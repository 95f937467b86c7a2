/** A position in degrees: lon, then lat. */
export type Position = [lon: number, lat: number];

/** A ring with longitudes that run on without a jump, the short way from each position to the next, so that it draws as one. */
export function unwrapRing(ring: readonly Position[]): Position[] {
  const unwrapped: Position[] = [];
  for (const [lon, lat] of ring) {
    const before = unwrapped.at(-1)?.[0] ?? lon;
    unwrapped.push([lon - Math.round((lon - before) / 360) * 360, lat]);
  }
  return unwrapped;
}

/** Longitudes brought into -180 <= lon < 180 and rounded to 1e-5 degrees, about a metre. */
export function wrapRing(ring: readonly Position[]): Position[] {
  return ring.map(([lon, lat]) => [round(((((lon + 180) % 360) + 360) % 360) - 180), round(lat)]);
}

function round(degrees: number): number {
  return Math.round(degrees * 1e5) / 1e5;
}
