import { expect, test } from 'vitest';
import { createStore } from '../../../renderer/state/store.ts';

const soon = () => Promise.resolve();

test('tells a listener once of parts that changed together', async () => {
  const store = createStore({ hours: 12, light: 'day', unit: 'knots' });
  const heard: string[] = [];
  store.listen(['hours', 'light'], ({ hours, light }) => heard.push(`${hours} ${light}`));
  store.change({ hours: 6 });
  store.change({ light: 'night' });
  await soon();
  expect(heard).toEqual(['6 night']);
});

test('tells nobody of a part they did not name, nor of the very same value', async () => {
  const store = createStore({ hours: 12, light: 'day' });
  let told = 0;
  store.listen(['hours'], () => told++);
  store.change({ light: 'night' });
  store.change({ hours: 12 });
  await soon();
  expect(told).toBe(0);
});

test('tells a change made by a listener as well', async () => {
  const store = createStore({ passes: 0, summary: '' });
  const heard: string[] = [];
  store.listen(['passes'], ({ passes }) => store.change({ summary: `${passes} passes` }));
  store.listen(['summary'], ({ summary }) => heard.push(summary));
  store.change({ passes: 3 });
  await soon();
  await soon();
  expect(heard).toEqual(['3 passes']);
});

test('is quiet for a listener that stopped', async () => {
  const store = createStore({ hours: 12 });
  let told = 0;
  const stop = store.listen(['hours'], () => told++);
  store.change({ hours: 6 });
  stop();
  await soon();
  expect(told).toBe(0);
});
