import { make } from './make.ts';

/** One of a few: radio buttons in a row under a label that is read out. */
export interface Choice<Value> {
  element: HTMLElement;
  show(value: Value): void;
}

let choices = 0;

/** A row of radio buttons. `show` sets which is chosen without calling `onChoose`. */
export function createChoice<Value extends string | number>(
  label: string,
  options: readonly { value: Value; text: string }[],
  onChoose: (value: Value) => void,
): Choice<Value> {
  const name = `choice-${++choices}`;
  const inputs = options.map(({ value }) =>
    make('input', { type: 'radio', name, value, change: () => onChoose(value) }),
  );
  const labels = options.map(({ text }, index) => make('label', {}, inputs[index], make('span', {}, text)));
  return {
    element: make('span', { class: 'choice', role: 'radiogroup', 'aria-label': label }, ...labels),
    show(value) {
      options.forEach((option, index) => {
        inputs[index].checked = option.value === value;
      });
    },
  };
}
