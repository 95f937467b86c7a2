/** The words of the column beside the chart. */
export const columnWords = { fold: 'Fold the column away', unfold: 'Bring the column back' } as const;
