import { isInWindow } from '../../state/clock.ts';
import { type SeenStore, windowOf } from '../../state/seen.ts';
import { keyedList } from '../shared/keyed-list.ts';
import { make } from '../shared/make.ts';
import { createSection, type Section } from '../shared/section.ts';
import { createPassEntry, type ListedPass, type PassActions } from './pass-entry.ts';
import './passes.css';
import { countPasses, passWords as words } from './words.ts';

/** The list of passes, newest first. */
export function createPassesPanel(seen: SeenStore, actions: PassActions): Section {
  const section = createSection(words.title, true);
  const none = make('p', { class: 'soft' }, words.none);
  const list = make('ul', { class: 'passes' });
  section.body.append(none, list);
  const showList = keyedList<ListedPass>(
    list,
    ({ pass }) => pass.passId,
    (listed) => createPassEntry(listed, actions),
  );

  function show(): void {
    const state = seen.get();
    const passes = [...state.passes].sort((a, b) => b.endMs - a.endMs || b.passId - a.passId);
    const inWindow = passes.filter((pass) => isInWindow(pass, windowOf(state)));
    none.hidden = passes.length > 0;
    showList(passes.map((pass) => ({ pass, seen: state })));
    section.setSummary(countPasses(inWindow.length, state.settings.hiddenPassIds.length, passes.length));
  }
  seen.listen(['passes', 'settings', 'systemMs'], show);
  show();
  return section;
}
