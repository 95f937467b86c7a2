import { expect, test } from 'vitest';
import { readBufrSwaths } from '../../../../../src/decode/products/bufr-winds/read-bufr-swaths.ts';
import { LOOKED_NO_WIND, WIND } from '../../../../../src/swath/swath.ts';
import { listFlags } from '../../../../../src/wind/flags.ts';
import { buildMessage, type CellWanted, joinBytes } from './build-fan-beam.ts';

function readCells(...cells: CellWanted[]) {
  const numbered = cells.map((cell, index) => ({ number: index + 1, ...cell }));
  const { swaths, problems } = readBufrSwaths(buildMessage(numbered), 'pass.bufr');
  return { swath: swaths[0], problems };
}

test('marks a direction above 360 and never makes something plausible of it', () => {
  const { swath, problems } = readCells({ winds: [[21, 379, 0]] }, { winds: [[8, 360, 0]] });
  expect([swath.state[0], swath.speedMs[0], swath.directionFrom[0]]).toEqual([WIND, 21, Number.NaN]);
  expect(listFlags(swath.flags[0])).toEqual(['outOfRange', 'directionUnknown']);
  expect([swath.directionFrom[1], listFlags(swath.flags[1])]).toEqual([0, []]);
  expect(problems.map(({ code, place }) => [code, place.file])).toEqual([['values-out-of-range', 'pass.bufr']]);
  expect(problems[0].message).toContain('wind direction (1)');
});

test('marks a cell for a bad value anywhere in it: another solution, a look, the ice', () => {
  const { swath } = readCells(
    {
      winds: [
        [8, 250, -0.3],
        [8, 400, -0.3],
      ],
    },
    { azimuth: 500 },
    { iceProbability: 1.01 },
    {},
  );
  expect(Array.from(swath.flags, (flags) => listFlags(flags))).toEqual([
    ['outOfRange'],
    ['outOfRange'],
    ['outOfRange'],
    [],
  ]);
  expect(swath.beams?.azimuthDeg[3]).toBe(Number.NaN);
  expect(swath.speedMs[1]).toBe(8);
});

test('leaves out a cell whose place is impossible or unknown, and says how strong its wind was', () => {
  const { swath, problems } = readCells({}, { lat: 91, winds: [[26.5, 250, 0]] }, { lon: 181 }, { lat: null });
  expect([swath.columns, swath.state[0]]).toEqual([1, WIND]);
  expect(problems.map(({ code }) => code)).toEqual(['values-out-of-range', 'damaged']);
  expect(problems[1].message).toBe(
    'Cells left out for want of a usable position, time or cell number: 3, of which 3 with a wind of up to 26.5 m/s.',
  );
});

test('makes no other time of one the calendar does not have', () => {
  const bad: CellWanted[] = [{ month: 13 }, { month: 2, day: 30 }, { hour: 24 }, { hour: null }, { day: 0 }];
  const { swath, problems } = readCells({}, ...bad);
  expect(swath.state.length).toBe(1);
  expect(problems[0].message).toContain('cell number: 5, of which');
});

test('keeps a leap second', () => {
  const { swath } = readCells({ seconds: 59 });
  expect(new Date(swath.timeMs[0]).toISOString()).toBe('2031-01-17T06:00:59.000Z');
});

test('keeps the speed of the likeliest wind where none is selected, and no direction', () => {
  const winds: CellWanted['winds'] = [
    [18, 250, -0.4],
    [19, 70, -0.22],
  ];
  for (const selected of [null, 0, 7]) {
    const { swath } = readCells({ winds, selected });
    expect([swath.state[0], swath.speedMs[0], swath.chosenSolution[0]]).toEqual([WIND, 19, 0]);
    expect(swath.directionFrom[0]).toBe(Number.NaN);
    expect(listFlags(swath.flags[0])).toContain('directionUnknown');
    expect(swath.notes[0]).toContain('none is selected: 1.');
  }
});

