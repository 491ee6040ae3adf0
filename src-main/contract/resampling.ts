import { z } from 'zod';
import { column, rowYears } from './line-estimators.ts';
import { caveat } from './primitives.ts';

export const blockBootstrapInput = z.object({
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

export const blockBootstrapValue = z.object({
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
