import { refuseExactFit } from './exact-fit.ts';
import { finiteNumber, finiteValues } from './finite-values.ts';
import { leastSquares } from './least-squares.ts';
import { upperTailChiSquared } from './upper-tail-chi-squared.ts';
import { sumOfProducts } from './summation.ts';

export interface LagTest {
  statistic: number;
  /** Degrees of freedom of the chi-squared distribution. */
  df: number;
  p: number;
}

/**
 * Breusch–Godfrey test: are the residuals of a fit correlated with their own past, up to a stated lag? Unlike
 * Durbin–Watson it also holds without an intercept and beyond lag one.
 *
 * Model    regress e_t on x_t and e_{t−1} … e_{t−L}, residuals before the first taken as zero; the statistic is
 *          n Σê²/Σe², chi-squared with L degrees of freedom when there is no correlation. The design is the fit's own:
 *          no constant is added
 * Assumes  rows in order of time, equally spaced
 *
 * @param fit   columns and residuals of an unweighted least-squares fit
 * @param lags  L, 1 … n − k − 1
 * @throws   InputError out-of-range; NumericError exact-fit when all residuals are zero, rank-deficient
 *
 * Differs  lmtest::bgtest: same, with its defaults (type "Chisq", fill = 0)
 * Source   Breusch 1978, Aust. Econ. Pap. 17, 334–355; Godfrey 1978, Econometrica 46, 1293–1302
 * Checked  test/reference/statistics/serial-correlation.test.ts (B: base R)
 */
export function breuschGodfrey(
  fit: { columns: readonly ArrayLike<number>[]; residuals: ArrayLike<number> },
  lags: number,
): LagTest {
  const residuals = finiteValues('breuschGodfrey', 'residuals', fit.residuals, { atLeast: 3 });
  const nObs = residuals.length;
  finiteNumber('breuschGodfrey', 'lags', lags, {
    isWhole: true,
    atLeast: 1,
    atMost: nObs - fit.columns.length - 1,
    hint: 'Take fewer lags or a longer series.',
  });
  const squares = sumOfProducts(residuals, residuals);
  refuseExactFit('breuschGodfrey', squares);
  const lagged = Array.from({ length: lags }, (_, j) => residuals.map((_, t) => residuals[t - j - 1] ?? 0));
  const auxiliary = leastSquares({ columns: [...fit.columns, ...lagged], y: residuals, caller: 'breuschGodfrey' });
  const statistic = (nObs * sumOfProducts(auxiliary.fitted, auxiliary.fitted)) / squares;
  return { statistic, df: lags, p: upperTailChiSquared(statistic, lags) };
}
