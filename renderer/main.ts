import type { PassSummary, WatchArea } from '../src/contract/values.ts';
import { showEverything } from '../src/wind/switches.ts';
import { connectBackend } from './backend/backend.ts';
import { type Chart, createChart } from './layers/chart.ts';
import { mercatorX, mercatorY } from './map/mercator.ts';
import { toScreen } from './map/view.ts';
import { createCellCard } from './panels/cell-card/cell-card.ts';
import { sideForCard } from './panels/cell-card/place-card.ts';
import { fillColumn } from './panels/column/column.ts';
import { createDemonstrationBanner } from './panels/demonstration/demonstration.ts';
import { createFoot } from './panels/foot/foot.ts';
import { createLegend } from './panels/legend/legend.ts';
import { takeDroppedFiles } from './panels/loading/drop-files.ts';
import { createLoadingPanel } from './panels/loading/loading.ts';
import { createNotices } from './panels/notices/notices.ts';
import { createPassesPanel } from './panels/passes/passes.ts';
import { applyLight } from './panels/shared/apply-light.ts';
import { make } from './panels/shared/make.ts';
import { createWatchAreaPanel } from './panels/watch-area/watch-area.ts';
import { createWatchClock } from './panels/watch-clock/watch-clock.ts';
import { createWatchLine, type Goal } from './panels/watch-line/watch-line.ts';
import { createWindsShown } from './panels/winds-shown/winds-shown.ts';
import { chosenArea, keepArea, readAreas, removeArea } from './state/areas.ts';
import { keepBlocksFresh } from './state/blocks.ts';
import { boxRound } from './state/boxes.ts';
import { chooseCell } from './state/cell.ts';
import { runSystemClock, setClock, standingAt } from './state/clock.ts';
import { clearDemonstration, standAtDemonstrationOnceLoaded } from './state/demonstration.ts';
import { keepSettings } from './state/keep-settings.ts';
import { createLoading } from './state/loading.ts';
import { openWatch } from './state/open-watch.ts';
import { findPassBox, readPasses, removePass, setPassShown } from './state/passes.ts';
import { reasonOf } from './state/reasons.ts';
import { type CellPlace, changeSettings, createSeen, nowOf, type Seen, windowOf } from './state/seen.ts';
import { keepWatchFresh } from './state/watch.ts';

/** Where a first sitting without a demonstration begins: all the seas. */
const FIRST_CAMERA = { lon: 0, lat: 20, zoom: 1.6, bearing: 0 };
/** Close enough to tell one cell from its neighbours. */
const CELL_ZOOM = 6;
/** A camera is kept once it rests this long. */
const CAMERA_REST_MS = 150;

const backend = connectBackend(location);
const seen = createSeen(Date.now());
const loading = createLoading(seen, backend);
const place = (id: string) => document.getElementById(id) as HTMLElement;
const chartPlace = place('chart-place');

/** Tells the user when something could not be done; whether it could. */
async function attempt(what: string, work: Promise<unknown>): Promise<boolean> {
  try {
    await work;
    return true;
  } catch (thrown) {
    seen.change({ trouble: `${what}: ${reasonOf(thrown)}.` });
    return false;
  }
}

async function start(): Promise<void> {
  seen.listen(['settings'], ({ settings }) => applyLight(document.documentElement, settings.light));
  applyLight(document.documentElement, seen.get().settings.light);
  try {
    await openWatch(seen, backend);
  } catch (thrown) {
    chartPlace.replaceChildren(
      make('p', { class: 'no-start', role: 'alert' }, `Crosstrack cannot start: ${reasonOf(thrown)}.`),
    );
    return;
  }
  const { settings } = seen.get();
  const container = make('div', { id: 'chart' });
  chartPlace.append(container);
  const chart = createChart(container, {
    light: settings.light,
    camera: settings.camera ?? FIRST_CAMERA,
    coastlineUrl: (scale) => `coastline/land-${scale}.json`,
    failed: (reason) => void attempt('The coastline could not be drawn', Promise.reject(reason)),
  });
  fillWindow(chart);
  joinChart(chart);
  joinBackend();
}

