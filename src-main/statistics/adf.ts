import type { Caveat } from '../contract/primitives.ts';
import { dickeyFullerT } from './dickey-fuller-t.ts';
import type { Deterministic } from './mackinnon-tables.ts';
import { mackinnonCritical, mackinnonP, type CriticalValues } from './mackinnon.ts';
import { varyingValues } from './varying-values.ts';
import { gapsClosedUp } from './year-steps.ts';

export interface AdfRequest {
  y: ArrayLike<number>;
  /** Lagged differences that soak up serial correlation. */
  lags: number;
  deterministic: Deterministic;
  /** [nObs] whole, increasing: with a gap among them, a caveat. Without them rows are consecutive. */
  years?: ArrayLike<number> | undefined;
}

export interface AdfTest {
  /** t of γ. */
  statistic: number;
  p: number;
  /** Rows of the test regression. */
  nObs: number;
  critical: CriticalValues;
  caveats: Caveat[];
}

/**
 * Augmented Dickey–Fuller test: does a series wander like a random walk (the null hypothesis), or return to a level or a
 * trend?
 *
 * Model    Δy_t = [c] + [d t] + γ y_{t−1} + δ_1 Δy_{t−1} + … + δ_L Δy_{t−L} + u_t; the statistic is the t of γ, whose
 *          distribution under γ = 0 is not Student's
 * Assumes  values in order of time, equally spaced, without gaps
 *
 * @param y     [nObs] finite, not all equal
 * @param lags  L, 0 or more; every lag costs a row
 * @returns  p after MacKinnon 1994 (asymptotic); critical values after MacKinnon 2010 at the rows used;
 *           caveat gaps-closed-up
 * @throws   InputError too-few-values, not-finite, out-of-range, unordered-years; NumericError constant, rank-deficient, exact-fit
 *
 * Differs  R's tseries::adf.test always has a trend and interpolates p in a table; statsmodels' adfuller chooses the lags
 *          itself unless autolag=None
 * Source   Dickey & Fuller 1979, J. Am. Stat. Assoc. 74, 427–431; Said & Dickey 1984, Biometrika 71, 599–607
 * Checked  test/reference/statistics/unit-root.test.ts (B: base R)
 */
export function adf({ y, lags, deterministic, years }: AdfRequest): AdfTest {
  const series = varyingValues('adf', 'y', y, { atLeast: 6 });
  const { statistic, nObs } = dickeyFullerT('adf', series, lags, deterministic);
  return {
    statistic,
    p: mackinnonP(statistic, deterministic),
    nObs,
    critical: mackinnonCritical(deterministic, nObs),
    caveats: gapsClosedUp('adf', years, series.length, 'The differences'),
  };
}
