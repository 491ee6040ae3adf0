import { z } from 'zod';
import { column, predictors } from './line-estimators.ts';

const line = { x: predictors, y: column, intercept: z.boolean() };

/** A larger model against the smaller one that it holds. */
const fTest = z.object({
  statistic: z.number(),
  numeratorDegrees: z.int(),
  denominatorDegrees: z.int(),
  p: z.number(),
});

const resetInput = z.object({
  ...line,
  /** Powers of the fitted values that are tried: 2 to 5. */
  powers: z.array(z.int()).min(1).max(4),
});
const resetValue = fTest;

const chowInput = z.object({
  ...line,
  /** The first row of the second part, counted from 0; stated in advance, not found in the data. */
  breakRow: z.int().min(0),
});
const chowValue = fTest.extend({
  /** Coefficients of each part by itself. */
  before: z.array(z.number()),
  after: z.array(z.number()),
});

const cusumInput = z.object({
  ...line,
  levelPercent: z.union([z.literal(1), z.literal(5), z.literal(10)]),
});
const cusumValue = z.object({
  /** Row, counted from 0, of each point below. */
  rows: z.array(z.int()),
  recursiveResiduals: z.array(z.number()),
  cusum: z.array(z.number()),
  /** The boundary is this far above and below zero. */
  bound: z.array(z.number()),
  /** First row at which the cumulated sum is outside; null when it never is. */
  firstOutside: z.int().nullable(),
  statistic: z.number(),
  p: z.number(),
  /** Coefficient of the last predictor from the rows up to and with each. */
  recursiveSlopes: z.array(z.number()),
});

/** Is one straight line enough? */
export const specificationTestMethods = {
  reset: { input: resetInput, value: resetValue },
  chow: { input: chowInput, value: chowValue },
  cusum: { input: cusumInput, value: cusumValue },
} as const;
