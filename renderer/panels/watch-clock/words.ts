import { formatClock, formatDate } from '../../../src/wind/words.ts';

/** The words of the watch clock. */
export const clockWords = {
  title: 'When this water was seen',
  dial: 'Twelve hours back from now',
  turn: 'Now: drag round, or arrow keys by ten minutes',
  reach: 'How far back the window reaches: drag, or arrow keys by a quarter of an hour',
  now: 'now',
  utc: 'UTC',
  earlier: '‹ earlier pass',
  later: 'later pass ›',
  nowInput: 'Now (UTC)',
  nowWrong: 'Type a date and time in UTC, such as 2031-01-17 04:00.',
  standAt: 'Stand at',
  system: 'system clock',
  followsSystem: 'follows the system clock',
  isSet: 'set, and stands still',
  newest: 'newest pass',
  windowChoice: 'Window, hours back',
  nobodySaw: 'No pass in the window saw this water.',
  offDial: (count: number) =>
    count === 1 ? '1 pass is older than the dial.' : `${count} passes are older than the dial.`,
} as const;

/** The section's state in a few words: '12 h back from 04:00'. */
export function summariseClock(nowMs: number, windowHours: number): string {
  return `${describeHours(windowHours)} back from ${formatClock(nowMs)}`;
}

/** A length of the window: '12 h', '45 min', '3 days'. */
export function describeHours(hours: number): string {
  if (hours < 1) return `${Math.round(hours * 60)} min`;
  if (hours > 72 && hours % 24 === 0) return `${hours / 24} days`;
  return `${Number(hours.toFixed(2))} h`;
}

/** A share of this water: '38 %', never rounded to nothing or to all. */
export function describeShare(share: number): string {
  const percent = Math.round(share * 100);
  if (percent === 0 && share > 0) return 'under 1 %';
  if (percent === 100 && share < 1) return 'over 99 %';
  return `${percent} %`;
}

/** A moment as it is typed, in UTC: '2031-01-17 04:00'. */
export function toTyped(timeMs: number): string {
  return `${formatDate(timeMs)} ${formatClock(timeMs)}`;
}

/** The moment that was typed, read as UTC, or null where it is none: '2031-01-17 04:00', seconds and a final Z allowed. */
export function fromTyped(text: string): number | null {
  const match = /^(\d{4}-\d{2}-\d{2})[ T]+(\d{1,2}):?(\d{2})(?::\d{2})? ?(?:Z|UTC)?$/i.exec(text.trim());
  if (!match) return null;
  const [, date, hours, minutes] = match;
  const timeMs = Date.parse(`${date}T${hours.padStart(2, '0')}:${minutes}Z`);
  return Number.isNaN(timeMs) || formatDate(timeMs) !== date ? null : timeMs;
}
