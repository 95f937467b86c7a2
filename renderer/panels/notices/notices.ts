import { passToStandAt, setClock, standingAt } from '../../state/clock.ts';
import { isUnderWay } from '../../state/loads.ts';
import { nowOf, type Seen, type SeenStore } from '../../state/seen.ts';
import { figures } from '../shared/figures.ts';
import { button, make } from '../shared/make.ts';
import './notices.css';
import { describeOldPasses, describeOutside, noticeWords as words } from './words.ts';

/** What the notices can set going. */
export interface NoticeActions {
  readAgain(): void;
  loadDemonstration(): void;
}

interface Notice {
  text: string;
  kind: 'plain' | 'danger';
  buttons: readonly { text: string; press: () => void }[];
}

/** What the chart must say about itself, above it: that it is not whole yet, that it is empty or stale, that something failed. */
export function createNotices(seen: SeenStore, actions: NoticeActions): HTMLElement {
  const element = make('div', { class: 'notices', role: 'status' });
  let shown = '';
  function show(): void {
    const notices = listNotices(seen, actions);
    const text = notices.map((notice) => notice.text).join('\n');
    if (text === shown) return;
    shown = text;
    element.replaceChildren(...notices.map(drawNotice));
  }
  seen.listen(
    ['settings', 'systemMs', 'status', 'passes', 'blocksReading', 'isLinked', 'loads', 'trouble', 'wantedPassId'],
    show,
  );
  show();
  return element;
}

function listNotices(seen: SeenStore, actions: NoticeActions): Notice[] {
  const state = seen.get();
  const dismiss = { text: words.dismiss, press: () => seen.change({ trouble: null }) };
  return [
    ...(state.trouble ? [{ text: state.trouble, kind: 'danger' as const, buttons: [dismiss] }] : []),
    ...(state.isLinked ? [] : [{ text: words.lost, kind: 'danger' as const, buttons: [] }]),
    ...noticeOfWinds(state, actions),
    ...noticeOfPasses(seen, actions),
  ];
}

function noticeOfWinds({ blocksReading }: Seen, actions: NoticeActions): Notice[] {
  if (blocksReading.state === 'reading') return [{ text: words.readingWinds, kind: 'plain', buttons: [] }];
  if (blocksReading.state !== 'failed') return [];
  const again = { text: words.tryAgain, press: actions.readAgain };
  return [{ text: words.windsFailed(blocksReading.reason), kind: 'danger', buttons: [again] }];
}

function noticeOfPasses(seen: SeenStore, actions: NoticeActions): Notice[] {
  const state = seen.get();
  if (state.status && state.passes.length === 0 && !state.loads.some(isUnderWay)) {
    const load = { text: words.loadDemonstration, press: actions.loadDemonstration };
    return [{ text: words.empty, kind: 'plain', buttons: state.status.hasDemonstration ? [load] : [] }];
  }
  const offer = passToStandAt(state);
  if (!offer) return [];
  const { pass, isWanted } = offer;
  const stand = {
    text: isWanted ? words.standAtIt : words.standAtNewest,
    press: () => setClock(seen, standingAt(pass)),
  };
  const text = isWanted ? describeOutside(pass, nowOf(state)) : describeOldPasses(pass, nowOf(state));
  const buttons = isWanted
    ? [stand, { text: words.leaveIt, press: () => seen.change({ wantedPassId: null }) }]
    : [stand];
  return [{ text, kind: 'plain', buttons }];
}

function drawNotice({ text, kind, buttons }: Notice): HTMLElement {
  return make(
    'p',
    { class: `notice notice-${kind}` },
    make('span', {}, ...figures(text)),
    ...buttons.map((entry) => button(entry.text, entry.press)),
  );
}
