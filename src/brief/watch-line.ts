import type { WatchFigures, WindPlace } from '../analyse/watch/watch.ts';
import { beaufortNames, beaufortOfSpeed, GALE_BEAUFORT } from '../wind/beaufort.ts';
import { compassWord } from '../wind/compass.ts';
import { toWholeKnots } from '../wind/units.ts';
import { formatAge, formatClock, formatDate, formatPosition } from '../wind/words.ts';

/** What pressing a run shows. */
export type GoesTo =
  | { kind: 'cell'; passId: number; row: number; column: number; lon: number; lat: number }
  | { kind: 'unseen' | 'hidden winds' | 'passes' | 'water' };

/** One run of the watch line. */
export interface Run {
  text: string;
  weight: 'plain' | 'figure' | 'danger';
  goesTo: GoesTo | null;
}

/** Everything the sentence speaks of. */
export interface WatchFacts extends WatchFigures {
  /** The watch area's name, or null for the view. */
  areaName: string | null;
  seaKm2: number;
  /** 0 to 1; NaN where there is no sea. */
  unseenShare: number;
  noWindShare: number;
  hiddenPasses: number;
  window: { fromMs: number; toMs: number };
  nowMs: number;
  speedUnit: 'knots' | 'metresPerSecond';
}

/** Above this the radar's answer flattens and tends to read low (Polverari et al. 2022, IEEE TGRS: agrees with buoys to 25 m/s). */
const SATURATION_MS = 25;

/**
 * The watch line: one sentence or a few on the strongest wind seen, where, when and how long ago, what nobody looked at,
 * and what the switches hide. It speaks of what was seen, never of what was not: unseen water is unknown, not calm.
 */
export function writeWatchLine(facts: WatchFacts): Run[] {
  if (!(facts.seaKm2 > 0)) return [plain('There is no sea in '), water(facts), plain('.')];
  return [...writeStrongest(facts), ...writeAges(facts), ...writeUnseen(facts), ...writeHidden(facts)];
}

function writeStrongest(facts: WatchFacts): Run[] {
  const { strongest } = facts;
  if (facts.newestMs === null) {
    return [plain('Nobody looked at '), water(facts), plain(` ${when(facts)}: its wind is not known. `)];
  }
  if (strongest === null)
    return [figure('No wind was found'), plain(' where radar looked in '), water(facts), plain('. ')];

  const beaufort = beaufortOfSpeed(strongest.speedMs);
  const opening: Run[] =
    beaufort >= GALE_BEAUFORT
      ? [plain('In '), water(facts), plain(' '), danger(beaufortNames[beaufort]), plain(' was seen: strongest ')]
      : [plain('No gale was '), figure('seen'), plain(' in '), water(facts), plain(': strongest ')];
  return [...opening, ...writeWind(strongest, facts), ...writeDoubt(strongest)];
}

function writeWind(place: WindPlace, facts: WatchFacts): Run[] {
  const isDangerous = beaufortOfSpeed(place.speedMs) >= GALE_BEAUFORT;
  const goesTo: GoesTo = {
    kind: 'cell',
    passId: place.passId,
    row: place.row,
    column: place.column,
    lon: place.lon,
    lat: place.lat,
  };
  const speed = facts.speedUnit === 'knots' ? `${toWholeKnots(place.speedMs)} kt` : `${place.speedMs.toFixed(1)} m/s`;
  const from =
    place.directionFrom === null ? ', direction not known,' : ` from the ${compassWord(place.directionFrom)}`;
  return [
    { text: speed, weight: isDangerous ? 'danger' : 'figure', goesTo },
    plain(`${from} at `),
    { text: formatPosition(place.lon, place.lat), weight: 'figure', goesTo },
    plain(', at '),
    figure(formatMoment(place.timeMs, facts.nowMs)),
    plain(' UTC, '),
    { text: formatAge(place.timeMs, facts.nowMs), weight: 'figure', goesTo: { kind: 'passes' } },
    plain('. '),
  ];
}

