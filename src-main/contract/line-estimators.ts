import { z } from 'zod';
import { caveat, year } from './primitives.ts';

/** One value for each row, in order of time where the method asks for an order. */
export const column = z.array(z.number()).min(1).max(1_000_000);
/** One predictor, or several as columns. */
export const predictors = z.union([column, z.array(column).min(1).max(100)]);
/** One number for all rows, or one for each. */
export const oneOrEach = z.union([z.number(), column]);
const caveats = z.array(caveat);

/** Years of the rows, for a method that can say what a gap does to it, or predict across one. */
export const rowYears = z.array(year).min(1).max(1_000_000);

/** Coefficients of a line with their standard errors, the intercept first when there is one. */
const line = z.object({ coefficients: z.array(z.number()), standardErrors: z.array(z.number()) });

const glsAr1Input = z.object({
  x: predictors,
  y: column,
  intercept: z.boolean(),
  estimator: z.enum(['ml', 'reml', 'prais-winsten', 'cochrane-orcutt']),
  /** ml and reml then count calendar distances, the others say that they do not; without it rows are consecutive. */
  years: rowYears.optional(),
});
export type GlsAr1Input = z.infer<typeof glsAr1Input>;

const glsAr1Value = line.extend({
  /** Lag-one coefficient of the errors. */
  rho: z.number(),
  /** Standard deviation of the innovations: RSS* over n for ml, over n − k otherwise. */
  sigma: z.number(),
  /** Restricted for reml; of all rows for the others, so that those can be held against each other. */
  logLikelihood: z.number(),
  caveats,
});
export type GlsAr1Value = z.infer<typeof glsAr1Value>;

const glsArma11Input = z.object({
  x: predictors,
  y: column,
  intercept: z.boolean(),
  estimator: z.literal('ml'),
  /** Years without a row are predicted across; without `years` the rows are taken as consecutive. */
  years: rowYears.optional(),
});
export type GlsArma11Input = z.infer<typeof glsArma11Input>;

const glsArma11Value = line.extend({
  /** Of the error one step before. */
  phi: z.number(),
  /** Of the innovation one step before; the sign is that of e_t = φ e_(t−1) + u_t + θ u_(t−1). */
  theta: z.number(),
  /** Standard deviation of the innovations: √(RSS* /n). */
  sigma: z.number(),
  logLikelihood: z.number(),
  caveats,
});

const theilSenInput = z.object({ x: column, y: column });

const theilSenValue = z.object({
  slope: z.number(),
  /** Median of y less slope times median of x. */
  intercept: z.number(),
  /** Sen's interval; null when the series is too short for one, with a caveat. */
  confidence95: z.tuple([z.number(), z.number()]).nullable(),
  caveats,
});

const huberInput = z.object({
  x: predictors,
  y: column,
  intercept: z.boolean(),
  /** Residuals beyond k scales count only linearly; 1.345 keeps 95 % efficiency for normal errors. */
  k: z.number(),
});

const huberValue = line.extend({
  /** Median of |residual| over 0.6745. */
  scale: z.number(),
  /** By row: 1 where it counts in full. */
  weights: z.array(z.number()),
  nIterations: z.int(),
  caveats,
});

const yorkInput = z.object({
  x: column,
  y: column,
  /** Standard deviations of the errors, one for all rows or one for each. */
  sx: oneOrEach,
  sy: oneOrEach,
  /** Correlation of a row's two errors; 0 unless given. */
  r: oneOrEach.optional(),
});

const yorkValue = z.object({
  slope: z.number(),
  intercept: z.number(),
  /** From the stated errors alone, at the adjusted points (York et al. 2004). */
  slopeStandardError: z.number(),
  interceptStandardError: z.number(),
  /** Of slope and intercept. */
  covariance: z.number(),
  chiSquare: z.number(),
  /** χ²/(n − 2). */
  goodness: z.number(),
  /** The standard errors times √goodness. */
  scaledSlopeStandardError: z.number(),
  scaledInterceptStandardError: z.number(),
});

const demingInput = z.object({
  x: column,
  y: column,
  /** Variance of the errors of y over that of the errors of x; 1 gives the major axis. */
  delta: z.number(),
});

const demingValue = z.object({
  slope: z.number(),
  intercept: z.number(),
  /** By jackknife. */
  slopeStandardError: z.number(),
  interceptStandardError: z.number(),
  caveats,
});

const attenuationInput = z.object({
  x: column,
  y: column,
  /** Standard deviation of the errors of x, in the unit of x. */
  xErrorStandardDeviation: z.number(),
});

const attenuationValue = z.object({
  slope: z.number(),
  /** The share of the variance of x that is not error. */
  reliability: z.number(),
  correctedSlope: z.number(),
  /** The two regressions: y on x, and x on y turned round; null when x and y are uncorrelated. */
  bounds: z.object({ direct: z.number(), reverse: z.number().nullable() }),
  caveats,
});

/** Lines other than that of least squares. */
export const lineMethods = {
  'gls-ar1': { input: glsAr1Input, value: glsAr1Value },
  'gls-arma11': { input: glsArma11Input, value: glsArma11Value },
  'theil-sen': { input: theilSenInput, value: theilSenValue },
  huber: { input: huberInput, value: huberValue },
  york: { input: yorkInput, value: yorkValue },
  deming: { input: demingInput, value: demingValue },
  attenuation: { input: attenuationInput, value: attenuationValue },
} as const;
