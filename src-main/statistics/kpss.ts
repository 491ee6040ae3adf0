import type { Caveat } from '../contract/primitives.ts';
import { refuseExactFit } from './exact-fit.ts';
import { finiteNumber, finiteValues } from './finite-values.ts';
import { leastSquares } from './least-squares.ts';
import { sum, sumOfProducts } from './summation.ts';
import { gapsClosedUp } from './year-steps.ts';

export interface KpssRequest {
  y: ArrayLike<number>;
  /** Bartlett lags of the long-run variance. */
  lags: number;
  /** What the series returns to under the null hypothesis: a level or a linear trend. */
  deterministic: 'constant' | 'trend';
  /** [nObs] whole, increasing: with a gap among them, a caveat. Without them rows are consecutive. */
  years?: ArrayLike<number> | undefined;
}

export interface KpssTest {
  statistic: number;
  /** Between 0.01 and 0.10, interpolated; the nearer end beyond them, with a caveat. */
  p: number;
  critical: { '10%': number; '5%': number; '2.5%': number; '1%': number };
  caveats: Caveat[];
}

/** Kwiatkowski et al. 1992, table 1. */
const CRITICAL = {
  constant: { '10%': 0.347, '5%': 0.463, '2.5%': 0.574, '1%': 0.739 },
  trend: { '10%': 0.119, '5%': 0.146, '2.5%': 0.176, '1%': 0.216 },
} as const;

/**
 * KPSS test: does a series return to a level or a trend (the null hypothesis), or wander like a random walk? The
 * opposite question to the Dickey–Fuller test: a series can pass or fail both.
 *
 * Model    Σ S_t² / (n² s²), S_t the partial sums of the residuals e from the level or trend,
 *          s² = [Σ e² + 2 Σ_{j=1…L} (1 − j/(L + 1)) Σ_t e_t e_{t−j}]/n
 * Assumes  values in order of time, equally spaced, without gaps
 *
 * @param y     [nObs] finite
 * @param lags  L, 0 … n − 1; with strongly correlated data too few lags reject too often, too many too seldom
 * @returns  p interpolated linearly between the four published critical values; caveats p-outside-table,
 *           gaps-closed-up
 * @throws   InputError too-few-values, not-finite, out-of-range, unordered-years; NumericError exact-fit
 *
 * Differs  R's tseries::kpss.test: same statistic, lags by a rule of its own; statsmodels' "auto" lags by Hobijn et al.
 * Source   Kwiatkowski, Phillips, Schmidt & Shin 1992, J. Econometrics 54, 159–178, equations 11 and 13, table 1
 * Checked  test/reference/statistics/unit-root.test.ts (B: base R; A: table 1; a figure printed by statsmodels)
 */
export function kpss({ y, lags, deterministic, years }: KpssRequest): KpssTest {
  const series = finiteValues('kpss', 'y', y, { atLeast: 4 });
  const n = series.length;
  finiteNumber('kpss', 'lags', lags, {
    isWhole: true,
    atLeast: 0,
    atMost: n - 1,
    hint: 'Take fewer lags or a longer series.',
  });
  const columns = [series.map(() => 1), ...(deterministic === 'trend' ? [series.map((_, t) => t + 1)] : [])];
  const { residuals: e, residualSumOfSquares } = leastSquares({ columns, y: series, caller: 'kpss' });
  refuseExactFit('kpss', residualSumOfSquares, sumOfProducts(series, series));
  let longRun = residualSumOfSquares;
  for (let j = 1; j <= lags; j++) {
    longRun += 2 * (1 - j / (lags + 1)) * sumOfProducts(e.subarray(j), e.subarray(0, -j));
  }
  let partial = 0;
  const squares = e.map((value) => (partial += value) ** 2);
  const statistic = sum(squares) / (n * longRun);
  const critical = CRITICAL[deterministic];
  const { p, caveats } = interpolatedP(statistic, critical);
  const closedUp = gapsClosedUp('kpss', years, n, 'The partial sums and lags');
  return { statistic, critical, p, caveats: [...caveats, ...closedUp] };
}

function interpolatedP(statistic: number, critical: KpssTest['critical']): Pick<KpssTest, 'p' | 'caveats'> {
  const points = [
    [critical['10%'], 0.1],
    [critical['5%'], 0.05],
    [critical['2.5%'], 0.025],
    [critical['1%'], 0.01],
  ] as const;
  const outside = (p: number, words: string) => ({
    p,
    caveats: [{ code: 'p-outside-table', detail: `The published table ends at p = ${p}: the true p is ${words}.` }],
  });
  if (statistic < points[0][0]) return outside(0.1, 'larger');
  for (let i = 1; i < points.length; i++) {
    const [low, pLow] = points[i - 1]!;
    const [high, pHigh] = points[i]!;
    if (statistic <= high) return { p: pLow + ((statistic - low) / (high - low)) * (pHigh - pLow), caveats: [] };
  }
  return outside(0.01, 'smaller');
}
