import type { RegressionRequest } from '../contract/compute.ts';
import type { Caveat } from '../contract/primitives.ts';
import { InputError } from '../errors.ts';
import { heteroskedasticCovariance } from './heteroskedastic-covariance.ts';
import type { LeastSquaresFit } from './least-squares.ts';
import { neweyWestAutomaticLag, type AutomaticLag } from './newey-west-automatic-lag.ts';
import { neweyWest } from './newey-west.ts';
import { missingYears } from './year-steps.ts';

export interface CoefficientCovariance {
  /** [k × k] row by row. */
  matrix: Float64Array;
  /** Of Newey–West errors, as given or as chosen; null for others. */
  lag: number | null;
  /** What was chosen, or counted otherwise than row by row, in words. */
  caveats: Caveat[];
}

export interface CovarianceSetting {
  covariance: RegressionRequest['covariance'];
  hasIntercept: boolean;
  years: ArrayLike<number> | undefined;
}

/**
 * Covariance of a regression's coefficients under the asked assumptions on its errors.
 *
 * @returns  caveats automatic-lag, prewhitened, gaps-by-calendar
 * @throws   InputError lag-missing, option-unused; as `heteroskedasticCovariance`, `neweyWest`, `neweyWestAutomaticLag`
 *
 * Checked  test/unit/statistics/coefficient-covariance.test.ts (C); through `regression` (B)
 */
export function coefficientCovariance(
  fit: LeastSquaresFit,
  { covariance, hasIntercept, years }: CovarianceSetting,
): CoefficientCovariance {
  const { kind, lag, prewhiten, smallSample = false } = covariance;
  if (kind !== 'newey-west') {
    refuseUnused(covariance);
    return { matrix: plainCovariance(fit, kind), lag: null, caveats: [] };
  }
  if (lag === undefined) {
    throw new InputError({
      code: 'lag-missing',
      where: 'regression, covariance.lag',
      expected: 'a whole number of rows for newey-west, or newey-west-1994',
      received: 'none',
      hint: 'A common rule of thumb is floor(4 (n/100)^(2/9)); state the lag beside the figure.',
    });
  }
  const chosen = lag === 'newey-west-1994' ? neweyWestAutomaticLag(fit, { prewhiten, years, hasIntercept }) : null;
  const used = chosen?.lag ?? Number(lag);
  const caveats = [
    ...(chosen ? [automaticLag(chosen, hasIntercept)] : []),
    ...(prewhiten ? [prewhitened] : []),
    ...byCalendar(years, fit.nObs),
  ];
  return { matrix: neweyWest(fit, { lag: used, smallSample, prewhiten, years }), lag: used, caveats };
}

function plainCovariance(fit: LeastSquaresFit, kind: 'classical' | 'hc0' | 'hc1' | 'hc2' | 'hc3'): Float64Array {
  if (kind !== 'classical') return heteroskedasticCovariance(fit, kind);
  const residualVariance = fit.residualSumOfSquares / (fit.nObs - fit.nCoefficients);
  return fit.unscaledCovariance.map((value) => value * residualVariance);
}

/** Options of Newey–West errors would be passed over: whoever gives them takes the errors to allow for them. */
function refuseUnused({ kind, lag, smallSample, prewhiten }: RegressionRequest['covariance']): void {
  const given = Object.entries({ lag, smallSample: smallSample || undefined, prewhiten });
  const [unused] = given.filter(([, value]) => value !== undefined);
  if (!unused) return;
  throw new InputError({
    code: 'option-unused',
    where: `regression, covariance.${unused[0]}`,
    expected: `none for ${kind} errors`,
    received: String(unused[1]),
    hint: 'Ask for newey-west, or leave it out.',
  });
}

function automaticLag({ lag, preliminaryLag, gamma }: AutomaticLag, hasIntercept: boolean): Caveat {
  const constant = hasIntercept ? ' and 0 to that of the constant' : '';
  return {
    code: 'automatic-lag',
    detail: `Lag ${lag} was chosen from the data after Newey & West 1994 for Bartlett weights: floor(γ̂ T^(1/3)) with γ̂ = ${gamma.toPrecision(3)} from ${preliminaryLag} ${preliminaryLag === 1 ? 'autocovariance' : 'autocovariances'}, giving weight 1 to the score of each predictor${constant}.`,
  };
}

const prewhitened: Caveat = {
  code: 'prewhitened',
  detail:
    'The scores are prewhitened by a VAR(1), fitted by least squares without a limit on its singular values, and recoloured.',
};

function byCalendar(years: ArrayLike<number> | undefined, nObs: number): Caveat[] {
  const missing = missingYears('regression', years, nObs);
  if (missing === null) return [];
  return [
    {
      code: 'gaps-by-calendar',
      detail: `${missing} Newey–West errors take rows as lagged by j where their years differ by j (amplitude modulation). The other published way closes the gaps up (equal spacing): leave the years out for it.`,
    },
  ];
}
