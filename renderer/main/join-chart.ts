import type { Chart } from '../layers/chart.ts';
import { mercatorX, mercatorY } from '../map/mercator.ts';
import { toScreen } from '../map/view.ts';
import { sideForCard } from '../panels/cell-card/place-card.ts';
import { describeDrawn } from '../panels/notices/words.ts';
import { chosenArea } from '../state/areas.ts';
import { standAtDemonstrationOnceLoaded } from '../state/demonstration.ts';
import { changeSettings, type Seen, type SeenStore, windowOf } from '../state/seen.ts';
import { follow } from '../state/store.ts';

/** A view is kept once the camera rests this long. */
const REST_MS = 150;

/** Draws on the chart what is seen, and sees what the chart shows. `place` is the element the chart and its card stand in. */
export function joinChart(seen: SeenStore, chart: Chart, place: HTMLElement, card: HTMLElement): void {
  chart.setShown(shownOf(seen.get()));
  chart.setWatchArea(chosenArea(seen.get()));
  follow(seen, ['settings', 'systemMs'], shownOf, chart.setShown);
  follow(seen, ['settings', 'areas'], chosenArea, chart.setWatchArea);
  follow(seen, ['settings'], ({ settings }) => settings.light, chart.setLight);
  seen.listen(['blocks'], ({ blocks }) => chart.setBlocks(blocks));
  seen.listen(['selected'], ({ selected }) => chart.setSelected(selected));
  seen.listen(['blocks', 'settings', 'box'], () => describeChart(seen, chart, place));
  standAtDemonstrationOnceLoaded(seen, () => {
    const { camera } = seen.get().settings;
    if (camera) chart.goTo(camera);
  });
  keepCardClear(seen, chart, place, card);
  keepView(seen, chart, place);
}

function shownOf(state: Seen) {
  const { switches, hiddenPassIds } = state.settings;
  return { switches, hiddenPassIds, window: windowOf(state) };
}

/** Keeps the camera in the settings, and the box of the view, each time the chart comes to rest. */
function keepView(seen: SeenStore, chart: Chart, place: HTMLElement): void {
  let resting: ReturnType<typeof setTimeout> | undefined;
  function keep(): void {
    const camera = chart.camera();
    if (JSON.stringify(camera) !== JSON.stringify(seen.get().settings.camera)) changeSettings(seen, { camera });
    seen.change({ box: chart.box() });
  }
  function rest(): void {
    clearTimeout(resting);
    resting = setTimeout(keep, REST_MS);
  }
  chart.onMove(rest);
  new ResizeObserver(rest).observe(place);
}

/** Says in words what the chart draws, for those who cannot see it. */
function describeChart(seen: SeenStore, chart: Chart, place: HTMLElement): void {
  const { barbs, maxSpeedMs } = chart.drawnCounts();
  place.setAttribute('aria-label', describeDrawn(barbs, maxSpeedMs, seen.get().settings.speedUnit));
}

/** Moves the card to where it does not cover its cell. */
function keepCardClear(seen: SeenStore, chart: Chart, place: HTMLElement, card: HTMLElement): void {
  function clear(): void {
    const { selected } = seen.get();
    if (!selected) return;
    const { lon, lat, zoom, bearing } = chart.camera();
    const size = { width: place.clientWidth, height: place.clientHeight };
    const view = { x: mercatorX(lon), y: mercatorY(lat), zoom, bearing, widthPx: size.width, heightPx: size.height };
    const nearLon = lon + ((((selected.lon - lon + 180) % 360) + 360) % 360) - 180;
    const [x, y] = toScreen(view, mercatorX(nearLon), mercatorY(selected.lat));
    card.dataset.side = sideForCard({ x, y }, size, card.offsetWidth);
  }
  chart.onMove(clear);
  seen.listen(['card', 'selected'], clear);
}
