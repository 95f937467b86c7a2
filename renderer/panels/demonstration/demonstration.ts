import type { SeenStore } from '../../state/seen.ts';
import { button, make, setText } from '../shared/make.ts';
import './demonstration.css';
import { demonstrationWords as words } from './words.ts';

/** The banner that stands as long as invented data is loaded, and the one button that clears it. */
export function createDemonstrationBanner(seen: SeenStore, onClear: () => void): HTMLElement {
  const title = make('span', { class: 'demonstration-title' });
  const element = make(
    'section',
    { class: 'demonstration', 'aria-label': words.label, hidden: true },
    make('strong', {}, words.label),
    title,
    button(words.clear, onClear),
  );
  function show(): void {
    const demonstration = seen.get().status?.demonstration ?? null;
    element.hidden = !demonstration;
    setText(title, demonstration?.title ?? '');
  }
  seen.listen(['status'], show);
  show();
  return element;
}
