import type { CellCard } from '../../../src/contract/values.ts';
import { beaufortNames, beaufortOfSpeed } from '../../../src/wind/beaufort.ts';
import { compassWord } from '../../../src/wind/compass.ts';
import { toWholeKnots } from '../../../src/wind/units.ts';
import {
  formatAge,
  formatClockSeconds,
  formatDate,
  formatDirection,
  formatPosition,
  formatSpeed,
} from '../../../src/wind/words.ts';

type SpeedUnit = 'knots' | 'metresPerSecond';

/** Kilometres in one international nautical mile. */
const KM_PER_NAUTICAL_MILE = 1.852;

/** The words of the card that do not depend on its cell. */
export const cardWords = {
  label: 'The chosen cell',
  close: 'Close',
  copy: 'Copy as text',
  copied: 'Copied',
  notCopied: 'Could not be copied',
  reading: 'Reading this cell …',
  failed: (reason: string) => `No card for this cell: ${reason}`,
  cautions: 'Before you believe it',
  steps: 'Neighbouring cells',
  stepNames: { before: 'row before', after: 'row after', left: 'cell before', right: 'cell after' },
  answers: 'Every solution',
  looks: 'Radar looks',
} as const;

/** One line of the card: its name and what it says. */
export interface CardLine {
  name: string;
  text: string;
}

/** What the card says first: the speed large, and beside it what that means. */
export interface CardHead {
  figure: string;
  unit: string;
  title: string;
  detail: string;
}

/** The head of a card. Water without a wind, or never looked at, says so in place of a figure. */
export function headOf(card: CellCard, unit: SpeedUnit): CardHead {
  if (card.state === 'never looked') return { figure: '', unit: '', title: 'Never looked at', detail: neverLooked };
  if (card.state === 'looked but no wind' || card.speedMs === null) {
    return {
      figure: '',
      unit: '',
      title: 'Looked at, but no wind',
      detail: 'Not calm: the radar looked and gave no wind.',
    };
  }
  const beaufort = beaufortOfSpeed(card.speedMs);
  const name = beaufortNames[beaufort];
  const [figure, unitWord] = formatSpeed(card.speedMs, unit).split(' ');
  return {
    figure,
    unit: unitWord,
    title: `${name[0].toUpperCase()}${name.slice(1)}, Beaufort ${beaufort}`,
    detail: `${formatSpeed(card.speedMs, unit === 'knots' ? 'metresPerSecond' : 'knots')} ${describeFrom(card)}`,
  };
}

/** The lines under the head, each exact and none left out for being awkward. */
export function linesOf(card: CellCard, nowMs: number): CardLine[] {
  return [
    { name: 'Position', text: formatPosition(card.lon, card.lat) },
    {
      name: 'Seen',
      text: `${formatDate(card.timeMs)} ${formatClockSeconds(card.timeMs)} UTC, ${formatAge(card.timeMs, nowMs)}`,
    },
    { name: 'Flags', text: describeFlags(card) },
    ...(card.background ? [{ name: 'Background', text: describeBackground(card.background) }] : []),
    ...(card.iceProbability !== null ? [{ name: 'Ice', text: `${formatPercent(card.iceProbability)} likely` }] : []),
    { name: 'Nearest land', text: describeLand(card.nearestLand) },
    { name: 'Radar', text: describeRadar(card) },
    ...describeFlagWord(card),
    { name: 'From', text: `${card.file}, row ${card.row}, cell ${card.column}` },
  ];
}

/** One solution: '54 kt (27.9 m/s) from 269° west, 83 % likely'. */
export function describeSolution(solution: CellCard['solutions'][number]): string {
  const speed = `${toWholeKnots(solution.speedMs)} kt (${solution.speedMs.toFixed(1)} m/s)`;
  const from =
    solution.directionFrom === null ? 'direction not known' : `from ${directionWords(solution.directionFrom)}`;
  const likely =
    solution.probability === null ? 'probability not stated' : `${formatPercent(solution.probability)} likely`;
  const fit = solution.fitDistance === null ? '' : `, fit distance ${solution.fitDistance.toFixed(2)}`;
  return `${speed} ${from}, ${likely}${fit}`;
}

/** What the solutions say when there is no list to show. */
export function describeNoSolutions(card: CellCard): string {
  return card.state === 'wind' ? 'This file holds only the chosen one.' : 'None.';
}

