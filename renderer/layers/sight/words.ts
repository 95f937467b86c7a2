import './words.css';
import { toScreen, type View } from '../../map/view.ts';
import type { Place } from './unseen-places.ts';

/** The words on unseen water, as text over the chart. */
export interface UnseenWords {
  /** Puts the words on these places. */
  place(places: readonly Place[], view: View): void;
  /** Keeps them on their places in another view. */
  follow(view: View): void;
  remove(): void;
}

/** No words yet, in a container. */
export function createUnseenWords(container: HTMLElement): UnseenWords {
  const sheet = document.createElement('div');
  sheet.className = 'unseen-words';
  sheet.ariaHidden = 'true';
  container.append(sheet);
  let placed: { place: Place; words: HTMLElement }[] = [];

  function follow(view: View): void {
    for (const { place, words } of placed) {
      const [xPx, yPx] = toScreen(view, place.x, place.y);
      words.style.transform = `translate(${xPx.toFixed(1)}px, ${yPx.toFixed(1)}px) translate(-50%, -50%)`;
    }
  }

  return {
    place(places, view) {
      placed = places.map((place) => ({ place, words: document.createElement('span') }));
      for (const { words } of placed) words.textContent = 'not looked at';
      sheet.replaceChildren(...placed.map(({ words }) => words));
      follow(view);
    },
    follow,
    remove: () => sheet.remove(),
  };
}
