import tQuantile from '@stdlib/stats-base-dists-t-quantile';
import type { RegressionRequest } from '../contract/compute.ts';
import type { RegressionAnswer } from '../contract/result.ts';
import { InputError } from '../errors.ts';
import { coefficientCovariance } from './coefficient-covariance.ts';
import { designColumns } from './design-columns.ts';
import { durbinWatson } from './durbin-watson.ts';
import { isExactFit } from './exact-fit.ts';
import { LEVERAGE_OF_ONE, leastSquares, type LeastSquaresFit } from './least-squares.ts';
import { regressionCaveats } from './regression-caveats.ts';
import { sum, sumOfProducts } from './summation.ts';
import { twoSidedP } from './two-sided-p.ts';
import { upperTailF } from './upper-tail-f.ts';
import { gapsClosedUp } from './year-steps.ts';

/**
 * Linear regression: the line (or plane) closest to y in squared distance, with its uncertainty and diagnostics.
 *
 * Model    y = Xb + e; the first column of X is 1 when there is an intercept; var(e_i) = σ²/w_i with weights w
 * Assumes  rows in order of time for newey-west and Durbin–Watson; nothing else is used of the order
 *
 * @param x        [nObs] or nPredictors × [nObs], finite, any unit
 * @param y        [nObs] finite
 * @param weights  [nObs] above 0; inverse error variances up to a common factor
 * @param years    [nObs] whole, increasing: with a gap among them newey-west counts the calendar, with the caveat
 *                 gaps-by-calendar; Durbin–Watson does not, with the caveat gaps-closed-up
 * @param covariance  of the coefficients; for newey-west alone: lag, a number of rows or newey-west-1994 to have it chosen
 *                 from the data; prewhiten, by a VAR(1); smallSample (false unless given) multiplies by n/(n − k)
 * @returns  arrays in the order intercept, predictors. With k coefficients:
 *           t distribution with n − k degrees of freedom for p and the 95 % intervals, whatever the covariance;
 *           R² centred 1 − RSS/Σw(y − ȳ)² and uncentred 1 − RSS/Σwy², both always; adjusted R² is 1 − (1 − R²)(n − 1)/(n − k)
 *           of the centred R² with an intercept, 1 − (1 − R²)n/(n − k) of the uncentred one without;
 *           F from sums of squares under classical assumptions, whatever the covariance: against the mean alone with an
 *           intercept, against zero without; log-likelihood of normal errors at σ² = RSS/n;
 *           AIC = −2 logL + 2k, BIC = −2 logL + k log n; Durbin–Watson of √w·e; Cook's distance with classical σ².
 *           chosenLag where the lag was chosen from the data, with the caveat automatic-lag.
 *           null stands for what does not exist (exact fit, constant y, a row with leverage 1), with a caveat
 * @throws   InputError wrong-length, not-finite, too-few-observations, lag-missing, option-unused, gap-in-years,
 *           out-of-range; NumericError rank-deficient, ill-conditioned, leverage-of-one, and for a chosen lag or
 *           prewhitening exact-fit, no-automatic-lag, not-stationary
 *
 * Differs  R's AIC and BIC count σ as a coefficient: larger by 2 and by log n. Without an intercept, R's and
 *          statsmodels' "R²" is the uncentred one. statsmodels' F under a robust covariance is a Wald test
 * Source   Draper & Smith 1998, Applied Regression Analysis; Kvålseth 1985, Am. Stat. 39, 279–285 (both R²);
 *          Cook 1977, Technometrics 19, 15–18
 * Checked  test/reference/statistics/nist-regression.test.ts (A: certified values), lm-live.test.ts (B: R)
 */
