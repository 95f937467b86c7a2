import type { PassSummary, WatchReport } from '../../../src/contract/values.ts';
import { formatClock, formatDate } from '../../../src/wind/words.ts';
import { draw, setText } from '../shared/make.ts';
import {
  ageOfPoint,
  angleOfAge,
  DIAL_HOURS,
  labelled,
  pointAt,
  RING_INNER,
  RING_OUTER,
  ringPiece,
  WEDGE_LENGTH,
  type Wedge,
  wedgeOf,
} from './dial-shapes.ts';
import { describeHours, describeShare, clockWords as words } from './words.ts';

const HOUR_MS = 3_600_000;
const DRAG_STEP_MS = 5 * 60_000;
const LABEL_ROOM_DEG = 20;

type SeenPass = WatchReport['passes'][number];

/** What the dial shows. */
export interface DialState {
  nowMs: number;
  windowHours: number;
  passes: readonly SeenPass[];
}

/** What turning and pressing the dial does. */
export interface DialActions {
  setNow(nowMs: number): void;
  setWindowHours(hours: number): void;
  frame(passId: PassSummary['passId']): void;
}

/** The watch dial: twelve hours back from now round a clock face, each pass a wedge as long as the share of this water it saw. */
export function createDial(actions: DialActions): { element: SVGSVGElement; show(state: DialState): void } {
  let state: DialState = { nowMs: 0, windowHours: 12, passes: [] };
  const reach = draw('path', { class: 'dial-reach' });
  const wedges = draw('g', { class: 'dial-wedges' });
  const time = draw('text', { class: 'dial-time', y: 1 });
  const date = draw('text', { class: 'dial-date', y: 19 });
  const knob = draw('g', { class: 'dial-knob', ...handleOf(words.reach) }, draw('circle', { r: 6.5 }));
  const hand = draw(
    'g',
    { class: 'dial-hand', ...handleOf(words.turn) },
    draw('path', { d: 'M -6 -56 h 12 l -6 9 z' }),
  );
  const face = draw('circle', { class: 'dial-face', r: RING_INNER });
  const element = draw(
    'svg',
    { class: 'dial', viewBox: '-137 -114 274 228', role: 'group', 'aria-label': words.dial },
    draw('circle', { class: 'dial-whole', r: RING_OUTER + 2 + WEDGE_LENGTH }),
    face,
    draw('path', { class: 'dial-ring', d: ringPiece(0, 360, RING_INNER, RING_OUTER), 'fill-rule': 'evenodd' }),
    reach,
    ...hourMarks(),
    wedges,
    time,
    date,
    hand,
    knob,
  );

  drag(element, face, () => {
    const startMs = state.nowMs;
    let turnedMs = 0;
    return (age, lastAge) => {
      const step = Math.round(shortWay(age - lastAge) / DRAG_STEP_MS) * DRAG_STEP_MS;
      turnedMs += step;
      if (step !== 0) actions.setNow(Math.round((startMs + turnedMs) / 60_000) * 60_000);
      return lastAge + step;
    };
  });
  drag(element, knob, () => (age) => {
    actions.setWindowHours(Math.max(0.25, Math.round((age / HOUR_MS) * 4) / 4));
    return age;
  });
  onArrows(hand, (steps) => actions.setNow(state.nowMs + steps * 10 * 60_000));
  onArrows(knob, (steps) => actions.setWindowHours(Math.max(0.25, state.windowHours + steps * 0.25)));

  return {
    element,
    show(newer) {
      state = newer;
      const reachDeg = angleOfAge(Math.min(DIAL_HOURS, state.windowHours) * HOUR_MS);
      reach.setAttribute('d', ringPiece(reachDeg, 0, RING_INNER, RING_OUTER));
      const [x, y] = pointAt(reachDeg, (RING_INNER + RING_OUTER) / 2);
      knob.setAttribute('transform', `translate(${x.toFixed(2)} ${y.toFixed(2)})`);
      setValue(knob, state.windowHours, describeHours(state.windowHours));
      setValue(hand, state.nowMs, `${formatDate(state.nowMs)} ${formatClock(state.nowMs)} ${words.utc}`);
      setText(time, formatClock(state.nowMs));
      setText(date, formatDate(state.nowMs));
      wedges.replaceChildren(...drawWedges(state, actions));
    },
  };
}

