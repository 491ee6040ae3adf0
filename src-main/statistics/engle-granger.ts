import type { Caveat } from '../contract/primitives.ts';
import { InputError } from '../errors.ts';
import { designColumns } from './design-columns.ts';
import { dickeyFullerT } from './dickey-fuller-t.ts';
import { refuseExactFit } from './exact-fit.ts';
import { finiteValues } from './finite-values.ts';
import { leastSquares } from './least-squares.ts';
import { mackinnonCritical, mackinnonP, type CriticalValues } from './mackinnon.ts';
import { sumOfProducts } from './summation.ts';
import { gapsClosedUp } from './year-steps.ts';

export interface EngleGrangerRequest {
  /** [nObs], or at most five columns. */
  x: ArrayLike<number> | readonly ArrayLike<number>[];
  y: ArrayLike<number>;
  /** Lagged differences of the residuals that soak up serial correlation. */
  lags: number;
  /** What the line has besides x: a constant, or a constant and a linear trend. */
  deterministic: 'constant' | 'trend';
  /** [nObs] whole, increasing: with a gap among them, a caveat. Without them rows are consecutive. */
  years?: ArrayLike<number> | undefined;
}

export interface EngleGrangerTest {
  /** t of the lagged residual. */
  statistic: number;
  p: number;
  /** Rows of the test regression. */
  nObs: number;
  /** Series taken together, y among them: the distribution depends on it. */
  nSeries: number;
  critical: CriticalValues;
  caveats: Caveat[];
}

/** MacKinnon's 1994 surfaces end at six series. */
const MOST_PREDICTORS = 5;

/**
 * Engle–Granger test: do trending series belong together, so that what a line through them leaves returns to zero, or
 * does it wander off (the null hypothesis), so that the line may be a chance likeness of trends?
 *
 * Model    y = a + [d t] + Xb + e by least squares; then the augmented Dickey–Fuller t of e without deterministic terms:
 *          Δe_t = γ e_{t−1} + δ_1 Δe_{t−1} + … + δ_L Δe_{t−L} + u_t. Because e is fitted, its distribution under γ = 0
 *          depends on the number of series and on the deterministic terms of the line
 * Assumes  rows in order of time, equally spaced, without gaps; every series wanders (see `adf` and `kpss`)
 *
 * @param lags  L, 0 or more; every lag costs a row
 * @returns  p after MacKinnon 1994 (asymptotic); critical values after MacKinnon 2010 at the rows of the test
 *           regression; caveat gaps-closed-up
 * @throws   InputError wrong-length, too-few-values, not-finite, out-of-range, too-many-predictors, too-few-observations,
 *           unordered-years;
 *           NumericError rank-deficient, exact-fit
 *
 * Differs  the answer depends on which series is y. statsmodels' coint takes the critical values at nObs − 1 whatever the
 *          lags, and chooses the lags itself unless autolag=None; Stata's egranger counts like this function
 * Source   Engle & Granger 1987, Econometrica 55, 251–276; MacKinnon 1994 and 2010, as in `mackinnonP`
 * Checked  test/reference/statistics/unit-root.test.ts (B: base R; A: tables)
 */
export function engleGranger({ x, y, lags, deterministic, years }: EngleGrangerRequest): EngleGrangerTest {
  const response = finiteValues('engleGranger', 'y', y, { atLeast: 6 });
  const columns = designColumns('engleGranger', x, response.length, true);
  const nSeries = columns.length;
  if (nSeries > MOST_PREDICTORS + 1) {
    throw new InputError({
      code: 'too-many-predictors',
      where: 'engleGranger, x',
      expected: `at most ${MOST_PREDICTORS} columns`,
      received: `${nSeries - 1}`,
      hint: 'The published distributions end at six series, y among them.',
    });
  }
  const trend = deterministic === 'trend' ? [response.map((_, t) => t + 1)] : [];
  const line = leastSquares({ columns: [...columns, ...trend], y: response, caller: 'engleGranger' });
  refuseExactFit('engleGranger', line.residualSumOfSquares, sumOfProducts(response, response));
  const { statistic, nObs } = dickeyFullerT('engleGranger', line.residuals, lags, 'none');
  return {
    statistic,
    p: mackinnonP(statistic, deterministic, nSeries),
    nObs,
    nSeries,
    critical: mackinnonCritical(deterministic, nObs, nSeries),
    caveats: gapsClosedUp('engleGranger', years, response.length, 'The differences of the residuals'),
  };
}
