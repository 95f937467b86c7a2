import type { PassSummary } from '../../../src/contract/values.ts';
import { beaufortNames, beaufortOfSpeed } from '../../../src/wind/beaufort.ts';
import { formatAge, formatClock, formatDate, formatSpeed } from '../../../src/wind/words.ts';
import { formatCount } from '../shared/figures.ts';

/** The words of the list of passes. */
export const passWords = {
  title: 'Passes',
  none: 'No pass is loaded. Open a swath file, or drop one anywhere in this window.',
  shown: 'on the chart',
  frame: 'Go to it',
  outside: 'outside the time window',
  standHere: 'Stand here',
  remove: { ask: 'Remove', question: 'Remove this pass from the archive? The file itself stays.', doIt: 'Remove it' },
  howRead: 'How it was read',
  demonstration: 'invented',
} as const;

/** How many passes there are, in the window and hidden: '3 in the window, 1 hidden, 5 in all'. */
export function countPasses(inWindow: number, hidden: number, all: number): string {
  if (all === 0) return 'none';
  const parts = [`${inWindow} in the window`];
  if (hidden > 0) parts.push(`${hidden} hidden`);
  if (all > inWindow) parts.push(`${all} in all`);
  return parts.join(', ');
}

/** When a pass was made, as dates sort: '2031-01-17 23:40 to 23:52 UTC'; the second date only where it differs. */
export function describeSpan(pass: Pick<PassSummary, 'startMs' | 'endMs'>): string {
  const [startDate, endDate] = [formatDate(pass.startMs), formatDate(pass.endMs)];
  const end = startDate === endDate ? formatClock(pass.endMs) : `${endDate} ${formatClock(pass.endMs)}`;
  return `${startDate} ${formatClock(pass.startMs)} to ${end} UTC`;
}

/** How long ago a pass ended. */
export function describeAge(pass: Pick<PassSummary, 'endMs'>, nowMs: number): string {
  return formatAge(pass.endMs, nowMs);
}

/** Band and viewing in neutral words: 'C band, fan-beam'; says so where the file does not tell. */
export function describeRadar(pass: Pick<PassSummary, 'band' | 'viewing' | 'cellSizeM'>): string {
  const radar = [pass.band ? `${pass.band} band` : 'band not stated', pass.viewing ?? 'viewing not stated'];
  if (pass.cellSizeM !== null) radar.push(`cells of ${Number((pass.cellSizeM / 1000).toFixed(1))} km`);
  return radar.join(', ');
}

/** The strongest wind of a pass: 'strongest 54 kt, storm'. */
export function describeStrongest(pass: Pick<PassSummary, 'maxSpeedMs'>, unit: 'knots' | 'metresPerSecond'): string {
  if (pass.maxSpeedMs === null) return 'no wind in it';
  return `strongest ${formatSpeed(pass.maxSpeedMs, unit)}, ${beaufortNames[beaufortOfSpeed(pass.maxSpeedMs)]}`;
}

/** What a pass holds: '7 872 cells, 7 100 winds, 45 of gale or more'. */
export function describeCounts(pass: Pick<PassSummary, 'cells' | 'winds' | 'galeWinds'>): string {
  const parts = [`${formatCount(pass.cells)} cells`, `${formatCount(pass.winds)} winds`];
  if (pass.galeWinds > 0) parts.push(`${formatCount(pass.galeWinds)} of gale or more`);
  return parts.join(', ');
}
