import { expect, test } from 'vitest';
import { describeSolution, headOf, linesOf, writeCard } from '../../../../renderer/panels/cell-card/words.ts';
import type { CellCard } from '../../../../src/contract/values.ts';

const NOW = Date.UTC(2031, 0, 17, 4, 0);

const windCell: CellCard = {
  passId: 1,
  file: 'storm.bufr',
  row: 12,
  column: 38,
  state: 'wind',
  lon: 178.5,
  lat: -52.25,
  timeMs: Date.UTC(2031, 0, 17, 1, 19, 33),
  speedMs: 27.9,
  directionFrom: 269,
  isDirectionStated: true,
  flagWords: [],
  flagReading: 'as-table',
  checksRain: false,
  rawFlags: 0,
  chosenSolution: 2,
  solutions: [
    { speedMs: 27.5, directionFrom: 90, probability: 0.3, fitDistance: null, isChosen: false },
    { speedMs: 27.9, directionFrom: 269, probability: 0.7, fitDistance: -0.4, isChosen: true },
  ],
  beams: [],
  background: { speedMs: 24.5, directionFrom: 266 },
  iceProbability: null,
  cellSizeM: 25_000,
  band: 'C',
  viewing: 'fan-beam',
  nearestLand: { distanceKm: 185.2, bearingDeg: 270 },
  cautions: ['Not for navigation.'],
};

const line = (card: CellCard, name: string) => linesOf(card, NOW).find((entry) => entry.name === name)?.text;

test('says the speed in knots, metres per second and Beaufort, and where it comes from', () => {
  expect(headOf(windCell, 'knots')).toEqual({
    figure: '54',
    unit: 'kt',
    title: 'Storm, Beaufort 10',
    detail: '27.9 m/s from 269° west',
  });
  expect(headOf(windCell, 'metresPerSecond')).toMatchObject({
    figure: '27.9',
    unit: 'm/s',
    detail: '54 kt from 269° west',
  });
});

test('keeps the three states apart in words', () => {
  const bare = { ...windCell, speedMs: null, directionFrom: null };
  expect(headOf(windCell, 'knots').title).toBe('Storm, Beaufort 10');
  expect(headOf({ ...bare, state: 'looked but no wind' }, 'knots').title).toBe('Looked at, but no wind');
  expect(headOf({ ...bare, state: 'never looked' }, 'knots').title).toBe('Never looked at');
});

test('calls 17.2 m/s near gale: 33.43 kt rounds to 33', () => {
  expect(headOf({ ...windCell, speedMs: 17.2 }, 'knots').title).toBe('Near gale, Beaufort 7');
});

test('says that no flag is set, and that rain was perhaps never checked', () => {
  expect(line(windCell, 'Flags')).toBe('none set; rain was perhaps never checked');
});

test('never calls unknown or absent flags none', () => {
  expect(line({ ...windCell, flagReading: 'absent', rawFlags: null }, 'Flags')).toContain('states no quality');
  expect(line({ ...windCell, flagReading: 'unknown' }, 'Flags')).toContain('not known');
});

test('says that the background is a model, not an observation', () => {
  expect(line(windCell, 'Background')).toContain('a model, not an observation');
});

test('gives the distance to land in nautical miles: 185.2 km is 100', () => {
  expect(line(windCell, 'Nearest land')).toBe('about 100 NM, west');
});

test('says where it came from, counted from 1, and when, with its age', () => {
  expect(line(windCell, 'From')).toBe('storm.bufr, row 12, cell 38');
  expect(line(windCell, 'Seen')).toBe('2031-01-17 01:19:33 UTC, 2 h 40 min ago');
});

test('lists a solution with its probability, and says where none is stated', () => {
  expect(describeSolution(windCell.solutions[1])).toBe(
    '54 kt (27.9 m/s) from 269° west, 70 % likely, fit distance -0.40',
  );
  expect(describeSolution({ ...windCell.solutions[0], probability: null })).toContain('probability not stated');
});

test('gives no direction for a file that does not say which way its directions point', () => {
  const detail = headOf({ ...windCell, isDirectionStated: false }, 'knots').detail;
  expect(detail).not.toContain('269');
});

test('copies the card whole, the chosen solution marked and the cautions with it', () => {
  const text = writeCard(windCell, 'knots', NOW);
  expect(text).toContain('54 kt, Storm, Beaufort 10: 27.9 m/s from 269° west');
  expect(text).toContain('2. 54 kt (27.9 m/s) from 269° west, 70 % likely, fit distance -0.40 (chosen)');
  expect(text).toContain('Not for navigation.');
});
