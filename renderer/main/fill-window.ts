import type { PassSummary, WatchArea } from '../../src/contract/values.ts';
import { showEverything } from '../../src/wind/switches.ts';
import type { Backend } from '../backend/backend.ts';
import type { Chart } from '../layers/chart.ts';
import { worldPx } from '../map/view.ts';
import { createCellCard } from '../panels/cell-card/cell-card.ts';
import { fillColumn } from '../panels/column/column.ts';
import { createDemonstrationBanner } from '../panels/demonstration/demonstration.ts';
import { createFoot } from '../panels/foot/foot.ts';
import { createLegend } from '../panels/legend/legend.ts';
import { takeDroppedFiles } from '../panels/loading/drop-files.ts';
import { createLoadingPanel } from '../panels/loading/loading.ts';
import { createNotices } from '../panels/notices/notices.ts';
import { createPassesPanel } from '../panels/passes/passes.ts';
import type { Section } from '../panels/shared/section.ts';
import { createWatchAreaPanel } from '../panels/watch-area/watch-area.ts';
import { createWatchClock } from '../panels/watch-clock/watch-clock.ts';
import { createWatchLine, type Goal } from '../panels/watch-line/watch-line.ts';
import { createWindsShown } from '../panels/winds-shown/winds-shown.ts';
import { chosenArea, keepArea, removeArea } from '../state/areas.ts';
import { attempt } from '../state/attempt.ts';
import { boxRound } from '../state/boxes.ts';
import { chooseCell } from '../state/cell.ts';
import { setClock, standingAt } from '../state/clock.ts';
import { clearDemonstration } from '../state/demonstration.ts';
import type { Loading } from '../state/loading.ts';
import { findPassBox, removePass, setPassShown } from '../state/passes.ts';
import { changeSettings, type SeenStore } from '../state/seen.ts';
import { readAgain } from './join-backend.ts';

/** Close enough to tell one cell from its neighbours. */
const CELL_ZOOM = 6;

/** About how much of the chart a card takes. */
const CARD_PX = 330;

/** What the page is made of and works with. */
export interface Parts {
  seen: SeenStore;
  backend: Backend;
  loading: Loading;
  chart: Chart;
  head: HTMLElement;
  column: HTMLElement;
  chartPlace: HTMLElement;
  foot: HTMLElement;
}

/** Puts every panel in its place and tells each what it can set going. */
export function fillWindow(parts: Parts): { card: HTMLElement; chooseFiles(): void } {
  const { seen, backend, loading, chart } = parts;
  const sections = {
    clock: createWatchClock(seen, (passId) => framePass(parts, passId)),
    passes: createPasses(parts),
    winds: createWindsShown(seen),
    area: createWatchArea(parts),
  };
  const files = createLoadingPanel(seen, loading, (passId) => framePass(parts, passId));
  const unfold = fillColumn(parts.column, files.open, [
    files.list,
    ...Object.values(sections).map(({ element }) => element),
  ]);
  const line = createWatchLine(seen, {
    goTo: (goal) => goTo(parts, sections, unfold, goal),
    showEverything: () => changeSettings(seen, { switches: showEverything(), hiddenPassIds: [] }),
    tryAgain: () => readAgain(seen, backend),
  });
  const banner = createDemonstrationBanner(
    seen,
    () => void attempt(seen, 'The demonstration could not be cleared', clearDemonstration(seen, backend)),
  );
  const notices = createNotices(seen, {
    readAgain: () => readAgain(seen, backend),
    loadDemonstration: () =>
      void attempt(seen, 'The demonstration could not be loaded', backend.ask('loadDemonstration', {})),
  });
  const card = createCard(parts);
  parts.head.append(banner, line);
  parts.foot.append(createFoot(seen));
  parts.chartPlace.append(createLegend(), notices, card);
  document.body.append(takeDroppedFiles(loading.giveFiles));
  chart.onPick((place) => void chooseCell(seen, backend, place));
  return { card, chooseFiles: files.chooseFiles };
}

function createPasses(parts: Parts): Section {
  const { seen, backend } = parts;
  return createPassesPanel(seen, {
    frame: (pass) => framePass(parts, pass.passId),
    setShown: (passId, isShown) => setPassShown(seen, passId, isShown),
    standAt: (pass) => setClock(seen, standingAt(pass)),
    remove: (pass) => void attempt(seen, 'The pass could not be removed', removePass(seen, backend, pass.passId)),
  });
}

function createWatchArea({ seen, backend, chart }: Parts): Section {
  return createWatchAreaPanel(seen, {
    draw: () => chart.startDrawingArea(),
    keep: (name, ring) => attempt(seen, 'The area could not be kept', keepArea(seen, backend, name, ring)),
    remove: ({ areaId }) => void attempt(seen, 'The area could not be removed', removeArea(seen, backend, areaId)),
    frame: (area) => frameArea(chart, area),
    preview: (drawn) => chart.setWatchArea(drawn ?? chosenArea(seen.get())),
  });
}

function createCard({ seen, backend }: Parts): HTMLElement {
  const close = () => void chooseCell(seen, backend, null);
  addEventListener('keydown', (event) => {
    if (event.key === 'Escape' && !event.defaultPrevented && !document.querySelector('dialog[open]')) close();
  });
  return createCellCard(seen, {
    close,
    step: (from, rows, columns) =>
      void chooseCell(seen, backend, { ...from, row: from.row + rows, column: from.column + columns }),
  });
}

/** Takes the user to what a part of the watch line speaks of. */
function goTo(
  { seen, backend, chart }: Parts,
  sections: { clock: Section; passes: Section; winds: Section; area: Section },
  unfold: () => void,
  goal: Goal,
): void {
  if (goal.kind === 'cell') {
    void chooseCell(seen, backend, goal);
    goToCell(chart, goal);
    return;
  }
  const area = chosenArea(seen.get());
  if (area && goal.kind !== 'passes') frameArea(chart, area);
  unfold();
  const { clock, passes, winds } = sections;
  ({ unseen: clock, 'hidden winds': winds, passes, water: sections.area })[goal.kind].reveal();
}

/** Brings a cell to the middle of the water left of its card. */
function goToCell(chart: Chart, { lon, lat }: { lon: number; lat: number }): void {
  const zoom = Math.max(CELL_ZOOM, chart.camera().zoom);
  const isNorthUp = Math.abs(chart.camera().bearing) < 1;
  const shiftDeg = isNorthUp ? ((CARD_PX / 2) * 360) / worldPx({ zoom }) : 0;
  chart.goTo({ lon: lon + shiftDeg, lat, zoom });
}

function framePass({ seen, backend, chart }: Parts, passId: number): void {
  const pass = seen.get().passes.find((candidate) => candidate.passId === passId);
  seen.change({ wantedPassId: passId });
  if (pass) void attempt(seen, 'The pass could not be shown', frame(backend, chart, pass));
}

/** Goes to all a pass looked at, or to its strongest wind where that is half the earth. */
async function frame(backend: Backend, chart: Chart, pass: PassSummary): Promise<void> {
  const box = await findPassBox(backend, pass);
  if (box) chart.frameBox(box);
  else if (pass.maxLon !== null && pass.maxLat !== null) chart.goTo({ lon: pass.maxLon, lat: pass.maxLat, zoom: 4 });
}

function frameArea(chart: Chart, area: WatchArea): void {
  const box = boxRound(area.ring);
  if (box) chart.frameBox(box);
}