function writeDoubt(place: WindPlace): Run[] {
  const runs: Run[] = [];
  if (place.isHidden) runs.push(danger('It is hidden by your switches. '));
  if (place.speedMs > SATURATION_MS) runs.push(plain('Above 25 m/s radar tends to read low. '));
  return runs;
}

function writeAges(facts: WatchFacts): Run[] {
  const { oldestMs, newestMs, nowMs } = facts;
  if (oldestMs === null || newestMs === null) return [];
  const oldest = formatAge(oldestMs, nowMs);
  const newest = formatAge(newestMs, nowMs);
  const ages = oldest === newest ? `all seen ${oldest}` : `seen between ${oldest} and ${newest}`;
  return [{ text: ages[0].toUpperCase() + ages.slice(1), weight: 'plain', goesTo: { kind: 'passes' } }, plain('. ')];
}

function writeUnseen(facts: WatchFacts): Run[] {
  if (facts.newestMs === null) return [];
  const noWind: Run[] =
    facts.noWindShare > 0.005 ? [plain(', and '), figure(formatShare(facts.noWindShare)), plain(' gave no wind')] : [];
  if (facts.unseenShare === 0) {
    const goesTo: GoesTo = { kind: 'unseen' };
    return [
      { text: 'All of its sea was looked at', weight: 'plain', goesTo },
      plain(` ${when(facts)}`),
      ...noWind,
      plain('. '),
    ];
  }
  return [
    {
      text: `${formatShare(facts.unseenShare)} of its sea nobody looked at`,
      weight: 'figure',
      goesTo: { kind: 'unseen' },
    },
    plain(` ${when(facts)}`),
    ...noWind,
    plain('. '),
  ];
}

function writeHidden(facts: WatchFacts): Run[] {
  const passes =
    facts.hiddenPasses === 0
      ? []
      : [plain(facts.hiddenPasses === 1 ? ' One pass is hidden.' : ` ${facts.hiddenPasses} passes are hidden.`)];
  const count = facts.hiddenGaleWinds;
  if (count === 0) return [{ text: 'No wind of gale or more is hidden.', weight: 'plain', goesTo: null }, ...passes];
  const text = count === 1 ? '1 wind of gale or more is hidden' : `${count} winds of gale or more are hidden`;
  return [{ text, weight: 'danger', goesTo: { kind: 'hidden winds' } }, plain(' by your switches.'), ...passes];
}

/** A share in whole percent that never rounds something to nothing or to all. */
export function formatShare(share: number): string {
  const percent = Math.round(share * 100);
  if (percent === 0 && share > 0) return 'less than 1 %';
  if (percent === 100 && share < 1) return 'more than 99 %';
  return `${percent} %`;
}

function when({ window, nowMs }: WatchFacts): string {
  const hours = (window.toMs - window.fromMs) / 3_600_000;
  if (window.toMs === nowMs) return hours === 1 ? 'in the last hour' : `in the last ${Number(hours.toFixed(2))} hours`;
  return `from ${formatDate(window.fromMs)} ${formatClock(window.fromMs)} to ${formatDate(window.toMs)} ${formatClock(window.toMs)} UTC`;
}

/** The clock time alone when it is less than 20 hours from now, else with its date. */
function formatMoment(timeMs: number, nowMs: number): string {
  const isNear = Math.abs(nowMs - timeMs) < 20 * 3_600_000;
  return isNear ? formatClock(timeMs) : `${formatDate(timeMs)} ${formatClock(timeMs)}`;
}

function water(facts: WatchFacts): Run {
  return {
    text: facts.areaName === null ? 'this view' : `‘${facts.areaName}’`,
    weight: 'plain',
    goesTo: { kind: 'water' },
  };
}

function plain(text: string): Run {
  return { text, weight: 'plain', goesTo: null };
}

function figure(text: string): Run {
  return { text, weight: 'figure', goesTo: null };
}

function danger(text: string): Run {
  return { text, weight: 'danger', goesTo: null };
}
