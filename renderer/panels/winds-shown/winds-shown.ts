import { beaufortNames } from '../../../src/wind/beaufort.ts';
import { doubtKinds } from '../../../src/wind/flags.ts';
import type { Switches } from '../../../src/wind/switches.ts';
import { changeSettings, type SeenStore } from '../../state/seen.ts';
import { barbPicture } from '../shared/barb-picture.ts';
import { setFigures } from '../shared/figures.ts';
import { button, make } from '../shared/make.ts';
import { type MarkName, markPicture } from '../shared/mark-picture.ts';
import { createSection, type Section } from '../shared/section.ts';
import './winds-shown.css';
import {
  classesFrom,
  doubtWords,
  knotsOfClass,
  lowestMsOfClass,
  presets,
  summariseSwitches,
  windWords as words,
} from './words.ts';

/** Which winds are drawn: by Beaufort class and by doubt. */
export function createWindsShown(seen: SeenStore): Section {
  const section = createSection(words.title, true);
  const change = (parts: Partial<Switches>) =>
    changeSettings(seen, { switches: { ...seen.get().settings.switches, ...parts } });
  const classes = createClasses(seen, change);
  const doubts = createDoubts(seen, change);
  const named = presets.map(({ text, lowest }) => button(text, () => change({ beaufortShown: classesFrom(lowest) })));
  section.body.append(make('div', { class: 'presets' }, ...named), classes.element, doubts.element);

  function show(): void {
    const { switches } = seen.get().settings;
    presets.forEach(({ lowest }, index) => {
      const isChosen = classesFrom(lowest).every((isShown, beaufort) => isShown === switches.beaufortShown[beaufort]);
      named[index].setAttribute('aria-pressed', String(isChosen));
    });
    classes.show();
    doubts.show();
    section.setSummary(summariseSwitches(switches));
  }
  seen.listen(['settings'], show);
  show();
  return section;
}

type Change = (parts: Partial<Switches>) => void;

function createClasses(seen: SeenStore, change: Change) {
  const checkboxes = beaufortNames.map((_, beaufort) =>
    make('input', {
      type: 'checkbox',
      'aria-label': words.show(beaufort),
      change: () => {
        const shown = seen.get().settings.switches.beaufortShown;
        change({ beaufortShown: shown.map((isShown, index) => (index === beaufort ? !isShown : isShown)) });
      },
    }),
  );
  const limits = beaufortNames.map(() => make('td'));
  const unit = make('th', { scope: 'col' });
  const rows = beaufortNames.map((name, beaufort) => {
    const label = make('label', {}, checkboxes[beaufort], make('span', { class: 'figure' }, String(beaufort)));
    return make(
      'tr',
      {},
      make('td', {}, label),
      make('td', {}, barbPicture(beaufort)),
      make('th', { scope: 'row' }, name),
      limits[beaufort],
    );
  });
  const head = make(
    'tr',
    {},
    make('th', { scope: 'col' }, make('span', { class: 'for-ears' }, words.columns.show)),
    make('td'),
    make('th', { scope: 'col' }, make('span', { class: 'for-ears' }, words.columns.name)),
    unit,
  );
  const element = make(
    'table',
    { class: 'classes' },
    make('caption', {}, words.classes),
    make('thead', {}, head),
    make('tbody', {}, ...rows),
  );

  function show(): void {
    const { switches, speedUnit } = seen.get().settings;
    const isKnots = speedUnit === 'knots';
    unit.textContent = isKnots ? words.columns.knots : words.columns.metresPerSecond;
    switches.beaufortShown.forEach((isShown, beaufort) => {
      checkboxes[beaufort].checked = isShown;
      setFigures(limits[beaufort], isKnots ? knotsOfClass(beaufort) : `from ${lowestMsOfClass(beaufort)}`);
    });
  }
  return { element: make('div', {}, element, make('p', { class: 'soft' }, words.rule)), show };
}

const markOfDoubt: Record<(typeof doubtKinds)[number], MarkName> = {
  rain: 'rain',
  land: 'land',
  ice: 'ice',
  quality: 'quality',
};

function createDoubts(seen: SeenStore, change: Change) {
  const checkboxes = doubtKinds.map((kind) =>
    make('input', {
      type: 'checkbox',
      change: () => {
        const { doubtShown } = seen.get().settings.switches;
        change({ doubtShown: { ...doubtShown, [kind]: !doubtShown[kind] } });
      },
    }),
  );
  const labels = doubtKinds.map((kind, index) =>
    make('label', { class: 'doubt' }, checkboxes[index], markPicture(markOfDoubt[kind]), doubtWords[kind]),
  );
  const element = make(
    'fieldset',
    { class: 'doubts' },
    make('legend', {}, words.doubts),
    ...labels,
    make('p', { class: 'soft' }, words.doubtNote),
  );
  return {
    element,
    show() {
      const { doubtShown } = seen.get().settings.switches;
      doubtKinds.forEach((kind, index) => {
        checkboxes[index].checked = doubtShown[kind];
      });
    },
  };
}
