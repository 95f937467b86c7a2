/** The words of the demonstration's banner. */
export const demonstrationWords = {
  label: 'demonstration, invented data',
  clear: 'Clear the demonstration',
} as const;
