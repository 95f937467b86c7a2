/** One entry on the page: its element, and how it takes on a newer item. */
export interface Entry<Item> {
  element: HTMLElement;
  update(item: Item): void;
}

/**
 * Keeps a parent's children in step with a list: an item that stays keeps its element, and with it focus and open parts.
 * Returns the function that shows a newer list.
 */
export function keyedList<Item>(
  parent: HTMLElement,
  keyOf: (item: Item) => string | number,
  create: (item: Item) => Entry<Item>,
): (items: readonly Item[]) => void {
  const entries = new Map<string | number, Entry<Item>>();
  return (items) => {
    const keys = new Set(items.map(keyOf));
    for (const [key, entry] of entries) {
      if (keys.has(key)) continue;
      entry.element.remove();
      entries.delete(key);
    }
    items.forEach((item, index) => {
      const key = keyOf(item);
      const entry = entries.get(key) ?? create(item);
      entries.set(key, entry);
      entry.update(item);
      if (parent.children[index] !== entry.element) parent.insertBefore(entry.element, parent.children[index] ?? null);
    });
  };
}
