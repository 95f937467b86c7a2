import { expect, test } from 'vitest';
import { isReplication, type PlanStep, planDescriptors } from '../../../../../src/decode/containers/bufr/plan.ts';
import type { Problem } from '../../../../../src/problems/problem.ts';

/** A plan in one line: element(width,scale), [n times ...], [counter: ...]. */
function draw(steps: readonly PlanStep[]): string {
  return steps
    .map((step) => {
      if (!isReplication(step)) return `${step.descriptor}(${step.widthBits},${step.scale})`;
      return `[${step.counter ? `${step.counter.descriptor}:` : step.times} ${draw(step.steps)}]`;
    })
    .join(' ');
}

function refusal(descriptors: number[]): Problem {
  try {
    planDescriptors(descriptors, 100);
  } catch (thrown) {
    return thrown as Problem;
  }
  throw new Error('nothing was refused');
}

// Widths and scales after operators: the expanded sequence tables of WMO-No. 306, table D.
test('applies width and scale operators to quantities until they are cancelled', () => {
  expect(draw(planDescriptors([312057], 0))).toBe('11012(14,2) 11011(12,1) 21156(13,1) 21104(15,3)');
  expect(draw(planDescriptors([201130, 202129, 11012, 202000, 11012, 201000, 11012], 0))).toBe(
    '11012(14,2) 11012(14,1) 11012(12,1)',
  );
});

// FM 94 table C, notes: not for code tables, flag tables and text.
test('leaves codes, flags and text as they are under an operator', () => {
  expect(draw(planDescriptors([201140, 202130, 2104, 21155, 1015], 0))).toBe('2104(4,0) 21155(24,0) 1015(160,0)');
});

// FM 94, delayed replication: the count is not one of the descriptors repeated.
test('does not count the element that says how often among the descriptors repeated', () => {
  expect(draw(planDescriptors([102000, 31001, 11012, 11011, 4006], 0))).toBe(
    '[31001: 11012(12,1) 11011(9,0)] 4006(6,0)',
  );
  expect(draw(planDescriptors([101003, 11012, 4006], 0))).toBe('[3 11012(12,1)] 4006(6,0)');
});

test('opens replications within replications and sequences within them', () => {
  expect(draw(planDescriptors([105002, 4006, 102000, 31000, 301021, 11012], 0))).toBe(
    '[2 4006(6,0) [31000: 5001(25,5) 6001(26,5) 11012(12,1)]]',
  );
});

test('refuses every other operator by number, name and place', () => {
  const problem = refusal([4001, 4002, 204008, 31021, 11012]);
  expect([problem.code, problem.place.byte]).toEqual(['unsupported-operator', 104]);
  expect(problem.message).toContain('2 04 008 (add associated field)');
  for (const operator of [203012, 205010, 206012, 207001, 208020, 221003, 222000, 224000, 236000]) {
    expect(refusal([operator, 11012]).code).toBe('unsupported-operator');
  }
});

test('refuses elements and sequences of no table by number and place', () => {
  expect(refusal([4001, 63255])).toMatchObject({ code: 'unknown-descriptor', place: { byte: 102 } });
  expect(refusal([363001]).message).toContain('3 63 001');
});

test('refuses a replication of more than follows it, and a count that is no count', () => {
  expect(refusal([102002, 11012]).code).toBe('damaged');
  expect(refusal([101000, 11012, 11012]).code).toBe('unsupported-operator');
});

test('refuses widths that no number has, and lists that open into thousands of elements', () => {
  expect(refusal([201255, 11012]).code).toBe('damaged');
  expect(refusal([201001, 11012]).code).toBe('damaged');
  expect(refusal(new Array(3000).fill(312061)).code).toBe('damaged');
});

test('repeats blocks that leave an operator in force only if it makes no difference', () => {
  expect(draw(planDescriptors([102002, 201130, 11012, 201000], 0))).toBe('[2 11012(14,1)]');
  expect(refusal([102002, 11012, 201130]).code).toBe('unsupported-operator');
});

test('refuses a delayed block under a width operator, which programs read in two ways', () => {
  expect(refusal([201132, 101000, 31001, 11012, 201000]).code).toBe('unsupported-operator');
  expect(draw(planDescriptors([202129, 101000, 31001, 11012], 0))).toBe('[31001: 11012(12,2)]');
});

test('says whether all ones mean missing: not for 1-bit elements, not for class 31', () => {
  const steps = planDescriptors([11012, 31000, 31001, 31002], 0);
  const answers = steps.map((step) => !isReplication(step) && step.canBeMissing);
  expect(answers).toEqual([true, false, false, false]);
});
