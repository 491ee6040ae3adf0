import { finiteNumber } from './finite-values.ts';

/**
 * Rule-of-thumb lag for Newey–West errors: floor(4 (n/100)^(2/9)). It looks only at the length of the series, not at how
 * strongly its errors are correlated: with strongly correlated annual data it is often too short.
 *
 * @param nObs  number of rows, at least 2
 * @returns  lag, at most nObs − 1
 *
 * Source   Newey & West 1994, Rev. Econ. Stud. 61, 631–653 (the rate for the Bartlett kernel); as a rule of thumb in
 *          econometrics textbooks — common practice
 * Checked  test/unit/statistics/newey-west-lag.test.ts, level C: n = 100 → 4, n = 202 → 4, by hand
 */
export function neweyWestLag(nObs: number): number {
  finiteNumber('neweyWestLag', 'nObs', nObs, { isWhole: true, atLeast: 2 });
  return Math.min(nObs - 1, Math.floor(4 * (nObs / 100) ** (2 / 9)));
}
