import type { CellCard } from '../../../src/contract/values.ts';
import { type CellPlace, nowOf, type Seen, type SeenStore } from '../../state/seen.ts';
import { inkOfSpeed } from '../shared/class-ink.ts';
import { figures } from '../shared/figures.ts';
import { button, make, setText } from '../shared/make.ts';
import './cell-card.css';
import { copyText } from './copy-text.ts';
import {
  describeBeam,
  describeNoSolutions,
  describeSolution,
  headOf,
  linesOf,
  cardWords as words,
  writeCard,
} from './words.ts';

/** What can be done from the card. */
export interface CardActions {
  close(): void;
  /** Chooses a neighbour: so many rows and cells further in the same pass. */
  step(from: CellPlace, rows: number, columns: number): void;
}

/** The card of the chosen cell. It closes with Escape, and stands where it does not cover its cell (main sees to that). */
export function createCellCard(seen: SeenStore, actions: CardActions): HTMLElement {
  const body = make('div', { class: 'card-body', 'aria-live': 'polite' });
  const copy = button(words.copy, () => void copyCard(), { class: 'quiet' });
  const foot = make('div', { class: 'card-foot' }, createSteps(seen, actions), copy);
  const close = button('×', actions.close, { class: 'card-close', 'aria-label': words.close, title: words.close });
  const element = make('section', { class: 'card', 'aria-label': words.label, hidden: true }, close, body, foot);

  async function copyCard(): Promise<void> {
    const { card, settings } = seen.get();
    if (card.state !== 'read') return;
    const text = writeCard(card.value, settings.speedUnit, nowOf(seen.get()));
    const outcome = await copyText(text).then(
      () => words.copied,
      () => words.notCopied,
    );
    setText(copy, outcome);
    setTimeout(() => setText(copy, words.copy), 2000);
  }

  function show(state: Seen): void {
    const { card } = state;
    element.hidden = card.state === 'none';
    foot.hidden = card.state === 'reading';
    copy.hidden = card.state !== 'read';
    if (card.state === 'reading') body.replaceChildren(make('p', {}, words.reading));
    if (card.state === 'failed') body.replaceChildren(make('p', {}, words.failed(card.reason)));
    if (card.state === 'read') body.replaceChildren(...drawCard(card.value, state));
  }
  seen.listen(['card', 'settings', 'systemMs'], show);
  show(seen.get());
  return element;
}

function drawCard(card: CellCard, state: Seen): HTMLElement[] {
  const head = headOf(card, state.settings.speedUnit);
  const lines = linesOf(card, nowOf(state)).flatMap(({ name, text }) => [
    make('dt', {}, name),
    make('dd', {}, ...figures(text)),
  ]);
  const figure = make('p', { class: 'card-figure' }, make('span', { class: 'figure' }, head.figure), ` ${head.unit}`);
  figure.hidden = head.figure === '';
  if (card.speedMs !== null) figure.style.setProperty('--class-ink', inkOfSpeed(card.speedMs));
  const title = make(
    'p',
    { class: 'card-title' },
    make('strong', {}, ...figures(head.title)),
    make('br'),
    ...figures(head.detail),
  );
  return [
    make('div', { class: 'card-head' }, figure, title),
    make('dl', {}, ...lines),
    drawSolutions(card),
    ...(card.beams.length > 0 ? [drawBeams(card)] : []),
    drawCautions(card),
  ];
}

function drawSolutions(card: CellCard): HTMLElement {
  const heading = make('h3', {}, words.answers);
  if (card.solutions.length === 0) return make('div', {}, heading, make('p', {}, describeNoSolutions(card)));
  const items = card.solutions.map((solution) =>
    make(
      'li',
      solution.isChosen ? { class: 'is-chosen' } : {},
      ...figures(describeSolution(solution)),
      ...(solution.isChosen ? [make('strong', {}, ' chosen')] : []),
    ),
  );
  return make('div', {}, heading, make('ol', {}, ...items));
}

function drawBeams(card: CellCard): HTMLElement {
  const items = card.beams.map((beam) => make('li', {}, ...figures(describeBeam(beam))));
  return make('details', {}, make('summary', {}, words.looks), make('ol', {}, ...items));
}

function drawCautions(card: CellCard): HTMLElement {
  const items = card.cautions.map((caution) => make('li', {}, ...figures(caution)));
  return make('div', { class: 'card-cautions' }, make('h3', {}, words.cautions), make('ul', {}, ...items));
}

/** Buttons to the four neighbours, for those who cannot point at one. */
function createSteps(seen: SeenStore, actions: CardActions): HTMLElement {
  const step = (text: string, name: string, rows: number, columns: number) =>
    button(
      text,
      () => {
        const { selected } = seen.get();
        if (selected) actions.step(selected, rows, columns);
      },
      { class: 'quiet', 'aria-label': name, title: name },
    );
  const { before, after, left, right } = words.stepNames;
  return make(
    'span',
    { class: 'card-steps', role: 'group', 'aria-label': words.steps },
    step('←', left, 0, -1),
    step('→', right, 0, 1),
    step('↑', after, 1, 0),
    step('↓', before, -1, 0),
  );
}
