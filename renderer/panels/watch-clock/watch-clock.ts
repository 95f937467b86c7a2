import { formatClock } from '../../../src/wind/words.ts';
import { newestPass, offeredWindowHours, setClock, setWindowHours, standingAt, stepToPass } from '../../state/clock.ts';
import { nowOf, type SeenStore } from '../../state/seen.ts';
import { createChoice } from '../shared/choice.ts';
import { setFigures } from '../shared/figures.ts';
import { type Entry, keyedList } from '../shared/keyed-list.ts';
import { button, make, setText } from '../shared/make.ts';
import { createSection, type Section } from '../shared/section.ts';
import { createDial } from './dial.ts';
import { DIAL_HOURS } from './dial-shapes.ts';
import './watch-clock.css';
import { describeHours, describeShare, fromTyped, summariseClock, toTyped, clockWords as words } from './words.ts';

/** When this water was seen: the dial, the watch clock and the time window. */
export function createWatchClock(seen: SeenStore, framePass: (passId: number) => void): Section {
  const section = createSection(words.title, true);
  const dial = createDial({
    setNow: (nowMs) => setClock(seen, nowMs),
    setWindowHours: (hours) => setWindowHours(seen, hours),
    frame: framePass,
  });
  const earlier = button(words.earlier, () => step(-1), { class: 'quiet' });
  const later = button(words.later, () => step(1), { class: 'quiet' });
  const shares = createShares(seen, framePass);
  const now = createNow(seen);
  const reach = createReach(seen);
  section.body.append(
    dial.element,
    make('div', { class: 'clock-steps' }, earlier, later),
    shares.element,
    reach.element,
    now.element,
  );

  function step(direction: -1 | 1): void {
    const moment = stepToPass(seen.get(), direction);
    if (moment !== null) setClock(seen, moment);
  }

  function show(): void {
    const state = seen.get();
    const { windowHours } = state.settings;
    const nowMs = nowOf(state);
    dial.show({ nowMs, windowHours, passes: state.watch?.passes ?? [] });
    earlier.disabled = stepToPass(state, -1) === null;
    later.disabled = stepToPass(state, 1) === null;
    shares.show();
    now.show();
    reach.show();
    section.setSummary(summariseClock(nowMs, windowHours));
  }
  seen.listen(['settings', 'systemMs', 'watch', 'passes'], show);
  show();
  return section;
}

type SeenPass = { passId: number; seenShare: number; startMs: number };

/** What share of this water each pass saw, newest first; each goes to its pass. */
function createShares(seen: SeenStore, framePass: (passId: number) => void) {
  const list = make('ul', { class: 'clock-shares' });
  const note = make('p', { class: 'soft' });
  const showList = keyedList<SeenPass>(
    list,
    (pass) => pass.passId,
    (first): Entry<SeenPass> => {
      const press = button('', () => framePass(first.passId), { class: 'quiet' });
      return {
        element: make('li', {}, press),
        update: (pass) => setFigures(press, `${formatClock(pass.startMs)} saw ${describeShare(pass.seenShare)}`),
      };
    },
  );
  function show(): void {
    const state = seen.get();
    const passes = state.watch?.passes ?? [];
    const offDial = passes.filter((pass) => nowOf(state) - pass.endMs >= DIAL_HOURS * 3_600_000).length;
    showList(passes);
    note.hidden = state.watch === null || (passes.length > 0 && offDial === 0);
    setFigures(note, passes.length === 0 ? words.nobodySaw : words.offDial(offDial));
  }
  return { element: make('div', {}, list, note), show };
}

/** Where 'now' stands: the system's clock, the newest pass, or a moment typed in. */
function createNow(seen: SeenStore) {
  const input = make('input', {
    type: 'text',
    inputmode: 'numeric',
    autocomplete: 'off',
    spellcheck: 'false',
    change: () => {
      const moment = fromTyped(input.value);
      input.setCustomValidity(moment === null ? words.nowWrong : '');
      if (moment === null) input.reportValidity();
      else setClock(seen, moment);
    },
  });
  const state = make('p', { class: 'soft' });
  const system = button(words.system, () => setClock(seen, null));
  const newest = button(words.newest, () => {
    const pass = newestPass(seen.get().passes);
    if (pass) setClock(seen, standingAt(pass));
  });
  function show(): void {
    const { settings, passes } = seen.get();
    const nowMs = nowOf(seen.get());
    if (document.activeElement !== input) input.value = toTyped(nowMs);
    const how = settings.setClockMs === null ? words.followsSystem : words.isSet;
    setText(state, how);
    system.disabled = settings.setClockMs === null;
    newest.disabled = passes.length === 0;
  }
  const label = make('label', { class: 'field' }, make('span', {}, words.nowInput), input);
  const stand = make('p', { class: 'clock-stand' }, `${words.standAt} `, newest, system);
  return { element: make('div', { class: 'clock-now' }, label, state, stand), show };
}

/** How far back the window reaches. */
function createReach(seen: SeenStore) {
  const offered = offeredWindowHours.map((hours) => ({ value: hours as number, text: describeHours(hours) }));
  const choice = createChoice(words.windowChoice, offered, (hours) => setWindowHours(seen, hours));
  const input = make('input', {
    type: 'number',
    min: 0.25,
    max: 24 * 366,
    step: 'any',
    'aria-label': words.windowChoice,
    change: () => setWindowHours(seen, input.valueAsNumber),
  });
  function show(): void {
    const { windowHours } = seen.get().settings;
    choice.show(windowHours);
    if (document.activeElement !== input) input.value = String(windowHours);
  }
  const typed = make('label', { class: 'field' }, make('span', {}, words.windowChoice), input);
  return { element: make('div', { class: 'clock-reach' }, choice.element, typed), show };
}
