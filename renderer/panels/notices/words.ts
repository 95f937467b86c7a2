import type { PassSummary } from '../../../src/contract/values.ts';
import { formatAge, formatClock, formatDate, formatSpeed } from '../../../src/wind/words.ts';

/** The words of what the chart must say about itself. */
export const noticeWords = {
  lost: 'Crosstrack is not heard: what is shown may be out of date. Trying again.',
  readingWinds: 'Reading winds: blank water says nothing yet.',
  windsFailed: (reason: string) => `The winds of this view could not be read: ${reason}.`,
  tryAgain: 'Try again',
  dismiss: 'Dismiss',
  standAtNewest: 'Stand at the newest pass',
  standAtIt: 'Stand at it',
  leaveIt: 'Leave the clock',
  empty: 'Nothing is loaded. Open swath files, or drop them anywhere in this window.',
  loadDemonstration: 'Load the demonstration (invented data)',
} as const;

/** That no pass lies in the window, and when the newest was: the offer to stand there. */
export function describeOldPasses(newest: Pick<PassSummary, 'endMs'>, nowMs: number): string {
  const moment = `${formatDate(newest.endMs)} ${formatClock(newest.endMs)} UTC`;
  return `No pass lies in the time window. The newest ended ${moment}, ${formatAge(newest.endMs, nowMs)}.`;
}

/** That a pass gone to or just loaded lies outside the window, and when it was: the offer to stand there. */
export function describeOutside(pass: Pick<PassSummary, 'file' | 'endMs'>, nowMs: number): string {
  const moment = `${formatDate(pass.endMs)} ${formatClock(pass.endMs)} UTC`;
  return `${pass.file} is outside the time window and not drawn: it ended ${moment}, ${formatAge(pass.endMs, nowMs)}.`;
}

/** What the chart draws, in words: 'Chart: 312 winds drawn in view, strongest 63 kt'. */
export function describeDrawn(winds: number, strongestMs: number | null, unit: 'knots' | 'metresPerSecond'): string {
  if (winds === 0 || strongestMs === null) return 'Chart: no wind drawn in view';
  return `Chart: ${winds} winds drawn in view, strongest ${formatSpeed(strongestMs, unit)}`;
}
