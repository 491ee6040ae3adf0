import { z } from 'zod';
import { evidence, statement, tolerance } from './claim.ts';
import { anchor, procedure, slopeCovariance } from './procedure.ts';
import { carbonMethods } from './carbon.ts';
import { energyBudgetAnswer, energyBudgetRequest } from './energy-budget.ts';
import { climateResponseMethods } from './climate-response.ts';
import { estimatorComparison } from './estimator-comparison.ts';
import { forcingMethods } from './forcing.ts';
import { column, lineMethods, predictors, rowYears } from './line-estimators.ts';
import { year } from './primitives.ts';
import { resamplingMethods } from './resampling.ts';
import {
  assumptionsAnswer,
  claimSweep,
  derivationAnswer,
  recomputation,
  regressionAnswer,
  windowSweep,
} from './result.ts';
import { seriesData } from './series.ts';
import { seriesTestMethods } from './series-tests.ts';
import { specificationTestMethods } from './specification-tests.ts';

const covariance = z.object({
  kind: z.enum(['classical', 'hc0', 'hc1', 'hc2', 'hc3', 'newey-west']),
  /** Newey–West only: rows, or the automatic choice of Newey & West 1994 for Bartlett weights. */
  lag: z.union([z.int().min(0), z.literal('newey-west-1994')]).optional(),
  /** Newey–West only: a VAR(1) of the scores, without a limit on its singular values; none unless given. */
  prewhiten: z.literal('var1').optional(),
  smallSample: z.boolean().optional(),
});
const seed = z.int().min(0).max(4_294_967_295);

export const regressionRequest = z.object({
  x: predictors,
  y: column,
  intercept: z.boolean(),
  weights: column.optional(),
  covariance,
  years: rowYears.optional(),
});
export type RegressionRequest = z.infer<typeof regressionRequest>;

export const windowSweepRequest = z
  .object({
    years: z.array(year),
    x: column.optional(),
    co2Ppm: column.optional(),
    y: column,
    minYears: z.int().min(3),
    intercept: z.boolean(),
    anchor,
    covariance: slopeCovariance.optional(),
  })
  .refine(({ x, co2Ppm }) => (x === undefined) !== (co2Ppm === undefined), { error: 'give either x or co2Ppm' });
export type WindowSweepRequest = z.infer<typeof windowSweepRequest>;

export const derivationRequest = z.object({ lines: z.array(z.string().max(500)).max(100) });

/** Everything that a claim's own computations start from, with the values of its series in place of their numbers. */
export const claimComputation = z.object({
  statement,
  procedure,
  tolerance,
  seed,
  /** Series by the name of the procedure's or the evidence's field. */
  series: z.partialRecord(
    z.enum(['temperatureSeriesId', 'co2SeriesId', 'seriesId', 'totalForcingSeriesId', 'co2ForcingSeriesId']),
    seriesData,
  ),
  evidence: evidence.omit({ totalForcingSeriesId: true, co2ForcingSeriesId: true }),
});
export type ClaimComputation = z.infer<typeof claimComputation>;

export const claimSweepRequest = claimComputation.extend({ minYears: z.int().min(3) });
export type ClaimSweepRequest = z.infer<typeof claimSweepRequest>;

/** Every method that `footing compute` and the stored results can name. */
export const computeMethods = {
  regression: { input: regressionRequest, value: regressionAnswer },
  ...lineMethods,
  ...seriesTestMethods,
  ...specificationTestMethods,
  ...resamplingMethods,
  ...climateResponseMethods,
  'window-sweep': { input: windowSweepRequest, value: windowSweep },
  ...forcingMethods,
  ...carbonMethods,
  'energy-budget': { input: energyBudgetRequest, value: energyBudgetAnswer },
  derivation: { input: derivationRequest, value: derivationAnswer },
  recomputation: { input: claimComputation, value: recomputation },
  assumptions: { input: claimComputation, value: assumptionsAnswer },
  'claim-sweep': { input: claimSweepRequest, value: claimSweep },
  estimators: { input: claimComputation, value: estimatorComparison },
} as const;
export type ComputeMethod = keyof typeof computeMethods;
export type ComputeInput<Method extends ComputeMethod> = z.infer<(typeof computeMethods)[Method]['input']>;
export type ComputeValue<Method extends ComputeMethod> = z.infer<(typeof computeMethods)[Method]['value']>;
