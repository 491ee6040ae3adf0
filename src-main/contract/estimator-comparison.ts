import { z } from 'zod';
import { claimUnit } from './stated.ts';
import { caveat, interval, quantityId, year, yearSpan } from './primitives.ts';

export const estimatorId = z.enum([
  'ols-classical',
  'ols-hc3',
  'ols-newey-west',
  'ols-newey-west-1994',
  'ols-free-intercept',
  'gls-ar1-ml',
  'gls-ar1-reml',
  'prais-winsten',
  'cochrane-orcutt',
  'gls-arma11',
  'block-bootstrap',
  'theil-sen',
  'huber',
  'york',
  'york-scaled',
]);
export type EstimatorId = z.infer<typeof estimatorId>;

/** The claim's number as one estimator gives it, in the claim's unit, on the rows of the recomputation. */
export const estimatorEstimate = z.object({
  id: estimatorId,
  label: z.string(),
  value: z.number(),
  /** null: the estimator has none of its own; its interval stands without. */
  standardError: z.number().nullable(),
  /** null: the record is too short for one; a caveat says so. */
  interval95: interval.nullable(),
  /** What a reader needs to get the same number from another program. */
  convention: z.string(),
  /** What is estimated beside the line: ρ, σ, a scale. */
  parameters: z.array(z.object({ symbol: z.string(), value: z.number() })),
  /** What it takes for a step of time: nothing, the next row whatever its year, or a year of the calendar. */
  order: z.enum(['not used', 'rows', 'calendar']),
  /** Where random numbers were drawn; null elsewhere. */
  random: z.object({ generator: z.string(), seed: z.int(), nDraws: z.int() }).nullable(),
  /** True for what the claim's own procedure does. */
  isOwn: z.boolean(),
  caveats: z.array(caveat),
});
export type EstimatorEstimate = z.infer<typeof estimatorEstimate>;

/** One test of the residuals of the least-squares line. */
export const residualTest = z.object({
  id: z.enum(['durbin-watson', 'breusch-godfrey', 'ljung-box', 'breusch-pagan', 'jarque-bera']),
  label: z.string(),
  /** What a small p speaks against. */
  asks: z.string(),
  statistic: z.number(),
  df: z.int().nullable(),
  p: z.number().nullable(),
  convention: z.string(),
  caveats: z.array(caveat),
});
export type ResidualTest = z.infer<typeof residualTest>;

export const estimatorComparison = z.object({
  quantity: quantityId,
  unit: claimUnit,
  window: yearSpan,
  nObs: z.int(),
  stated: z.object({ value: z.number(), interval: z.object({ low: z.number(), high: z.number() }) }),
  estimates: z.array(estimatorEstimate),
  /** Estimators that have no answer here, each with the reason and the way out. */
  notComputed: z.array(z.object({ ids: z.array(estimatorId), labels: z.array(z.string()), reason: z.string() })),
  /** Years inside the window without a value, and which estimators count them as steps of time. */
  gaps: z.object({ years: z.array(year), sentence: z.string() }),
  residualTests: z.array(residualTest),
  /** Why there are no tests of the residuals; null when there are. */
  testsMissing: z.string().nullable(),
  /** Doubts about the rows, which bear on every estimate. */
  caveats: z.array(caveat),
});
export type EstimatorComparison = z.infer<typeof estimatorComparison>;
