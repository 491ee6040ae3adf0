import { z } from 'zod';
import { column, predictors, rowYears } from './line-estimators.ts';
import { caveat } from './primitives.ts';

const lags = z.int().min(0);
const chiSquared = z.object({ statistic: z.number(), df: z.int(), p: z.number() });
const caveats = z.array(caveat);

const residualTestsInput = z.object({
  x: predictors,
  y: column,
  intercept: z.boolean(),
  /** How far back Breusch–Godfrey and Ljung–Box look. */
  lags: z.int().min(1),
  /** Fitted ARMA coefficients that Ljung–Box takes off its degrees of freedom; 0 unless given. */
  fitdf: lags.optional(),
  /** Koenker's studentised Breusch–Pagan test unless the original one is asked for. */
  breuschPaganKind: z.enum(['studentised', 'original']).optional(),
  years: rowYears.optional(),
});
export type ResidualTestsInput = z.infer<typeof residualTestsInput>;

const residualTestsValue = z.object({
  /** Lag-one correlation of the residuals, demeaned. */
  lag1: z.number(),
  /** n (1 − r)/(1 + r), Santer et al. 2000. */
  nEff: z.number(),
  durbinWatson: z.number(),
  /** Exact for this design, one-sided against likeness, with the bounds of the 5 % test; null beyond 400 rows. */
  durbinWatsonTest: z
    .object({ p: z.number(), bounds5Percent: z.object({ lower: z.number(), upper: z.number() }) })
    .nullable(),
  breuschGodfrey: chiSquared,
  ljungBox: chiSquared,
  jarqueBera: chiSquared.extend({ skewness: z.number(), kurtosis: z.number() }),
  breuschPagan: chiSquared.extend({ kind: z.enum(['studentised', 'original']) }),
  caveats,
});
export type ResidualTestsValue = z.infer<typeof residualTestsValue>;

const effectiveSampleSizeInput = z.object({
  /** Residuals of a fit, or a series without trend. */
  values: column,
  /** How far back the definition looks that takes the autocorrelations as they are. */
  lags: z.int().min(1),
  years: rowYears.optional(),
});
export type EffectiveSampleSizeInput = z.infer<typeof effectiveSampleSizeInput>;

const effectiveSampleSizeValue = z.object({
  nObs: z.int(),
  /** Lag-one correlation, demeaned. */
  lag1: z.number(),
  /** n (1 − r)/(1 + r): of a mean or a trend in a long record. */
  santer2000: z.number(),
  /** n / [1 + 2 Σ (1 − k/n) r^k] over all lags: of the mean of an AR(1) process. */
  ar1Mean: z.number(),
  /** n / [1 + 2 Σ (1 − k/n) r_k] up to the given lags; null where the sum is not positive. */
  bayleyHammersley1946: z.number().nullable(),
  /** n (1 − r − 0.68/√n)/(1 + r + 0.68/√n): of a trend in a short record; null where r + 0.68/√n reaches 1. */
  nychka2000: z.number().nullable(),
  caveats,
});
export type EffectiveSampleSizeValue = z.infer<typeof effectiveSampleSizeValue>;

const adfInput = z.object({
  y: column,
  lags,
  deterministic: z.enum(['none', 'constant', 'trend']),
  years: rowYears.optional(),
});

const adfValue = z.object({
  statistic: z.number(),
  /** After MacKinnon 1994, asymptotic. */
  p: z.number(),
  /** Rows of the test regression. */
  nObs: z.int(),
  /** After MacKinnon 2010, at these rows. */
  critical: z.object({ '1%': z.number(), '5%': z.number(), '10%': z.number() }),
  caveats,
});

const engleGrangerInput = z.object({
  y: column,
  x: predictors,
  lags,
  deterministic: z.enum(['constant', 'trend']),
  years: rowYears.optional(),
});

const engleGrangerValue = adfValue.extend({
  /** Series taken together, y among them. */
  nSeries: z.int(),
});

const kpssInput = z.object({
  y: column,
  lags,
  deterministic: z.enum(['constant', 'trend']),
  years: rowYears.optional(),
});

const kpssValue = z.object({
  statistic: z.number(),
  /** Between 0.01 and 0.10; the nearer end outside the published table, with a caveat. */
  p: z.number(),
  critical: z.object({ '10%': z.number(), '5%': z.number(), '2.5%': z.number(), '1%': z.number() }),
  caveats,
});

/** Tests of a series in time, and of what a line leaves over. */
export const seriesTestMethods = {
  'effective-sample-size': { input: effectiveSampleSizeInput, value: effectiveSampleSizeValue },
  'residual-tests': { input: residualTestsInput, value: residualTestsValue },
  adf: { input: adfInput, value: adfValue },
  kpss: { input: kpssInput, value: kpssValue },
  'engle-granger': { input: engleGrangerInput, value: engleGrangerValue },
} as const;
