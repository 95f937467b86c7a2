import { expect, test } from 'vitest';
import type { Backend } from '../../../renderer/backend/backend.ts';
import { chooseCell } from '../../../renderer/state/cell.ts';
import { createSeen } from '../../../renderer/state/seen.ts';
import { Problem } from '../../../src/problems/problem.ts';

const placeOf = (row: number) => ({ passId: 1, row, column: 2, lon: 0, lat: 0 });

/** A backend whose answers to readCell are given by row, when the test says so. */
function answering(answers: Record<number, Promise<unknown>>): Backend {
  const ask = (_: string, input: { row: number }) => answers[input.row];
  return { ask } as unknown as Backend;
}

test('puts the chosen cell where its card says it lies', async () => {
  const seen = createSeen(0);
  const card = { row: 1, lon: 178.5, lat: -52 };
  await chooseCell(seen, answering({ 1: Promise.resolve(card) }), placeOf(1));
  expect(seen.get().selected).toEqual({ ...placeOf(1), lon: 178.5, lat: -52 });
  expect(seen.get().card).toEqual({ state: 'read', value: card });
});

test('lets a later choice win over a slower answer', async () => {
  const seen = createSeen(0);
  let answerFirst = (_: unknown) => {};
  const slow = new Promise((resolve) => {
    answerFirst = resolve;
  });
  const backend = answering({ 1: slow, 2: Promise.resolve({ row: 2, lon: 0, lat: 0 }) });
  const first = chooseCell(seen, backend, placeOf(1));
  await chooseCell(seen, backend, placeOf(2));
  answerFirst({ row: 1, lon: 0, lat: 0 });
  await first;
  expect(seen.get().card).toMatchObject({ value: { row: 2 } });
});

test('says why a cell has no card', async () => {
  const seen = createSeen(0);
  const refused = Promise.reject(new Problem('not-stored', 'never looked at', { part: 'row 1' }));
  await chooseCell(seen, answering({ 1: refused }), placeOf(1));
  expect(seen.get().card).toEqual({ state: 'failed', reason: 'never looked at (row 1)' });
});