function drawWedges(state: DialState, actions: DialActions): SVGElement[] {
  const placed = state.passes
    .map((pass) => ({ pass, wedge: wedgeOf(state.nowMs - pass.endMs, state.nowMs - pass.startMs, pass.seenShare) }))
    .filter((entry): entry is { pass: SeenPass; wedge: Wedge } => entry.wedge !== null);
  const hasLabel = labelled(
    placed.map(({ wedge }) => wedge.middleDeg),
    LABEL_ROOM_DEG,
  );
  return placed.map(({ pass, wedge }, index) => {
    const [x, y] = pointAt(wedge.middleDeg, wedge.tipRadius + labelRoom(wedge.middleDeg));
    const clock = formatClock(pass.startMs);
    return draw(
      'g',
      { class: 'dial-wedge', click: () => actions.frame(pass.passId) },
      draw('title', {}, `${clock} ${words.utc}: ${describeShare(pass.seenShare)}`),
      draw('path', { d: wedge.outline }),
      ...(hasLabel[index] ? [draw('text', { class: 'dial-label', x: x.toFixed(1), y: y.toFixed(1) }, clock)] : []),
    );
  });
}

/** How far beyond its wedge a label's middle stands: it is wider than high. */
function labelRoom(angleDeg: number): number {
  return 8 + 11 * Math.abs(Math.sin((angleDeg * Math.PI) / 180));
}

function hourMarks(): SVGElement[] {
  return [...Array(DIAL_HOURS).keys()].map((hour) => {
    const angle = angleOfAge(hour * HOUR_MS);
    if (hour % 3 === 0 && hour > 0) {
      const [x, y] = pointAt(angle, RING_INNER - 15);
      return draw('text', { class: 'dial-hour', x: x.toFixed(1), y: y.toFixed(1) }, `${hour} h`);
    }
    const [x1, y1] = pointAt(angle, RING_INNER - 1);
    const [x2, y2] = pointAt(angle, RING_INNER - 5);
    return draw('line', { class: 'dial-mark', x1, y1, x2, y2 });
  });
}

function handleOf(label: string) {
  return { role: 'spinbutton', tabindex: 0, 'aria-label': label };
}

function setValue(handle: SVGElement, value: number, text: string): void {
  handle.setAttribute('aria-valuenow', String(value));
  handle.setAttribute('aria-valuetext', text);
}

/** Gets the age under the pointer and the last one it kept; returns the one to keep. */
type Move = (ageMs: number, lastAgeMs: number) => number;

/**
 * Follows the pointer from a handle; `begin` is called at each grip and gives what follows its moves. Ages are told about
 * where the dial stood when it was gripped: the watch line above may grow meanwhile and push it down.
 */
function drag(dial: SVGSVGElement, handle: SVGElement, begin: () => Move): void {
  let move: Move = (age) => age;
  let lastAge = 0;
  let middle = { x: 0, y: 0 };
  const ageUnder = (event: PointerEvent) => ageOfPoint(event.clientX - middle.x, event.clientY - middle.y);
  handle.addEventListener('pointerdown', (event) => {
    handle.setPointerCapture(event.pointerId);
    const box = dial.getBoundingClientRect();
    middle = { x: box.left + box.width / 2, y: box.top + box.height / 2 };
    move = begin();
    lastAge = ageUnder(event);
    event.preventDefault();
    handle.focus();
  });
  handle.addEventListener('pointermove', (event) => {
    if (handle.hasPointerCapture(event.pointerId)) lastAge = move(ageUnder(event), lastAge);
  });
}

function onArrows(handle: SVGElement, step: (steps: number) => void): void {
  const steps: Record<string, number> = {
    ArrowLeft: -1,
    ArrowDown: -1,
    ArrowRight: 1,
    ArrowUp: 1,
    PageDown: -6,
    PageUp: 6,
  };
  handle.addEventListener('keydown', (event) => {
    if (!(event.key in steps)) return;
    event.preventDefault();
    step(steps[event.key]);
  });
}

function shortWay(ageMs: number): number {
  const round = DIAL_HOURS * HOUR_MS;
  return ((((ageMs + round / 2) % round) + round) % round) - round / 2;
}
