import type { Solutions } from '../../../swath/swath.ts';

/** The rounding of three decimals of a logarithm over a handful of solutions stays well within this. */
const SUM_TOLERANCE = 0.03;

/** The part of the cells whose likelihoods must be probabilities. Our choice, no source. */
const LEAST_AGREEMENT = 0.95;

/**
 * Turns the file's likelihoods, element 0 21 104, into probabilities in place. Fan-beam files hold the decimal logarithm
 * of the probability, which in real files sums to 1 over a cell. Table B does not say so, hence the check: no cell's may
 * sum to more, and where `mustSumToOne` they must sum to 1. Otherwise they are made NaN. Tells whether they were read.
 */
export function readLikelihoods(solutions: Solutions, mustSumToOne: boolean): boolean {
  const { probability, slots } = solutions;
  let [cellsWithAny, cellsThatFit] = [0, 0];
  for (let first = 0; first < probability.length; first += slots) {
    let sum = 0;
    for (let n = 0; n < slots; n++) {
      if (Number.isNaN(probability[first + n])) continue;
      const value = Math.exp(probability[first + n] * Math.LN10);
      probability[first + n] = value;
      sum += value;
    }
    if (sum === 0) continue;
    cellsWithAny++;
    if (sum <= 1 + SUM_TOLERANCE && (!mustSumToOne || sum >= 1 - SUM_TOLERANCE)) cellsThatFit++;
  }
  const isProbability = cellsThatFit >= cellsWithAny * LEAST_AGREEMENT;
  if (!isProbability) probability.fill(Number.NaN);
  return isProbability;
}
