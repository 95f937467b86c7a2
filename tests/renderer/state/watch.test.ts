import { expect, test } from 'vitest';
import { chooseArea } from '../../../renderer/state/areas.ts';
import { createSeen } from '../../../renderer/state/seen.ts';
import { watchQuestion } from '../../../renderer/state/watch.ts';

const box = { west: 170, south: -60, east: -170, north: -40 };
const area = {
  areaId: 4,
  name: 'Strait',
  ring: [
    [0, 0],
    [1, 0],
    [1, 1],
  ] as [number, number][],
};

test('asks nothing before the chart stands', () => {
  expect(watchQuestion(createSeen(0).get())).toBeNull();
});

test('asks of the view until an area is chosen, then of that area', () => {
  const seen = createSeen(0);
  seen.change({ box, areas: [area] });
  expect(watchQuestion(seen.get())?.water).toEqual({ kind: 'view', box });
  chooseArea(seen, 4);
  expect(watchQuestion(seen.get())?.water).toEqual({ kind: 'area', areaId: 4 });
});

test('falls back to the view when the chosen area is gone', () => {
  const seen = createSeen(0);
  seen.change({ box });
  chooseArea(seen, 4);
  expect(watchQuestion(seen.get())?.water).toEqual({ kind: 'view', box });
});
