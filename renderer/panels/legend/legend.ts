import { barbPicture } from '../shared/barb-picture.ts';
import { figures } from '../shared/figures.ts';
import { button, make } from '../shared/make.ts';
import { markPicture } from '../shared/mark-picture.ts';
import './legend.css';
import { inks, marks, legendWords as words } from './words.ts';

/** What the inks and marks of the chart say; it folds away to a button, as which it begins in a small window. */
export function createLegend(): HTMLElement {
  const inkList = inks.map(({ beaufort, text }) =>
    make('li', {}, barbPicture(beaufort), make('span', {}, ...figures(text))),
  );
  const markList = marks.map(({ mark, text }) => make('li', {}, markPicture(mark), text));
  const fold = button('', () => setOpen(Boolean(body.hidden)), {
    class: 'quiet legend-fold',
    'aria-controls': 'legend-body',
  });
  const body = make(
    'div',
    { id: 'legend-body' },
    make(
      'ul',
      { class: 'legend-inks', 'aria-label': words.title },
      make('li', {}, markPicture('calm'), words.calm),
      ...inkList,
    ),
    make('ul', { class: 'legend-marks', 'aria-label': words.marks }, ...markList),
  );
  const title = make('strong', {}, words.title);
  const element = make(
    'section',
    { class: 'legend', 'aria-label': words.open },
    make('div', { class: 'legend-head' }, title, fold),
    body,
  );

  function setOpen(isOpen: boolean): void {
    body.hidden = !isOpen;
    title.hidden = !isOpen;
    fold.textContent = isOpen ? words.close : words.open;
    fold.setAttribute('aria-expanded', String(isOpen));
  }
  setOpen(!matchMedia('(width < 64rem) or (height < 44rem)').matches);
  return element;
}
