import type { LagTest } from './breusch-godfrey.ts';
import { refuseExactFit } from './exact-fit.ts';
import { finiteValues } from './finite-values.ts';
import { leastSquares } from './least-squares.ts';
import { mean, sum } from './summation.ts';
import { upperTailChiSquared } from './upper-tail-chi-squared.ts';

/** studentised: Koenker's, which also holds for errors that are not normal; original: Breusch and Pagan's, which does not. */
export type BreuschPaganKind = 'studentised' | 'original';

/**
 * Breusch–Pagan test: does the variance of the errors change along the predictors?
 *
 * Model    regress g_i = e_i²/(Σe²/n) on a constant and the predictors;
 *          studentised  n R², R² = 1 − Σ(g − ĝ)²/Σ(g − 1)²;  original  ½ Σ(ĝ − 1)²;
 *          chi-squared with as many degrees of freedom as predictors when the variance is constant
 * Assumes  uncorrelated errors; normal ones for original
 *
 * @param fit  columns and residuals of an unweighted least-squares fit
 * @param hasIntercept  whether the first column is one of ones; without a constant column one is added to the auxiliary
 *             regression, since a constant variance is what is tested
 * @returns  statistic 0 and p 1 with no degree of freedom when there is no predictor along which it could change
 * @throws   InputError wrong-length, not-finite, too-few-observations; NumericError exact-fit, rank-deficient
 *
 * Differs  lmtest::bptest is studentised unless told otherwise, Stata's estat hettest is original; for a line through the
 *          origin lmtest adds no constant
 * Source   Breusch & Pagan 1979, Econometrica 47, 1287–1294; Koenker 1981, J. Econometrics 17, 107–112
 * Checked  test/reference/statistics/residual-distribution.test.ts (B: base R)
 */
export function breuschPagan(
  fit: { columns: readonly ArrayLike<number>[]; residuals: ArrayLike<number> },
  hasIntercept: boolean,
  kind: BreuschPaganKind,
): LagTest {
  const e = finiteValues('breuschPagan', 'residuals', fit.residuals, { atLeast: 3 });
  const squares = e.map((value) => value ** 2);
  const variance = mean(squares);
  refuseExactFit('breuschPagan', variance);
  const g = squares.map((value) => value / variance);
  const hasConstant = hasIntercept || fit.columns.some(isConstant);
  const columns = hasConstant ? fit.columns : [g.map(() => 1), ...fit.columns];
  const df = columns.length - 1;
  if (df === 0) return { statistic: 0, df, p: 1 };
  const auxiliary = leastSquares({ columns, y: g, caller: 'breuschPagan' });
  const explained = sum(auxiliary.fitted.map((value) => (value - 1) ** 2));
  const total = sum(g.map((value) => (value - 1) ** 2));
  const statistic = kind === 'original' ? explained / 2 : total === 0 ? 0 : (e.length * explained) / total;
  return { statistic, df, p: upperTailChiSquared(statistic, df) };
}

function isConstant(column: ArrayLike<number>): boolean {
  return column[0] !== 0 && Array.from(column).every((value) => value === column[0]);
}
