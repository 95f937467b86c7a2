import { connectBackend } from './backend/backend.ts';
import { createChart } from './layers/chart.ts';
import { fillWindow } from './main/fill-window.ts';
import { joinBackend } from './main/join-backend.ts';
import { joinChart } from './main/join-chart.ts';
import { applyLight } from './panels/shared/apply-light.ts';
import { make } from './panels/shared/make.ts';
import { attempt } from './state/attempt.ts';
import { createLoading } from './state/loading.ts';
import { openWatch } from './state/open-watch.ts';
import { reasonOf } from './state/reasons.ts';
import { createSeen } from './state/seen.ts';
import { follow } from './state/store.ts';

/** Where a first sitting without a demonstration begins: all the seas. */
const FIRST_CAMERA = { lon: 0, lat: 20, zoom: 1.6, bearing: 0 };

const seen = createSeen(Date.now());
const backend = connectBackend(location);
const place = (id: string) => document.getElementById(id) as HTMLElement;

async function start(): Promise<void> {
  const dress = () => applyLight(document.documentElement, seen.get().settings.light);
  follow(seen, ['settings'], ({ settings }) => settings.light, dress);
  dress();
  await openWatch(seen, backend);
  const chartPlace = place('chart-place');
  const container = make('div', { id: 'chart' });
  chartPlace.append(container);
  const chart = createChart(container, {
    light: seen.get().settings.light,
    camera: seen.get().settings.camera ?? FIRST_CAMERA,
    coastlineUrl: (scale) => `coastline/land-${scale}.json`,
    failed: (reason) => void attempt(seen, 'The coastline could not be drawn', Promise.reject(reason)),
  });
  const loading = createLoading(seen, backend);
  const parts = { seen, backend, loading, chart, chartPlace, head: place('head'), column: place('column') };
  const { card, chooseFiles } = fillWindow({ ...parts, foot: place('foot') });
  joinChart(seen, chart, chartPlace, card);
  joinBackend(seen, backend, loading, chooseFiles);
}

start().catch((thrown: unknown) => {
  const text = `Crosstrack cannot start: ${reasonOf(thrown)}.`;
  place('chart-place').replaceChildren(make('p', { class: 'no-start', role: 'alert' }, text));
});
