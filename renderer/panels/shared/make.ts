type Value = string | number | boolean | ((event: Event) => void) | undefined;

/** Attributes by name; a function is a listener for the event of its name ('click'); true, false and undefined set or leave out. */
export type Attributes = Record<string, Value>;

/** An HTML element with its attributes and children. Text is always text, never markup. */
export function make<Tag extends keyof HTMLElementTagNameMap>(
  tag: Tag,
  attributes: Attributes = {},
  ...children: readonly (Node | string)[]
): HTMLElementTagNameMap[Tag] {
  const element = document.createElement(tag);
  dress(element, attributes);
  element.append(...children);
  return element;
}

/** An SVG element with its attributes and children. */
export function draw<Tag extends keyof SVGElementTagNameMap>(
  tag: Tag,
  attributes: Attributes = {},
  ...children: readonly (Node | string)[]
): SVGElementTagNameMap[Tag] {
  const element = document.createElementNS('http://www.w3.org/2000/svg', tag);
  dress(element, attributes);
  element.append(...children);
  return element;
}

/** A button of plain words. */
export function button(text: string, onPress: () => void, attributes: Attributes = {}): HTMLButtonElement {
  return make('button', { type: 'button', click: onPress, ...attributes }, text);
}

/** Sets an element's text, touching the page only when it differs. */
export function setText(element: Element, text: string): void {
  if (element.textContent !== text) element.textContent = text;
}

function dress(element: Element, attributes: Attributes): void {
  for (const [name, value] of Object.entries(attributes)) {
    if (typeof value === 'function') element.addEventListener(name, value);
    else if (typeof value === 'boolean') element.toggleAttribute(name, value);
    else if (value !== undefined) element.setAttribute(name, String(value));
  }
}
