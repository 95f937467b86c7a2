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
  nowInput: 'Now, UTC',
  system: 'Follow the system clock',
  followsSystem: 'follows the system clock',
  isSet: 'set, standing still',
  newest: 'Stand at the newest pass',
  windowChoice: 'The window, hours back from now',
  windowInput: 'hours',
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
  if (hours > 48 && hours % 24 === 0) return `${hours / 24} days`;
  return `${Number(hours.toFixed(2))} h`;
}

/** A share of this water: '38 %', never rounded to nothing or to all. */
export function describeShare(share: number): string {
  const percent = Math.round(share * 100);
  if (percent === 0 && share > 0) return 'under 1 %';
  if (percent === 100 && share < 1) return 'over 99 %';
  return `${percent} %`;
}

/** A moment as the date and time input writes it, in UTC: '2031-01-17T04:00'. */
export function toInputValue(timeMs: number): string {
  return `${formatDate(timeMs)}T${formatClock(timeMs)}`;
}

/** The moment of a date and time input read as UTC, or null where it is not filled in. */
export function fromInputValue(value: string): number | null {
  const timeMs = Date.parse(`${value}Z`);
  return Number.isNaN(timeMs) ? null : timeMs;
}
