// Makes land-110m.json, land-50m.json and land-10m.json from world-atlas (Natural Earth, public domain): polygons cut at the
// date line, as GeoJSON (RFC 7946 section 3.1.9), without the polygons that world-atlas winds around the whole globe.
import { readFileSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { fileURLToPath } from 'node:url';
import { geoArea, geoEquirectangular } from 'd3-geo';
import { geoProject } from 'd3-geo-projection';
import { feature } from 'topojson-client';

const require = createRequire(import.meta.url);
const degrees = geoEquirectangular().scale(180 / Math.PI).translate([0, 0]).reflectY(true).precision(0);

for (const scale of ['110m', '50m', '10m']) {
  const topology = JSON.parse(readFileSync(require.resolve(`world-atlas/land-${scale}.json`), 'utf8'));
  const polygons = feature(topology, topology.objects.land)
    .features.flatMap(({ geometry }) => (geometry.type === 'Polygon' ? [geometry.coordinates] : geometry.coordinates))
    .filter((rings) => geoArea({ type: 'Polygon', coordinates: [rings[0]] }) <= 2 * Math.PI)
    .map((coordinates) => geoProject({ type: 'Polygon', coordinates }, degrees))
    .filter(Boolean)
    .flatMap(({ type, coordinates }) => (type === 'Polygon' ? [coordinates] : coordinates));
  write(`land-${scale}.json`, { type: 'MultiPolygon', coordinates: polygons });
}

// Three decimals of a degree are 110 m, finer than the 1:10 million source is drawn.
function write(name, geometry) {
  const round = (value) => (typeof value === 'number' ? Number(value.toFixed(3)) : value);
  const dropRepeats = (line) =>
    typeof line[0]?.[0] === 'number' ? line.filter((p, i) => i === 0 || p[0] !== line[i - 1][0] || p[1] !== line[i - 1][1]) : line.map(dropRepeats);
  const rounded = JSON.parse(JSON.stringify(geometry), (_, value) => round(value));
  rounded.coordinates = dropRepeats(rounded.coordinates);
  writeFileSync(fileURLToPath(new URL(name, import.meta.url)), `${JSON.stringify(rounded)}\n`);
}
