import { button, make } from './make.ts';

/** Words of a step that cannot be undone. */
export interface ConfirmWords {
  /** On the button: 'Remove'. */
  ask: string;
  /** Beside the answer: 'Remove this pass from the archive? The file itself stays.' */
  question: string;
  /** The answer that does it: 'Remove it'. */
  doIt: string;
}

/** A button that asks before it does what cannot be undone; the answer stands in its place, and Escape means no. */
export function confirmButton(words: ConfirmWords, onConfirm: () => void): HTMLElement {
  const place = make('span', { class: 'confirm' });
  const ask = button(words.ask, open, { class: 'quiet' });
  const answers = make(
    'span',
    { class: 'confirm-answers', role: 'group', 'aria-label': words.question, keydown: closeOnEscape },
    make('span', {}, words.question),
    button(words.doIt, () => {
      close();
      onConfirm();
    }),
    button('Keep it', close),
  );

  function open(): void {
    place.replaceChildren(answers);
    answers.querySelectorAll('button')[1].focus();
  }
  function close(): void {
    place.replaceChildren(ask);
    ask.focus();
  }
  function closeOnEscape(event: Event): void {
    if ((event as KeyboardEvent).key !== 'Escape') return;
    event.stopPropagation();
    close();
  }

  place.append(ask);
  return place;
}
