import { z } from 'zod';
import { caveat, interval } from './primitives.ts';
import { rangedValue } from './uncertain-input.ts';

/** Normal, or split normal from a published range. */
const spread = z.union([z.object({ mean: z.number(), sd: z.number().min(0) }), rangedValue]);
export type Spread = z.infer<typeof spread>;

export const energyBudgetRequest = z.object({
  warmingK: spread,
  forcingWm2: spread,
  uptakeWm2: spread,
  doublingWm2: spread,
  /** α′: how much stronger the feedback of the record is than that of the settled climate, W/m² per K; none: not counted. */
  patternWm2PerK: spread.optional(),
  draws: z.int().min(100).max(10_000_000),
  seed: z.int().min(0).max(4_294_967_295),
  /** Correlation between the forcing change and the forcing of a doubling. */
  correlation: z.number().min(-1).max(1).optional(),
});
export type EnergyBudgetRequest = z.infer<typeof energyBudgetRequest>;

/** K per doubling; null: among the draws that count as unbounded above. */
const quantile = z.number().nullable();
const quantiles = z.object({ q05: quantile, q17: quantile, q50: quantile, q83: quantile, q95: quantile });

export const energyBudgetAnswer = z.object({
  effcs: quantiles,
  tcr: quantiles,
  /** With the pattern effect; null when none was given. */
  ecs: quantiles.nullable(),
  /** From the central inputs; null where the denominator is not positive. */
  central: z.object({ effcs: quantile, tcr: quantile, ecs: quantile, feedbackWm2PerK: z.number() }),
  /** Share of draws whose denominator ΔF − ΔN is not positive; counted as unbounded above. */
  shareUndefined: z.number(),
  shareUndefinedTcr: z.number(),
  shareUndefinedEcs: z.number().nullable(),
  /** Of the ratios F2x ΔT/(ΔF − ΔN) and F2x ΔT/ΔF; null where the denominator is zero. */
  fieller90: z.object({ effcs: interval.nullable(), tcr: interval.nullable() }),
  random: z.object({ generator: z.string(), seed: z.int(), nDraws: z.int() }),
  caveats: z.array(caveat),
});
export type EnergyBudgetAnswer = z.infer<typeof energyBudgetAnswer>;