test('says looked but no wind where every slot is empty, whatever the index says', () => {
  const { swath } = readCells({}, { winds: [[null, null, null]], selected: 1 });
  expect([swath.state[1], swath.speedMs[1], swath.chosenSolution[1]]).toEqual([LOOKED_NO_WIND, Number.NaN, 0]);
});

test('gives no probabilities where likelihoods are not the logarithms of any', () => {
  const { swath } = readCells({ winds: [[8, 250, 1.5]] }, { winds: [[8, 250, 2.2]] });
  expect([...(swath.solutions?.probability ?? [])]).toEqual([Number.NaN, Number.NaN]);
  expect(swath.notes).toContain(
    'The likelihoods of this file are no probabilities of the solutions, so none are given.',
  );
});

test('keeps the whole messages of a file that was cut, and tells which one was lost', () => {
  const messages = [0, 4, 8].map((seconds) => buildMessage([{ seconds }, { seconds, number: 2 }]));
  const whole = joinBytes(...messages);
  const { swaths, problems } = readBufrSwaths(whole.subarray(0, whole.length - 20), 'cut.bufr');
  expect(swaths[0].rows).toBe(2);
  expect(problems.map(({ code, place }) => [code, place])).toEqual([
    ['truncated', { file: 'cut.bufr', part: 'message 3', byte: messages[0].length + messages[1].length }],
  ]);
});

test('refuses a message that states more cells than its data can tell apart', () => {
  const message = buildMessage([{}, { number: 2 }]);
  const subsetCountAt = 8 + 22 + 4;
  message.set([0xff, 0xff], subsetCountAt);
  const { swaths, problems } = readBufrSwaths(message, 'lying.bufr');
  expect(swaths).toEqual([]);
  expect(problems[0].place).toMatchObject({ file: 'lying.bufr', part: 'message 1' });
  expect(problems[0].code).toMatch(/damaged|truncated/);
});

test('names an operator it cannot apply, its message and its byte, and reads the other messages', () => {
  const good = buildMessage([{}]);
  const bad = buildMessage([{}]);
  const descriptorAt = 8 + 22 + 7;
  bad.set([2 * 64 + 3, 12], descriptorAt);
  const { swaths, problems } = readBufrSwaths(joinBytes(good, bad), 'operator.bufr');
  expect(swaths.length).toBe(1);
  expect(problems).toMatchObject([
    { code: 'unsupported-operator', place: { part: 'message 2', byte: good.length + descriptorAt } },
  ]);
  expect(problems[0].message).toContain('2 03 012 (change reference values)');
});

/** A small generator with a seed: the linear congruence of Numerical Recipes, chapter 7. */
function createRandom(seed: number): (below: number) => number {
  let state = seed;
  return (below) => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return Math.floor((state / 2 ** 32) * below);
  };
}

test('answers any damage with swaths or problems that have a place, and never with an exception', () => {
  const random = createRandom(61);
  const cells = Array.from({ length: 12 }, (_, i) => ({ seconds: Math.floor(i / 4) * 4, number: (i % 4) + 1 }));
  const originals = [
    buildMessage(cells),
    buildMessage(cells, false),
    joinBytes(buildMessage(cells), buildMessage(cells)),
  ];
  for (let round = 0; round < 1500; round++) {
    const bytes = Uint8Array.from(originals[round % 3]);
    const inHead = random(2) === 0;
    for (let n = random(4); n >= 0; n--) bytes[random(inHead ? 46 : bytes.length)] = random(256);
    const cut = random(4) === 0 ? bytes.subarray(0, random(bytes.length)) : bytes;
    const { swaths, problems } = readBufrSwaths(cut, 'damaged.bufr');
    expect(swaths.length + problems.length).toBeGreaterThan(0);
    for (const problem of problems) {
      expect(problem.code).not.toBe('internal');
      expect(problem.place.file).toBe('damaged.bufr');
    }
  }
});
