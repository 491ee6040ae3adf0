import { z } from 'zod';
import { column, predictors, rowYears } from './line-estimators.ts';
import { caveat } from './primitives.ts';

const blockBootstrapInput = z.object({
  x: column,
  y: column,
  intercept: z.boolean(),
  /** Rows in a block. */
  blockLength: z.int().min(1),
  draws: z.int().min(100).max(1_000_000),
  seed: z.int().min(0).max(4_294_967_295),
  /** What the blocks are made of: rows (x, y), or residuals put back on the line; pairs unless given. */
  resample: z.enum(['pairs', 'residuals']).optional(),
  years: rowYears.optional(),
});
export type BlockBootstrapInput = z.infer<typeof blockBootstrapInput>;

const blockBootstrapValue = z.object({
  /** Of the record as it is. */
  slope: z.number(),
  /** Of the slopes of the new records; type 7. */
  quantiles: z.object({ q025: z.number(), q05: z.number(), q50: z.number(), q95: z.number(), q975: z.number() }),
  /** Their standard deviation. */
  standardError: z.number(),
  resample: z.enum(['pairs', 'residuals']),
  random: z.object({ generator: z.string(), seed: z.int(), nDraws: z.int() }),
  caveats: z.array(caveat),
});
export type BlockBootstrapValue = z.infer<typeof blockBootstrapValue>;

const leaveOneOutInput = z.object({
  x: predictors,
  y: column,
  intercept: z.boolean(),
  weights: column.optional(),
  /** Which coefficient, counted from 0 with the intercept first when there is one. */
  place: z.int().min(0),
});
export type LeaveOneOutInput = z.infer<typeof leaveOneOutInput>;

const leaveOneOutValue = z.object({
  /** By row left out; null where the row alone decides some coefficient, with a caveat. */
  coefficients: z.array(z.number().nullable()),
  mostInfluential: z.object({ row: z.int(), coefficient: z.number() }).nullable(),
  caveats: z.array(caveat),
});
export type LeaveOneOutValue = z.infer<typeof leaveOneOutValue>;

const phaseSurrogatesInput = z.object({
  values: column,
  draws: z.int().min(1).max(10_000),
  seed: z.int().min(0).max(4_294_967_295),
});
export type PhaseSurrogatesInput = z.infer<typeof phaseSurrogatesInput>;

const phaseSurrogatesValue = z.object({
  surrogates: z.array(z.array(z.number())),
  random: z.object({ generator: z.string(), seed: z.int(), nDraws: z.int() }),
});
export type PhaseSurrogatesValue = z.infer<typeof phaseSurrogatesValue>;

/** The record put together anew, or with a row left out. */
export const resamplingMethods = {
  'block-bootstrap': { input: blockBootstrapInput, value: blockBootstrapValue },
  'leave-one-out': { input: leaveOneOutInput, value: leaveOneOutValue },
  'phase-surrogates': { input: phaseSurrogatesInput, value: phaseSurrogatesValue },
} as const;
