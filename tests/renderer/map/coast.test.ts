import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { coastLines, type Land } from '../../../renderer/map/coast.ts';

function land(...rings: [number, number][][]): Land {
  return { type: 'MultiPolygon', coordinates: rings.map((ring) => [ring]) };
}

test('drops the edge along the date line, which is a cut and no coast', () => {
  const ring: [number, number][] = [
    [170, 60],
    [180, 60],
    [180, 65],
    [175, 66],
    [170, 60],
  ];
  expect(coastLines(land(ring))).toEqual([
    [
      [170, 60],
      [180, 60],
    ],
    [
      [180, 65],
      [175, 66],
      [170, 60],
    ],
  ]);
});

test('drops the edges that lead round a pole', () => {
  const ring: [number, number][] = [
    [-180, -84],
    [0, -70],
    [180, -84],
    [180, -90],
    [-180, -90],
    [-180, -84],
  ];
  expect(coastLines(land(ring))).toEqual([
    [
      [-180, -84],
      [0, -70],
      [180, -84],
    ],
  ]);
});

test('keeps an island whole, closed, and one that only touches the date line too', () => {
  const island: [number, number][] = [
    [10, 10],
    [11, 10],
    [11, 11],
    [10, 10],
  ];
  const touching: [number, number][] = [
    [179, 1],
    [180, 2],
    [179, 3],
    [179, 1],
  ];
  expect(coastLines(land(island, touching))).toEqual([island, touching]);
});

test('leaves no line along the date line or a pole in the shipped land', () => {
  for (const scale of ['110m', '50m']) {
    const file = new URL(`../../../assets/coastline/land-${scale}.json`, import.meta.url);
    const lines = coastLines(JSON.parse(readFileSync(file, 'utf8')));
    const edges = lines.flatMap((line) => line.slice(1).map((to, i) => [line[i], to]));
    expect(edges.length).toBeGreaterThan(4000);
    expect(edges.filter(([from, to]) => Math.abs(from[0]) === 180 && from[0] === to[0])).toEqual([]);
    expect(edges.filter(([from, to]) => from[1] < -89.9 && to[1] < -89.9)).toEqual([]);
  }
});
