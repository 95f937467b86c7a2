import { button, make } from '../shared/make.ts';
import { columnWords as words } from './words.ts';

/**
 * Fills the column beside the chart, `first` above what scrolls, and lets it fold away; the returned function brings it
 * back.
 */
export function fillColumn(column: HTMLElement, first: HTMLElement, parts: readonly HTMLElement[]): () => void {
  const fold = button('', () => setFolded(!document.body.classList.contains('is-column-folded')), {
    class: 'column-fold',
  });
  function setFolded(isFolded: boolean): void {
    document.body.classList.toggle('is-column-folded', isFolded);
    fold.textContent = isFolded ? '›' : '‹';
    fold.title = isFolded ? words.unfold : words.fold;
    fold.setAttribute('aria-label', fold.title);
    fold.setAttribute('aria-expanded', String(!isFolded));
  }
  setFolded(false);
  column.append(make('div', { class: 'column-head' }, first, fold), make('div', { class: 'column-scroll' }, ...parts));
  return () => setFolded(false);
}
