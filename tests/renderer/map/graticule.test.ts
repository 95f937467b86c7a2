import { expect, test } from 'vitest';
import { edgeLabels, formatMeridian, formatParallel, graticuleStep, linesIn } from '../../../renderer/map/graticule.ts';
import { mercatorX, mercatorY } from '../../../renderer/map/mercator.ts';
import { scaleBar } from '../../../renderer/map/scale-bar.ts';
import type { View } from '../../../renderer/map/view.ts';

function viewAt(lon: number, lat: number, zoom: number, bearing = 0): View {
  return { x: mercatorX(lon), y: mercatorY(lat), zoom, bearing, widthPx: 1000, heightPx: 600 };
}

test('draws the lines apart enough to read their names at every zoom', () => {
  for (let zoom = 2; zoom <= 9; zoom += 0.25) {
    const stepPx = (graticuleStep(zoom) * 512 * 2 ** zoom) / 360;
    expect(stepPx).toBeGreaterThanOrEqual(110);
    expect(stepPx).toBeLessThan(300);
  }
});

test('runs on across the date line without a gap', () => {
  expect(linesIn(viewAt(178, 0, 4.5), 5).meridians).toEqual([165, 170, 175, 180, 185, 190]);
});

test('names lines with hemisphere letters, whatever way round they were counted', () => {
  expect([60, -45.5, 185, 180, -180, 0].map(formatMeridian)).toEqual([
    '60°E',
    '45°30′W',
    '175°W',
    '180°',
    '180°',
    '0°',
  ]);
  expect([45, -52.25, 0].map(formatParallel)).toEqual(['45°N', '52°15′S', '0°']);
});

test('names meridians along the top and parallels along the left edge', () => {
  const labels = edgeLabels(viewAt(72, -50, 4), 5);
  const top = labels.filter(({ edge }) => edge === 'top').map(({ text }) => text);
  expect(top).toEqual(['55°E', '60°E', '65°E', '70°E', '75°E', '80°E', '85°E', '90°E']);
  // Ten degrees of latitude about 50 S are some 355 of the 600 pixels.
  expect(labels.filter(({ edge }) => edge === 'left').map(({ text }) => text)).toEqual(['55°S', '50°S', '45°S']);
  expect(labels.find(({ text }) => text === '70°E')?.atPx).toBeCloseTo(500 - (2 * 512 * 16) / 360, 6);
});

test('names parallels along the top once the map is turned on its side', () => {
  const labels = edgeLabels(viewAt(72, -50, 4, 90), 10);
  expect(labels.filter(({ edge }) => edge === 'top').every(({ text }) => text.endsWith('S'))).toBe(true);
  expect(labels.filter(({ edge }) => edge === 'left').every(({ text }) => text.endsWith('E'))).toBe(true);
});

test('measures the scale bar in nautical miles at the centre', () => {
  // One minute of latitude is a nautical mile to within 1 %; on the map's sphere of 6378137 m it is 1855.3 m, and at 60
  // degrees a map twice as large as at the equator.
  const { nauticalMiles, lengthPx } = scaleBar(viewAt(0, 60, 5), 120);
  const pxPerMinute = ((512 * 32) / 360 / 60) * 2;
  expect(nauticalMiles).toBe(50);
  expect(lengthPx).toBeCloseTo((nauticalMiles * pxPerMinute * 1852) / 1855.32, 1);
  expect(lengthPx).toBeLessThanOrEqual(120);
});
