import type { SlopeCovariance } from '../../contract/procedure.ts';
import type { Caveat } from '../../contract/primitives.ts';
import type { FitDiagnostics, Recomputation, RegressionAnswer } from '../../contract/result.ts';
import { InputError } from '../../errors.ts';
import { correlation } from '../../statistics/correlation.ts';
import { effectiveSampleSize } from '../../statistics/effective-sample-size.ts';
import { lagOneAutocorrelation } from '../../statistics/lag-one-autocorrelation.ts';
import { neweyWestLag } from '../../statistics/newey-west-lag.ts';
import { regression } from '../../statistics/regression.ts';

type SlopeEstimate = NonNullable<Recomputation['fit']>['slopes'][number];

export interface SlopeEstimates {
  /** Under the asked covariance first, then under classical and Newey–West errors where that is another. */
  slopes: [SlopeEstimate, ...SlopeEstimate[]];
  intercept: { value: number; standardError: number } | null;
  /** Under the asked covariance. */
  regression: RegressionAnswer;
  diagnostics: FitDiagnostics;
  caveats: Caveat[];
}

export interface LineOptions {
  intercept: boolean;
  covariance: SlopeCovariance;
}

/**
 * The slope of y on x with its error under the asked covariance and, for comparison, under classical errors and under
 * Newey–West errors (lag by the rule of thumb unless one is asked for), each with its convention in words.
 *
 * @param x, y  [nObs] in order of time, at least three
 * @throws  InputError too-few-years, lag-too-long, and as `regression`; NumericError as `regression`
 */
export function slopeEstimates(
  x: readonly number[],
  y: readonly number[],
  { intercept, covariance }: LineOptions,
): SlopeEstimates {
  checkLength(y.length, covariance);
  const neweyWest: SlopeCovariance = { kind: 'newey-west', lag: neweyWestLag(y.length), smallSample: false };
  const comparison: SlopeCovariance = covariance.kind === 'classical' ? neweyWest : { kind: 'classical' };
  const asked = regression({ x: [...x], y: [...y], intercept, covariance });
  const other = regression({ x: [...x], y: [...y], intercept, covariance: comparison });
  const diagnostics = diagnosticsOf(x, y, asked);
  return {
    slopes: [slopeOf(asked, covariance, intercept), slopeOf(other, comparison, intercept)],
    intercept: intercept
      ? { value: asked.coefficients[0] ?? NaN, standardError: asked.standardErrors[0] ?? NaN }
      : null,
    regression: asked,
    diagnostics,
    caveats: [...asked.caveats, ...autocorrelationCaveats(diagnostics, covariance)],
  };
}

/** Two years always lie on a line, and a lag must find years to look back to. */
function checkLength(nYears: number, covariance: SlopeCovariance): void {
  if (nYears < 3) {
    throw new InputError({
      code: 'too-few-years',
      where: 'window',
      expected: 'at least 3 years that all series have',
      received: String(nYears),
      hint: 'Choose a longer window, or a lower number of months for an annual mean.',
    });
  }
  if (covariance.kind === 'newey-west' && covariance.lag >= nYears) {
    throw new InputError({
      code: 'lag-too-long',
      where: 'covariance, lag',
      expected: `a lag below the number of years, ${nYears}`,
      received: String(covariance.lag),
      hint: 'Choose a smaller lag or a longer window.',
    });
  }
}

function slopeOf(answer: RegressionAnswer, covariance: SlopeCovariance, hasIntercept: boolean): SlopeEstimate {
  const place = hasIntercept ? 1 : 0;
  const [low, high] = answer.confidence95[place] ?? [NaN, NaN];
  return {
    value: answer.coefficients[place] ?? NaN,
    standardError: answer.standardErrors[place] ?? NaN,
    interval95: { low, high, levelPercent: 95 },
    convention: `${covarianceWords(covariance)}; t with ${answer.degreesOfFreedom} degrees of freedom`,
  };
}

/** Everything that a reader needs to get the same standard error from another program. */
export function covarianceWords(covariance: SlopeCovariance): string {
  if (covariance.kind === 'classical') return 'classical: independent errors of one variance';
  const factor = covariance.smallSample ? 'with' : 'without';
  return `Newey–West: Bartlett weights, lag ${covariance.lag}, no prewhitening, ${factor} the factor n/(n − k)`;
}

function diagnosticsOf(x: readonly number[], y: readonly number[], answer: RegressionAnswer): FitDiagnostics {
  // An exact fit has residuals of rounding only, and a constant y no correlation: regression says so by null.
  const lag1 = answer.durbinWatson === null || y.length < 3 ? null : lagOneAutocorrelation(answer.residuals);
  return {
    nObs: y.length,
    rSquaredCentred: answer.rSquaredCentred,
    rSquaredUncentred: answer.rSquaredUncentred,
    correlation: answer.rSquaredCentred === null ? null : correlation(x, y),
    durbinWatson: answer.durbinWatson,
    lag1Autocorrelation: lag1,
    effectiveSampleSize: lag1 === null ? null : effectiveSampleSize(y.length, lag1),
    residualStandardDeviation: answer.residualStandardDeviation,
  };
}

function autocorrelationCaveats(
  { nObs, lag1Autocorrelation, effectiveSampleSize: nEffective }: FitDiagnostics,
  covariance: SlopeCovariance,
): Caveat[] {
  if (lag1Autocorrelation === null || nEffective === null || covariance.kind !== 'classical') return [];
  // Twice the standard error of r for independent errors, common practice.
  if (lag1Autocorrelation < 2 / Math.sqrt(nObs)) return [];
  const factor = Math.sqrt((1 + lag1Autocorrelation) / (1 - lag1Autocorrelation));
  return [
    {
      code: 'autocorrelated-residuals',
      detail: `Neighbouring residuals are alike (lag-one correlation ${lag1Autocorrelation.toFixed(2)}): ${nObs} years say as much as about ${nEffective.toFixed(0)} independent ones, and classical standard errors are too small by a factor of about ${factor.toFixed(1)}.`,
    },
  ];
}
