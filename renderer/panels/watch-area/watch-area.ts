import type { WatchArea } from '../../../src/contract/values.ts';
import { chooseArea, chosenArea } from '../../state/areas.ts';
import type { SeenStore } from '../../state/seen.ts';
import { confirmButton } from '../shared/confirm-button.ts';
import { type Entry, keyedList } from '../shared/keyed-list.ts';
import { button, make, setText } from '../shared/make.ts';
import { createSection, type Section } from '../shared/section.ts';
import { suggestName, areaWords as words } from './words.ts';
import './watch-area.css';

type Ring = [lon: number, lat: number][];

/** What the panel asks of the chart and the archive. */
export interface AreaActions {
  /** Lets the user draw a ring; null when they give up. */
  draw(): Promise<Ring | null>;
  /** Keeps the area; false when it could not be kept, so that the drawing stays. */
  keep(name: string, ring: Ring): Promise<boolean>;
  remove(area: WatchArea): void;
  frame(area: WatchArea): void;
  /** Shows a ring that is not kept yet, or none. */
  preview(area: { ring: Ring; name: string } | null): void;
}

/** The water the watch speaks of: the view, or a named area that the user draws and keeps. */
export function createWatchAreaPanel(seen: SeenStore, actions: AreaActions): Section {
  const section = createSection(words.title, false);
  const view = make('input', { type: 'radio', name: 'watch-area', change: () => chooseArea(seen, null) });
  const list = make('ul', { class: 'areas' });
  const drawing = createDrawing(seen, actions);
  section.body.append(
    make('p', { class: 'soft' }, words.explain),
    make('div', { role: 'radiogroup', 'aria-label': words.choose }, make('label', {}, view, words.view), list),
    drawing,
  );
  const showList = keyedList<WatchArea>(
    list,
    (area) => area.areaId,
    (first) => createAreaEntry(seen, first, actions),
  );

  function show(): void {
    const state = seen.get();
    const chosen = chosenArea(state);
    view.checked = chosen === null;
    showList(state.areas);
    section.setSummary(chosen?.name ?? words.view);
  }
  seen.listen(['areas', 'settings'], show);
  show();
  return section;
}

function createAreaEntry(seen: SeenStore, area: WatchArea, actions: AreaActions): Entry<WatchArea> {
  const input = make('input', { type: 'radio', name: 'watch-area', change: () => chooseArea(seen, area.areaId) });
  const name = make('span');
  const element = make(
    'li',
    {},
    make('label', {}, input, name),
    button(words.goTo, () => actions.frame(area), { class: 'quiet' }),
    confirmButton(words.remove, () => actions.remove(area)),
  );
  return {
    element,
    update(newer) {
      setText(name, newer.name);
      input.checked = seen.get().settings.watchAreaId === newer.areaId;
    },
  };
}

/** Drawing a new area, then naming it. */
function createDrawing(seen: SeenStore, actions: AreaActions): HTMLElement {
  let ring: Ring | null = null;
  const start = button(words.draw, () => void drawRing());
  const hint = make('p', { class: 'area-hint', role: 'status' });
  const name = make('input', { type: 'text', maxlength: 80, pattern: '.*\\S.*', required: true });
  const form = make(
    'form',
    { class: 'area-form', hidden: true, submit: (event) => void keep(event) },
    make('label', { class: 'field' }, make('span', {}, words.name), name),
    make('button', { type: 'submit' }, words.keep),
    button(words.drop, reset, { class: 'quiet' }),
  );

  async function drawRing(): Promise<void> {
    start.disabled = true;
    setText(hint, words.drawing);
    ring = await actions.draw();
    if (!ring) return reset();
    setText(hint, '');
    start.hidden = true;
    form.hidden = false;
    name.value = suggestName(seen.get().areas.map((area) => area.name));
    actions.preview({ ring, name: name.value });
    name.focus();
    name.select();
  }
  async function keep(event: Event): Promise<void> {
    event.preventDefault();
    if (ring && (await actions.keep(name.value.trim(), ring))) reset();
  }
  function reset(): void {
    ring = null;
    setText(hint, '');
    start.hidden = false;
    start.disabled = false;
    form.hidden = true;
    actions.preview(null);
  }
  return make('div', {}, start, hint, form);
}
