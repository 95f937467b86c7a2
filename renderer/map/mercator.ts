/** Web Mercator over 0..1 both ways, y down, as MapLibre counts it: EPSG:3857 scaled to one world. */
export function mercatorX(lon: number): number {
  return lon / 360 + 0.5;
}

/** Web Mercator y, 0 at 85.05 N and 1 at 85.05 S; beyond them it runs on outside 0..1. */
export function mercatorY(lat: number): number {
  return 0.5 - Math.log(Math.tan(Math.PI / 4 + (lat * Math.PI) / 360)) / (2 * Math.PI);
}

/** Degrees east of a Web Mercator x; not wrapped. */
export function lonOfMercator(x: number): number {
  return (x - 0.5) * 360;
}

/** Degrees north of a Web Mercator y. */
export function latOfMercator(y: number): number {
  return (Math.atan(Math.exp((0.5 - y) * 2 * Math.PI)) * 360) / Math.PI - 90;
}