function fillWindow(chart: Chart): void {
  const choose = (place: CellPlace | null) => void chooseCell(seen, backend, place);
  const passOf = (passId: number) => seen.get().passes.find((pass) => pass.passId === passId);
  const framePass = (passId: number) => {
    const pass = passOf(passId);
    if (pass) void attempt('The pass could not be shown', frame(chart, pass));
  };
  const frameArea = (area: WatchArea) => {
    const box = boxRound(area.ring);
    if (box) chart.frameBox(box);
  };

  const passes = createPassesPanel(seen, {
    frame: (pass) => framePass(pass.passId),
    setShown: (passId, isShown) => setPassShown(seen, passId, isShown),
    standAt: (pass) => setClock(seen, standingAt(pass)),
    remove: (pass) => void attempt('The pass could not be removed', removePass(seen, backend, pass.passId)),
  });
  const clock = createWatchClock(seen, framePass);
  const winds = createWindsShown(seen);
  const area = createWatchAreaPanel(seen, {
    draw: () => chart.startDrawingArea(),
    keep: (name, ring) => attempt('The area could not be kept', keepArea(seen, backend, name, ring)),
    remove: (removed) => void attempt('The area could not be removed', removeArea(seen, backend, removed.areaId)),
    frame: frameArea,
    preview: (drawn) => chart.setWatchArea(drawn ?? chosenArea(seen.get())),
  });
  const files = createLoadingPanel(seen, loading, framePass);
  const unfold = fillColumn(place('column'), [
    files.element,
    clock.element,
    passes.element,
    winds.element,
    area.element,
  ]);

  function goTo(goal: Goal): void {
    if (goal.kind === 'cell') {
      chart.goTo({ lon: goal.lon, lat: goal.lat, zoom: Math.max(CELL_ZOOM, chart.camera().zoom) });
      choose(goal);
      return;
    }
    unfold();
    const chosen = chosenArea(seen.get());
    if (chosen && goal.kind !== 'passes') frameArea(chosen);
    ({ unseen: clock, 'hidden winds': winds, passes, water: area })[goal.kind].reveal();
  }

  const line = createWatchLine(seen, {
    goTo,
    showEverything: () => changeSettings(seen, { switches: showEverything(), hiddenPassIds: [] }),
    tryAgain: readAgain,
  });
  const banner = createDemonstrationBanner(
    seen,
    () => void attempt('The demonstration could not be cleared', clearDemonstration(seen, backend)),
  );
  const card = createCellCard(seen, {
    close: () => choose(null),
    step: (from, rows, columns) => choose({ ...from, row: from.row + rows, column: from.column + columns }),
    copy: (text) => navigator.clipboard.writeText(text),
  });
  const notices = createNotices(seen, {
    readAgain,
    loadDemonstration: () =>
      void attempt('The demonstration could not be loaded', backend.ask('loadDemonstration', {})),
  });
  place('head').append(banner, line);
  place('foot').append(createFoot(seen));
  chartPlace.append(createLegend(), notices, card);
  document.body.append(takeDroppedFiles(loading.giveFiles));
  addEventListener('keydown', (event) => {
    if (event.key === 'Escape' && !event.defaultPrevented && !document.querySelector('dialog[open]')) choose(null);
  });
  const keepCardClear = () => placeCard(card, chart);
  chart.onMove(keepCardClear);
  seen.listen(['card', 'selected'], keepCardClear);
  chart.onPick(choose);
}

/** Goes to all a pass looked at, or to its strongest wind where that is half the earth. */
async function frame(chart: Chart, pass: PassSummary): Promise<void> {
  const box = await findPassBox(backend, pass);
  if (box) chart.frameBox(box);
  else if (pass.maxLon !== null && pass.maxLat !== null) chart.goTo({ lon: pass.maxLon, lat: pass.maxLat, zoom: 4 });
}

