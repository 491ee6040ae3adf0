import type { GlsAr1Input, GlsAr1Value } from '../contract/line-estimators.ts';
import { ar1LogLikelihood } from './ar1-log-likelihood.ts';
import { cochraneOrcutt } from './cochrane-orcutt.ts';
import { designColumns } from './design-columns.ts';
import { glsAr1 } from './gls-ar1.ts';
import { praisWinsten } from './prais-winsten.ts';
import { gapsClosedUp, yearSteps } from './year-steps.ts';

/**
 * The line with AR(1) errors by the named estimator.
 *
 * Model    y = Xb + e, e_t = ρ e_{t−1} + u_t; ml and reml as `glsAr1`, the others as `praisWinsten` and
 *          `cochraneOrcutt`
 * Assumes  rows in order of time, equally spaced. Where `years` shows gaps ml and reml count the calendar distance;
 *          prais-winsten and cochrane-orcutt close the gaps up, with the caveat gaps-closed-up
 *
 * @returns  sigma of the innovations u; logLikelihood restricted for reml, otherwise of all rows at the estimate, so
 *           that of prais-winsten and cochrane-orcutt is at most that of ml
 * @throws   as `glsAr1`, `praisWinsten` and `cochraneOrcutt`
 *
 * Checked  test/reference/statistics/ar1-line.test.ts (B: R)
 */
export function ar1Line({ x, y, intercept, estimator, years }: GlsAr1Input): GlsAr1Value {
  if (estimator === 'ml' || estimator === 'reml') return glsAr1({ x, y, intercept, estimator, years });
  const steps = yearSteps('ar1Line', years, y.length);
  const request = { x, y, intercept };
  const isPraisWinsten = estimator === 'prais-winsten';
  const fit = isPraisWinsten ? { ...praisWinsten(request), caveats: [] } : cochraneOrcutt(request);
  const { coefficients, standardErrors, rho, residualStandardDeviation: sigma } = fit;
  const columns = designColumns('ar1Line', x, y.length, intercept);
  const errors = y.map(
    (value, t) => value - columns.reduce((sum, c, j) => sum + (coefficients[j] ?? NaN) * (c[t] ?? NaN), 0),
  );
  return {
    coefficients,
    standardErrors,
    rho,
    sigma,
    logLikelihood: ar1LogLikelihood(errors, rho, steps),
    caveats: [
      ...fit.caveats,
      ...gapsClosedUp('ar1Line', years, y.length, `${isPraisWinsten ? 'Prais–Winsten' : 'Cochrane–Orcutt'} estimates`),
    ],
  };
}
