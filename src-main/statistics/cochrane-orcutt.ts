import type { Caveat } from '../contract/primitives.ts';
import { ar1Rows } from './ar1-rows.ts';
import { designColumns } from './design-columns.ts';
import { iteratedAr1, type Ar1LineRequest, type IteratedAr1Fit } from './iterated-ar1.ts';
import { leastSquares } from './least-squares.ts';

export interface CochraneOrcuttFit extends IteratedAr1Fit {
  caveats: Caveat[];
}

/** Values of ρ at which the sum of squares is looked at for a lower valley than the one the iteration ended in. */
const LOOKED_AT = Array.from({ length: 39 }, (_, i) => Math.tanh((i - 19) / 8));

/**
 * Iterated Cochrane–Orcutt estimator: the line, and its standard error, when each error carries over a share ρ of the
 * one before. The first row only serves as the past of the second.
 *
 * Model    y = Xb + e, e_t = ρ e_{t−1} + u_t. Least squares on y_t − ρ y_{t−1}, t = 2 … n; ρ and its iteration as in
 *          `iteratedAr1` (until ρ changes by at most 1e-12). Each step lowers Σ_{t≥2} u_t², whose valleys can be
 *          several. Errors classical on the freed rows, n − 1 − k degrees of freedom
 * Assumes  rows in order of time, equally spaced, without gaps
 *
 * @param x  [nObs], or columns; y [nObs]; finite
 * @returns  caveat not-the-lowest-sum when another ρ gives a smaller Σ u_t²
 * @throws   InputError as `leastSquares`, too-few-observations; NumericError exact-fit, not-stationary when |ρ| reaches
 *           1, not-converged
 *
 * Differs  some programs stop when ρ changes by less than 1e-3 … 1e-6, or after one step: ρ then differs in the fourth
 *          digit or so. The first row matters with a trend: Prais–Winsten keeps it
 * Source   Cochrane & Orcutt 1949, J. Am. Stat. Assoc. 44, 32–61; several valleys: Dufour, Gaudry & Liem 1980,
 *          Econ. Lett. 6, 43–48 (from memory)
 * Checked  test/reference/statistics/cochrane-orcutt.test.ts (B: the same steps in base R; R's arima with method "CSS")
 */
export function cochraneOrcutt(request: Ar1LineRequest): CochraneOrcuttFit {
  const fit = iteratedAr1('cochraneOrcutt', request, withoutFirst);
  return { ...fit, caveats: lowerValley(request, fit) };
}

function withoutFirst(column: Float64Array, rho: number): Float64Array {
  return ar1Rows(column, rho).subarray(1);
}

function lowerValley({ x, y: givenY, intercept }: Ar1LineRequest, fit: IteratedAr1Fit): Caveat[] {
  const y = Float64Array.from(givenY);
  const columns = designColumns('cochraneOrcutt', x, y.length, intercept);
  const found = fit.residualStandardDeviation ** 2 * fit.degreesOfFreedom;
  const sums = LOOKED_AT.map((rho) => {
    const freed = columns.map((column) => withoutFirst(column, rho));
    return leastSquares({ columns: freed, y: withoutFirst(y, rho), caller: 'cochraneOrcutt' }).residualSumOfSquares;
  });
  const lowest = Math.min(...sums);
  if (lowest >= found * (1 - 1e-9)) return [];
  const rho = LOOKED_AT[sums.indexOf(lowest)]!;
  return [
    {
      code: 'not-the-lowest-sum',
      detail: `The iteration ended at ρ = ${fit.rho.toFixed(3)}, but near ρ = ${rho.toFixed(2)} the sum of squares is ${(100 * (1 - lowest / found)).toPrecision(2)} % smaller: take an estimate by the exact likelihood.`,
    },
  ];
}
