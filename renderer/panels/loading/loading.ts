import type { Loading } from '../../state/loading.ts';
import { isUnderWay, type Load } from '../../state/loads.ts';
import type { SeenStore } from '../../state/seen.ts';
import { type Entry, keyedList } from '../shared/keyed-list.ts';
import { button, make, setText } from '../shared/make.ts';
import './loading.css';
import { describeFate, describeStage, listReasons, loadingWords as words } from './words.ts';

/** The open button and what becomes of each file. */
export interface LoadingPanel {
  open: HTMLElement;
  list: HTMLElement;
  /** Opens the file dialog. */
  chooseFiles(): void;
}

/** Opening files: the button, their progress and fates. `framePass` goes to a pass that was loaded. */
export function createLoadingPanel(
  seen: SeenStore,
  loading: Loading,
  framePass: (passId: number) => void,
): LoadingPanel {
  const input = make('input', {
    type: 'file',
    multiple: true,
    hidden: true,
    change: () => {
      loading.giveFiles([...(input.files ?? [])]);
      input.value = '';
    },
  });
  const chooseFiles = () => input.click();
  const list = make('ul', { class: 'loads', 'aria-label': words.loads, 'aria-live': 'polite' });
  const clear = button(words.clear, loading.forgetEnded, { class: 'quiet' });
  const open = button(words.open, chooseFiles, { class: 'open-files' });
  const showList = keyedList<Load>(
    list,
    (load) => load.loadId,
    (load) => createLoadEntry(load, loading, framePass),
  );

  function show(): void {
    const { loads } = seen.get();
    showList(loads);
    clear.hidden = loads.length === 0 || loads.every(isUnderWay);
  }
  seen.listen(['loads'], show);
  show();
  return { open, list: make('div', { class: 'loading' }, input, list, clear), chooseFiles };
}

function createLoadEntry(first: Load, loading: Loading, framePass: (passId: number) => void): Entry<Load> {
  let load = first;
  let fatesShown = 0;
  const name = make('span', { class: 'load-name' });
  const stage = make('span', { class: 'load-stage' });
  const progress = make('progress', { max: 1, 'aria-label': words.loads });
  const stop = button(words.stop, () => loading.stop(load), { class: 'quiet' });
  const head = make('div', { class: 'load-head' }, name, stage, stop);
  const fates = make('ul');
  const element = make('li', { class: 'load' }, head, progress, fates);
  return {
    element,
    update(newer) {
      load = newer;
      const runs = isUnderWay(load);
      const words = describeStage(load);
      head.hidden = words === '';
      setText(name, load.file);
      setText(stage, words);
      stop.hidden = !runs;
      progress.hidden = !runs || load.stage === 'waiting';
      progress.value = load.share;
      for (const fate of load.fates.slice(fatesShown)) fates.append(drawFate(fate, framePass));
      fatesShown = load.fates.length;
    },
  };
}

function drawFate(fate: Load['fates'][number], framePass: (passId: number) => void): HTMLElement {
  const reasons = listReasons(fate).map((reason) => make('li', {}, reason));
  const element = make('li', { class: fate.fate === 'refused' ? 'fate is-refused' : 'fate' }, describeFate(fate));
  const [passId] = fate.passIds;
  if (passId !== undefined)
    element.append(
      ' ',
      button(words.goTo, () => framePass(passId), { class: 'quiet' }),
    );
  if (reasons.length > 0) element.append(make('ul', {}, ...reasons));
  return element;
}
