/** The words of the watch area. */
export const areaWords = {
  title: 'Watch area',
  explain: 'The water that the watch line and the unseen share speak of.',
  choose: 'The watch speaks of',
  view: 'the view',
  draw: 'Draw an area',
  drawing: 'Draw it on the chart; Escape gives up.',
  name: 'Name of the area',
  keep: 'Keep it',
  drop: 'Let it go',
  goTo: 'Go to it',
  remove: { ask: 'Remove', question: 'Remove this area?', doIt: 'Remove it' },
} as const;

/** A first name for a new area: 'Area 3', the lowest number not taken. */
export function suggestName(names: readonly string[]): string {
  let number = 1;
  while (names.includes(`Area ${number}`)) number++;
  return `Area ${number}`;
}
