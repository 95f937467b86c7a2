import { setFigures } from './figures.ts';
import { button, make } from './make.ts';

/** A part of the column that opens and closes; its summary stays readable when it is closed. */
export interface Section {
  element: HTMLElement;
  body: HTMLElement;
  setSummary(text: string): void;
  /** Opens it, brings it into sight and moves the focus to its heading. */
  reveal(): void;
}

let sections = 0;

/** A section of the column with a heading that is its switch. */
export function createSection(title: string, isOpenAtFirst: boolean): Section {
  const bodyId = `section-${++sections}`;
  const summary = make('span', { class: 'section-summary' });
  const body = make('div', { class: 'section-body', id: bodyId });
  const heading = button('', () => setOpen(Boolean(body.hidden)), { class: 'section-switch', 'aria-controls': bodyId });
  heading.append(make('span', { class: 'section-title' }, title), summary);
  const element = make('section', { class: 'section', 'aria-label': title }, make('h2', {}, heading), body);

  function setOpen(isOpen: boolean): void {
    body.hidden = !isOpen;
    heading.setAttribute('aria-expanded', String(isOpen));
  }
  setOpen(isOpenAtFirst);

  return {
    element,
    body,
    setSummary: (text) => setFigures(summary, text),
    reveal() {
      setOpen(true);
      element.scrollIntoView({ block: 'nearest' });
      heading.focus();
    },
  };
}
