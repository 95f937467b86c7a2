import type { WatchRun } from '../../../src/contract/values.ts';
import type { Seen, SeenStore } from '../../state/seen.ts';
import { inkOfSpeed } from '../shared/class-ink.ts';
import { setFigures } from '../shared/figures.ts';
import { button, make, setText } from '../shared/make.ts';
import './watch-line.css';
import { watchLineWords as words } from './words.ts';

export type Goal = NonNullable<WatchRun['goesTo']>;

/**
 * The watch line: the sentence across the top. Every run that leads somewhere is a button. It is read out when it has
 * come to rest and says something new.
 */
export function createWatchLine(
  seen: SeenStore,
  actions: { goTo(goal: Goal): void; showEverything(): void; tryAgain(): void },
): HTMLElement {
  const sentence = make('p', { class: 'watch-sentence' });
  const spoken = make('p', { class: 'for-ears', 'aria-live': 'polite' });
  const element = make('section', { class: 'watch-line', 'aria-label': words.label }, sentence, spoken);
  let shown: WatchRun[] = [];

  function show(state: Seen): void {
    const { watch, watchReading } = state;
    element.setAttribute('aria-busy', String(watchReading.state === 'reading'));
    if (watchReading.state === 'failed') {
      sentence.replaceChildren(`${words.failed(watchReading.reason)} `, button(words.tryAgain, actions.tryAgain));
      setText(spoken, words.failed(watchReading.reason));
      return;
    }
    if (!watch) {
      setText(sentence, words.notYet);
      return;
    }
    shown = watch.runs;
    if (watch.strongest) sentence.style.setProperty('--strongest', inkOfSpeed(watch.strongest.speedMs));
    showRuns(watch.runs, watch.hiddenGaleWinds > 0);
    keepHeight(sentence);
    if (watchReading.state === 'read') setText(spoken, watch.runs.map((run) => run.text).join(''));
  }

  /** Keeps elements where the sentence keeps its shape, so that a refresh does not take the focus away. */
  function showRuns(runs: readonly WatchRun[], hasHidden: boolean): void {
    const nodes = runs.map((run, index) => {
      const tag = run.goesTo ? 'BUTTON' : 'SPAN';
      const old = sentence.children[index];
      const node = old?.tagName === tag && !old.classList.contains('show-them') ? (old as HTMLElement) : makeRun(index);
      node.className = `run run-${run.weight}${run.goesTo?.kind === 'hidden winds' ? ' run-hidden' : ''}`;
      setFigures(node, run.text);
      return node;
    });
    const wanted = hasHidden ? [...nodes, showThem] : nodes;
    const isSame =
      wanted.length === sentence.childNodes.length && wanted.every((node, i) => node === sentence.childNodes[i]);
    if (isSame) return;
    const focused = wanted.find((node) => node === document.activeElement);
    sentence.replaceChildren(...wanted);
    focused?.focus();
  }

  function makeRun(index: number): HTMLElement {
    if (!shown[index].goesTo) return make('span');
    return button('', () => {
      const goal = shown[index]?.goesTo;
      if (goal) actions.goTo(goal);
    });
  }

  addEventListener('resize', () => sentence.style.removeProperty('min-height'));
  const showThem = button(words.showThem, actions.showEverything, { class: 'show-them' });
  seen.listen(['watch', 'watchReading'], show);
  show(seen.get());
  return element;
}

/**
 * Lets the sentence grow by a line but not shrink again: a shorter one would make the chart higher, and what comes into
 * view could make it longer, without end.
 */
function keepHeight(sentence: HTMLElement): void {
  sentence.style.minHeight = `${sentence.offsetHeight}px`;
}
