/** The words of the watch line that are the window's own; the sentence itself comes from the host. */
export const watchLineWords = {
  label: 'The watch',
  notYet: 'Reading what was seen of this water …',
  showThem: 'Show them',
  tryAgain: 'Try again',
  failed: (reason: string) => `What was seen of this water could not be read: ${reason}.`,
} as const;