export function regression({ x, y, intercept, weights, covariance, years }: RegressionRequest): RegressionAnswer {
  const fit = leastSquares({
    columns: designColumns('regression', x, y.length, intercept),
    y,
    weights,
    caller: 'regression',
  });
  const { nObs, nCoefficients, residualSumOfSquares } = fit;
  const degreesOfFreedom = nObs - nCoefficients;
  if (degreesOfFreedom < 1) {
    throw new InputError({
      code: 'too-few-observations',
      where: 'regression',
      expected: `more than ${nCoefficients} rows for ${nCoefficients} coefficients`,
      received: `${nObs}`,
      hint: 'Take a longer window or fewer predictors.',
    });
  }

  const squares = sumsOfSquares(fit);
  const isExact = isExactFit(residualSumOfSquares, squares.aboutZero);
  const isConstant = isExactFit(squares.aboutMean, squares.aboutZero);
  const { matrix, lag, caveats } = coefficientCovariance(fit, { covariance, hasIntercept: intercept, years });
  const covarianceMatrix = squareRows(matrix, nCoefficients);
  const coefficients = [...fit.coefficients];
  const standardErrors = coefficients.map((_, j) => Math.sqrt(covarianceMatrix[j]![j]!));
  const t = coefficients.map((value, j) => (isExact || standardErrors[j] === 0 ? null : value / standardErrors[j]!));
  const halfWidth = tQuantile(0.975, degreesOfFreedom);

  const rSquaredCentred = isConstant ? null : 1 - residualSumOfSquares / squares.aboutMean;
  const rSquaredUncentred = squares.aboutZero === 0 ? null : 1 - residualSumOfSquares / squares.aboutZero;
  const rSquared = intercept ? rSquaredCentred : rSquaredUncentred;
  const totalDegrees = intercept ? nObs - 1 : nObs;

  const nTested = intercept ? nCoefficients - 1 : nCoefficients;
  const explained = (intercept ? squares.aboutMean : squares.aboutZero) - residualSumOfSquares;
  const fStatistic = isExact ? null : Math.max(0, explained) / nTested / (residualSumOfSquares / degreesOfFreedom);
  const logLikelihood = isExact ? null : normalLogLikelihood(fit);

  return {
    coefficients,
    standardErrors,
    t,
    p: t.map((value) => (value === null ? null : twoSidedP(value, degreesOfFreedom))),
    confidence95: coefficients.map((value, j) => [
      value - halfWidth * standardErrors[j]!,
      value + halfWidth * standardErrors[j]!,
    ]),
    covarianceMatrix,
    rSquaredCentred,
    rSquaredUncentred,
    adjustedRSquared: rSquared === null ? null : 1 - ((1 - rSquared) * totalDegrees) / degreesOfFreedom,
    residualStandardDeviation: Math.sqrt(residualSumOfSquares / degreesOfFreedom),
    degreesOfFreedom,
    fStatistic,
    fP: fStatistic === null ? null : upperTailF(fStatistic, nTested, degreesOfFreedom),
    logLikelihood,
    aic: logLikelihood === null ? null : -2 * logLikelihood + 2 * nCoefficients,
    bic: logLikelihood === null ? null : -2 * logLikelihood + Math.log(nObs) * nCoefficients,
    durbinWatson: isExact ? null : durbinWatson(fit.residuals.map((e, i) => e * Math.sqrt(fit.weights?.[i] ?? 1))),
    residuals: [...fit.residuals],
    fitted: [...fit.fitted],
    leverage: [...fit.leverage],
    cooksDistance: isExact ? Array<null>(nObs).fill(null) : cooksDistance(fit, residualSumOfSquares / degreesOfFreedom),
    ...(covariance.lag === 'newey-west-1994' && lag !== null ? { chosenLag: lag } : {}),
    caveats: [
      ...regressionCaveats({ fit, hasIntercept: intercept, kind: covariance.kind, lag, isExact, isConstant }),
      ...caveats,
      ...gapsClosedUp('regression', years, nObs, 'Terms of Durbin–Watson'),
    ],
  };
}

function squareRows(flat: Float64Array, k: number): number[][] {
  return Array.from({ length: k }, (_, j) => [...flat.subarray(j * k, (j + 1) * k)]);
}

/** Σ w·y² and Σ w·(y − ȳ)², ȳ the weighted mean. */
function sumsOfSquares({ y, weights }: LeastSquaresFit): { aboutZero: number; aboutMean: number } {
  const ones = weights ?? new Float64Array(y.length).fill(1);
  const centre = sumOfProducts(y, ones) / sum(ones);
  const aboutCentre = (c: number) => sum(y.map((value, i) => ones[i]! * (value - c) ** 2));
  return { aboutZero: aboutCentre(0), aboutMean: aboutCentre(centre) };
}

function normalLogLikelihood({ nObs, residualSumOfSquares, weights }: LeastSquaresFit): number {
  const logWeights = weights ? sum(weights.map(Math.log)) : 0;
  return 0.5 * (logWeights - nObs * (Math.log(2 * Math.PI) + 1 + Math.log(residualSumOfSquares / nObs)));
}

function cooksDistance(fit: LeastSquaresFit, residualVariance: number): (number | null)[] {
  return Array.from(fit.residuals, (residual, i) => {
    const leverage = fit.leverage[i]!;
    if (leverage > LEVERAGE_OF_ONE) return null;
    const weightedSquare = residual ** 2 * (fit.weights?.[i] ?? 1);
    return (weightedSquare * leverage) / ((1 - leverage) ** 2 * residualVariance * fit.nCoefficients);
  });
}