function placeCard(card: HTMLElement, chart: Chart): void {
  const { selected } = seen.get();
  if (!selected) return;
  const { lon, lat, zoom, bearing } = chart.camera();
  const size = { width: chartPlace.clientWidth, height: chartPlace.clientHeight };
  const view = { x: mercatorX(lon), y: mercatorY(lat), zoom, bearing, widthPx: size.width, heightPx: size.height };
  const east = ((selected.lon - lon + 540) % 360) - 180;
  const [x, y] = toScreen(view, mercatorX(lon + east), mercatorY(selected.lat));
  card.dataset.side = sideForCard({ x, y }, size, card.offsetWidth);
}

/** Draws on the chart what is seen, and sees what the chart shows. */
function joinChart(chart: Chart): void {
  const drawShown = (state: Seen) =>
    chart.setShown({
      switches: state.settings.switches,
      hiddenPassIds: state.settings.hiddenPassIds,
      window: windowOf(state),
      nowMs: nowOf(state),
    });
  const drawArea = (state: Seen) => chart.setWatchArea(chosenArea(state));
  seen.listen(['settings', 'systemMs'], drawShown);
  seen.listen(['settings', 'areas'], drawArea);
  seen.listen(['settings'], ({ settings }) => chart.setLight(settings.light));
  seen.listen(['blocks'], ({ blocks }) => chart.setBlocks(blocks));
  seen.listen(['selected'], ({ selected }) => chart.setSelected(selected));
  standAtDemonstrationOnceLoaded(seen, () => {
    const { camera } = seen.get().settings;
    if (camera) chart.goTo(camera);
  });
  drawShown(seen.get());
  drawArea(seen.get());

  let resting: ReturnType<typeof setTimeout> | undefined;
  const rest = () => {
    clearTimeout(resting);
    resting = setTimeout(() => keepView(chart), CAMERA_REST_MS);
  };
  chart.onMove(rest);
  new ResizeObserver(rest).observe(chartPlace);
}

function keepView(chart: Chart): void {
  const camera = chart.camera();
  if (JSON.stringify(camera) !== JSON.stringify(seen.get().settings.camera)) changeSettings(seen, { camera });
  seen.change({ box: chart.box() });
}

/** Keeps what is seen true to the host, and the settings kept in it. */
function joinBackend(): void {
  keepBlocksFresh(seen, backend);
  keepWatchFresh(seen, backend);
  runSystemClock(seen, Date.now);
  const keeping = keepSettings(seen, backend, (reason) => {
    seen.change({ trouble: `The settings could not be kept: ${reason}.` });
  });
  addEventListener('pagehide', keeping.flush);
  backend.listenToNews({
    hear(line) {
      if (line.kind === 'passes changed') void attempt('The passes could not be read', readPasses(seen, backend));
      if (line.kind === 'areas changed') void attempt('The areas could not be read', readAreas(seen, backend));
      if (line.kind === 'asked by the desktop') obey(line.what);
      loading.hear(line);
    },
    linkChanged(isLinked) {
      if (isLinked && !seen.get().isLinked) readAgain();
      seen.change({ isLinked });
    },
  });
}

/** What the host's menu asks for. */
function obey(what: 'choose files' | 'day' | 'dusk' | 'night' | 'print'): void {
  if (what === 'print') print();
  else if (what === 'choose files') document.querySelector<HTMLButtonElement>('.open-files')?.click();
  else changeSettings(seen, { light: what });
}

/** Reads the passes and areas again; blocks and watch follow them. */
function readAgain(): void {
  void attempt('The passes could not be read', readPasses(seen, backend));
  void attempt('The areas could not be read', readAreas(seen, backend));
}

void start();
