import type { RegressionRequest } from '../contract/compute.ts';
import type { Caveat } from '../contract/primitives.ts';
import { LEVERAGE_OF_ONE, type LeastSquaresFit } from './least-squares.ts';
import { varianceInflation } from './variance-inflation.ts';

interface RegressionDoubts {
  fit: LeastSquaresFit;
  hasIntercept: boolean;
  kind: RegressionRequest['covariance']['kind'];
  /** Of Newey–West errors; null for others. */
  lag: number | null;
  isExact: boolean;
  isConstant: boolean;
}

/**
 * What a careful statistician would say beside a regression's figures. The bounds are common practice, except where a
 * source is named.
 *
 * Source   variance inflation above 10: Marquardt 1970, Technometrics 12, 591–612; leverage above 3k/n: Velleman &
 *          Welsch 1981, Am. Stat. 35, 234–242 (from memory)
 * Checked  test/unit/statistics/regression-caveats.test.ts, level C: each caveat on and off at its bound
 */
export function regressionCaveats({ fit, hasIntercept, kind, lag, isExact, isConstant }: RegressionDoubts): Caveat[] {
  const { nObs, nCoefficients, leverage } = fit;
  const caveats: Caveat[] = [];
  const add = (isDoubtful: boolean, code: string, detail: string) => {
    if (isDoubtful) caveats.push({ code, detail });
  };

  add(
    isExact,
    'exact-fit',
    'The fit is exact to rounding: t, p, F, likelihood, Durbin–Watson and Cook’s distance do not exist.',
  );
  add(isConstant, 'constant-response', 'y does not vary: the centred R² does not exist.');
  add(
    !hasIntercept,
    'no-intercept',
    'The line is forced through zero: the published Durbin–Watson bounds do not apply, and the uncentred R² does not compare with the centred one.',
  );
  add(
    nObs - nCoefficients < 10,
    'few-degrees-of-freedom',
    `Only ${nObs - nCoefficients} degrees of freedom: intervals rest on the errors being normal.`,
  );
  const bound = (3 * nCoefficients) / nObs;
  const high = Array.from(leverage.keys()).filter((row) => leverage[row]! > bound);
  const highest = high.reduce((most, row) => (leverage[row]! > leverage[most]! ? row : most), high[0] ?? 0);
  add(
    high.length > 0,
    'high-leverage',
    `${high.length} of ${nObs} rows with leverage above 3k/n = ${bound.toPrecision(3)}; the highest, row ${highest + 1}, has ${leverage[highest]!.toPrecision(3)}.`,
  );
  const alone = Array.from(leverage.keys()).filter((row) => leverage[row]! > LEVERAGE_OF_ONE);
  add(
    alone.length > 0,
    'leverage-of-one',
    `Some coefficient rests on one row alone (row ${alone.map((row) => row + 1).join(', ')}): the fit goes through it whatever its value, and its Cook’s distance does not exist.`,
  );
  const worst = Math.max(...varianceInflation(fit, hasIntercept));
  add(
    worst > 10,
    'collinear',
    `The predictors resemble each other: largest variance inflation factor ${worst.toPrecision(3)}, above 10. Their separate coefficients are poorly determined.`,
  );
  add(
    fit.pivotRatio < 1e-7,
    'ill-conditioned',
    `The columns are nearly dependent (pivot ratio ${fit.pivotRatio.toExponential(1)}): standard errors carry about ${Math.floor(15 + Math.log10(fit.pivotRatio))} digits.`,
  );

  add(
    lag !== null && (lag + 1) / nObs > 0.1,
    'short-series-for-lag',
    `${nObs} rows are few for lag ${lag}: Newey–West errors are then too small on average.`,
  );
  add(
    kind !== 'classical' && !isExact,
    'classical-f',
    'F and its p assume independent errors of one variance, unlike the standard errors beside them.',
  );
  return caveats;
}
