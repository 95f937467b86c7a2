import type { PassSummary } from '../../../src/contract/values.ts';
import { isInWindow } from '../../state/clock.ts';
import { nowOf, type Seen, windowOf } from '../../state/seen.ts';
import { inkOfSpeed } from '../shared/class-ink.ts';
import { confirmButton } from '../shared/confirm-button.ts';
import { setFigures } from '../shared/figures.ts';
import type { Entry } from '../shared/keyed-list.ts';
import { button, make, setText } from '../shared/make.ts';
import {
  describeAge,
  describeCounts,
  describeRadar,
  describeSpan,
  describeStrongest,
  passWords as words,
} from './words.ts';

/** What can be done with a pass. */
export interface PassActions {
  frame(pass: PassSummary): void;
  setShown(passId: number, isShown: boolean): void;
  standAt(pass: PassSummary): void;
  remove(pass: PassSummary): void;
}

/** One pass of the list. */
export interface ListedPass {
  pass: PassSummary;
  seen: Seen;
}

/** The entry of one pass: when, how long ago, by what radar, what it holds, and what can be done with it. */
export function createPassEntry(first: ListedPass, actions: PassActions): Entry<ListedPass> {
  let { pass } = first;
  const span = make('span', { class: 'pass-span' });
  const age = make('span', { class: 'pass-age' });
  const strongest = make('p', { class: 'pass-strongest' });
  const radar = make('p');
  const counts = make('p');
  const file = make('p', { class: 'pass-file' });
  const outside = make('p', { class: 'pass-outside' }, `${words.outside} `);
  outside.append(button(words.standHere, () => actions.standAt(pass), { class: 'quiet' }));
  const checkbox = make('input', {
    type: 'checkbox',
    change: () => actions.setShown(pass.passId, checkbox.checked),
  });
  const notes = make('ul');
  const choose = button('', () => actions.frame(pass), { class: 'pass-choose', title: words.frame });
  choose.append(span, age);
  const tools = make(
    'div',
    { class: 'pass-tools' },
    make('label', {}, checkbox, words.shown),
    confirmButton(words.remove, () => actions.remove(pass)),
  );
  const howRead = make('details', {}, make('summary', {}, words.howRead), notes);
  const element = make('li', { class: 'pass' }, choose, strongest, radar, counts, file, outside, howRead, tools);

  return {
    element,
    update({ pass: newer, seen }) {
      pass = newer;
      const { hiddenPassIds, speedUnit } = seen.settings;
      const isHidden = hiddenPassIds.includes(pass.passId);
      const isInside = isInWindow(pass, windowOf(seen));
      setFigures(span, describeSpan(pass));
      setFigures(age, describeAge(pass, nowOf(seen)));
      setFigures(strongest, describeStrongest(pass, speedUnit));
      setFigures(radar, describeRadar(pass));
      setFigures(counts, describeCounts(pass));
      setText(file, pass.isDemonstration ? `${pass.file} (${words.demonstration})` : pass.file);
      outside.hidden = isInside;
      checkbox.checked = !isHidden;
      element.classList.toggle('is-hidden', isHidden || !isInside);
      element.style.setProperty('--class-ink', pass.maxSpeedMs === null ? 'var(--rule)' : inkOfSpeed(pass.maxSpeedMs));
      showNotes(notes, pass.notes);
      howRead.hidden = notes.childElementCount === 0;
    },
  };
}

function showNotes(list: HTMLElement, notes: readonly string[]): void {
  if (list.childElementCount === notes.length) return;
  list.replaceChildren(...notes.map((note) => make('li', {}, note)));
}
