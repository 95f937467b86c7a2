import { standingCautions } from '../../../src/wind/cautions.ts';
import { changeSettings, type SeenStore } from '../../state/seen.ts';
import { createChoice } from '../shared/choice.ts';
import { figures } from '../shared/figures.ts';
import { button, make, setText } from '../shared/make.ts';
import './foot.css';
import { footWords as words } from './words.ts';

/** The foot of the window: the cautions that always stand, the light, the unit, and what this program is. */
export function createFoot(seen: SeenStore): HTMLElement {
  const cautions = createSheet(
    words.cautions,
    make('ul', {}, ...standingCautions.map((caution) => make('li', {}, ...figures(caution)))),
  );
  const about = createAbout(seen);
  const light = createChoice(
    words.light,
    (['day', 'dusk', 'night'] as const).map((value) => ({ value, text: words.lights[value] })),
    (value) => changeSettings(seen, { light: value }),
  );
  const unit = createChoice(
    words.unit,
    (['knots', 'metresPerSecond'] as const).map((value) => ({ value, text: words.units[value] })),
    (value) => changeSettings(seen, { speedUnit: value }),
  );
  function show(): void {
    const { settings } = seen.get();
    light.show(settings.light);
    unit.show(settings.speedUnit);
  }
  seen.listen(['settings'], show);
  show();
  return make(
    'div',
    { class: 'foot' },
    make('p', { class: 'foot-cautions' }, words.short),
    button(words.all, () => cautions.showModal(), { class: 'quiet' }),
    unit.element,
    light.element,
    button(words.about, () => about.showModal(), { class: 'quiet' }),
    cautions,
    about,
  );
}

function createAbout(seen: SeenStore): HTMLDialogElement {
  const version = make('dd');
  const archive = make('dd');
  const licences = words.licences.map((licence) => make('dd', {}, licence));
  seen.listen(['status'], ({ status }) => {
    setText(version, status?.appVersion ?? '');
    setText(archive, status?.archivePath ?? '');
  });
  return createSheet(
    words.aboutTitle,
    make('p', {}, words.purpose),
    make(
      'dl',
      {},
      make('dt', {}, words.version),
      version,
      make('dt', {}, words.archive),
      archive,
      make('dt', {}, words.licence),
      ...licences,
    ),
  );
}

/** A sheet over the window; it closes with Escape, its button, or a press beside it. */
function createSheet(title: string, ...content: HTMLElement[]): HTMLDialogElement {
  const sheet: HTMLDialogElement = make(
    'dialog',
    { class: 'sheet', 'aria-label': title, click: (event) => event.target === sheet && sheet.close() },
    make(
      'div',
      { class: 'sheet-body' },
      make('h2', {}, title),
      ...content,
      button(words.close, () => sheet.close()),
    ),
  );
  return sheet;
}
