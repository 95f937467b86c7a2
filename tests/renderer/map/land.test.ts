import { expect, test } from 'vitest';
import { scaleWanted } from '../../../renderer/map/land.ts';

test('wants finer land as the map comes closer', () => {
  expect([0.5, 2.4, 2.5, 4.9, 5, 11].map(scaleWanted)).toEqual(['110m', '110m', '50m', '50m', '10m', '10m']);
});
