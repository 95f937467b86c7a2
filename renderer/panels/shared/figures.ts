import { make } from './make.ts';

/** A figure: digits, what joins them (a date, a clock time, degrees and minutes) and the letter of a hemisphere. */
const figurePattern = /\d+(?:[.:-]\d+)*(?:°(?:\d+′)?)?(?:[NSEW]\b)?/g;

/** A figure and its unit stay on one line. */
const unitPattern = /(\d) (?=(?:kt|m\/s|h|min|days|km|NM|dB|UTC)\b|%)/g;
/** So does what counts something and its number. */
const numberedPattern = /\b(Beaufort|row|cell|h|days) (?=\d)/g;

/** Text with its figures set apart, so that they can be set in the face whose digits are all of one width. */
export function splitFigures(text: string): { text: string; isFigure: boolean }[] {
  const pieces: { text: string; isFigure: boolean }[] = [];
  let end = 0;
  for (const match of text.matchAll(figurePattern)) {
    if (match.index > end) pieces.push({ text: text.slice(end, match.index), isFigure: false });
    pieces.push({ text: match[0], isFigure: true });
    end = match.index + match[0].length;
  }
  if (end < text.length) pieces.push({ text: text.slice(end), isFigure: false });
  return pieces;
}

/** Nodes of a text whose figures stand in the mono face. */
export function figures(text: string): Node[] {
  return splitFigures(holdUnits(text)).map((piece) =>
    piece.isFigure ? make('span', { class: 'figure' }, piece.text) : document.createTextNode(piece.text),
  );
}

/** Sets an element's text with its figures in the mono face, touching the page only when the text differs. */
export function setFigures(element: Element, text: string): void {
  if (element.textContent !== holdUnits(text)) element.replaceChildren(...figures(text));
}

function holdUnits(text: string): string {
  return text.replace(unitPattern, '$1\u00a0').replace(numberedPattern, '$1\u00a0');
}

/** A count with its thousands set apart by a narrow space: '68 544'. */
export function formatCount(count: number): string {
  return String(count).replace(/\B(?=(\d{3})+$)/g, '\u202f');
}