/** One radar look: 'incidence 46.2°, azimuth 105°, −18.42 dB, noise 5.3 %'; what is missing says so. */
export function describeBeam(beam: CellCard['beams'][number]): string {
  const value = (number: number | null, digits: number, unit: string) =>
    number === null ? 'not stated' : `${number.toFixed(digits).replace('-', '−')}${unit}`;
  return [
    `incidence ${value(beam.incidenceDeg, 1, '°')}`,
    `azimuth ${value(beam.azimuthDeg, 0, '°')}`,
    value(beam.backscatterDb, 2, ' dB'),
    `noise ${value(beam.noisePercent, 1, ' %')}`,
  ].join(', ');
}

/** The whole card as text, as it is copied. */
export function writeCard(card: CellCard, unit: SpeedUnit, nowMs: number): string {
  const head = headOf(card, unit);
  const solutions = card.solutions.map(
    (solution, index) => `  ${index + 1}. ${describeSolution(solution)}${solution.isChosen ? ' (chosen)' : ''}`,
  );
  const looks = card.beams.map((beam, index) => `  ${index + 1}. ${describeBeam(beam)}`);
  return [
    [head.figure && `${head.figure} ${head.unit},`, `${head.title}:`, head.detail].filter(Boolean).join(' '),
    ...linesOf(card, nowMs).map(({ name, text }) => `${name}: ${text}`),
    `${cardWords.answers}: ${solutions.length ? '' : describeNoSolutions(card)}`.trim(),
    ...solutions,
    ...(looks.length ? [`${cardWords.looks}:`, ...looks] : []),
    `${cardWords.cautions}:`,
    ...card.cautions.map((caution) => `  ${caution}`),
  ].join('\n');
}

const neverLooked = 'Nobody looked at this water in this pass: its wind is not known.';

function describeFrom(card: CellCard): string {
  if (!card.isDirectionStated) return 'direction: the file does not say which way it points';
  if (card.directionFrom === null) return 'direction not known';
  return `from ${directionWords(card.directionFrom)}`;
}

function directionWords(directionFrom: number): string {
  return `${formatDirection(directionFrom)} ${compassWord(directionFrom)}`;
}

function describeFlags(card: CellCard): string {
  return card.checksRain ? describeSetFlags(card) : `${describeSetFlags(card)}; rain was perhaps never checked`;
}

function describeSetFlags(card: CellCard): string {
  if (card.flagReading === 'absent') return 'the file states no quality';
  if (card.flagReading === 'unknown') return 'their meaning in this file is not known: none was read';
  return card.flagWords.length === 0 ? 'none set' : card.flagWords.join(', ');
}

/** The flag word as the file holds it, and how it was read. */
function describeFlagWord(card: CellCard): CardLine[] {
  if (card.rawFlags === null) return [];
  const reading = card.flagReading === 'one-bit-lower' ? ', read one bit lower than its table says' : '';
  return [{ name: 'Flag word', text: `${card.rawFlags}${reading}` }];
}

function describeBackground(background: NonNullable<CellCard['background']>): string {
  const from = background.directionFrom === null ? '' : ` from ${formatDirection(background.directionFrom)}`;
  const knots = toWholeKnots(background.speedMs);
  return `${knots} kt (${background.speedMs.toFixed(1)} m/s)${from}: a model, not an observation`;
}

function describeLand(land: CellCard['nearestLand']): string {
  if (!land) return 'none within 540 NM';
  const miles = land.distanceKm / KM_PER_NAUTICAL_MILE;
  if (miles < 0.5) return 'here';
  return `about ${miles < 10 ? miles.toFixed(1) : Math.round(miles)} NM, ${compassWord(land.bearingDeg)}`;
}

function describeRadar(card: CellCard): string {
  const parts = [card.band ? `${card.band} band` : 'band not stated', card.viewing ?? 'viewing not stated'];
  if (card.cellSizeM !== null) parts.push(`cells of ${Number((card.cellSizeM / 1000).toFixed(1))} km`);
  return parts.join(', ');
}

function formatPercent(share: number): string {
  const percent = Math.round(share * 100);
  if (percent === 0 && share > 0) return 'under 1 %';
  if (percent === 100 && share < 1) return 'over 99 %';
  return `${percent} %`;
}
