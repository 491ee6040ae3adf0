import type { LagTest } from './breusch-godfrey.ts';
import { deviations } from './deviations.ts';
import { finiteNumber } from './finite-values.ts';
import { sumOfProducts } from './summation.ts';
import { upperTailChiSquared } from './upper-tail-chi-squared.ts';

/**
 * Ljung–Box test: are the first autocorrelations of a series together larger than those of independent values?
 *
 * Model    Q = n(n + 2) Σ_{j=1…L} r_j²/(n − j), r_j the demeaned autocorrelation at lag j; chi-squared with L − fitdf
 *          degrees of freedom when the values are independent
 * Assumes  values in order of time, equally spaced
 *
 * @param values  [nObs] finite, not all equal
 * @param lags    L, 1 … n − 1
 * @param fitdf   number of ARMA coefficients fitted to the series; 0 for raw values or regression residuals
 * @throws   InputError out-of-range, not-finite; NumericError constant
 *
 * Differs  meant for raw series: for residuals of a regression use breuschGodfrey, which knows the predictors
 * Source   Ljung & Box 1978, Biometrika 65, 297–303
 * Checked  test/reference/statistics/serial-correlation.test.ts (B: R's Box.test)
 */
export function ljungBox(values: ArrayLike<number>, lags: number, fitdf = 0): LagTest {
  const e = deviations('ljungBox', 'values', values, { atLeast: 3 });
  const nObs = e.length;
  finiteNumber('ljungBox', 'lags', lags, {
    isWhole: true,
    atLeast: 1,
    atMost: nObs - 1,
    hint: 'Take fewer lags or a longer series.',
  });
  finiteNumber('ljungBox', 'fitdf', fitdf, { isWhole: true, atLeast: 0, atMost: lags - 1 });
  const squares = sumOfProducts(e, e);
  let total = 0;
  for (let j = 1; j <= lags; j++) {
    const r = sumOfProducts(e.subarray(j), e.subarray(0, -j)) / squares;
    total += r ** 2 / (nObs - j);
  }
  const statistic = nObs * (nObs + 2) * total;
  return { statistic, df: lags - fitdf, p: upperTailChiSquared(statistic, lags - fitdf) };
}
