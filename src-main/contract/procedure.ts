import { z } from 'zod';
import { exchangeSource } from './carbon.ts';
import { forcingFormula } from './forcing.ts';
import { recordId, shortText, year, yearSpan } from './primitives.ts';
import { statedNumber } from './stated.ts';
import { uncertainInput } from './uncertain-input.ts';

// How a source gets its number. First those that fit a line to series, then those that work from a few figures.

export const anchor = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('first-year') }),
  z.object({ kind: z.literal('mean-of-first'), years: z.int().min(1).max(100) }),
]);
export type Anchor = z.infer<typeof anchor>;

export const slopeCovariance = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('classical') }),
  z.object({ kind: z.literal('newey-west'), lag: z.int().min(0).max(1000), smallSample: z.boolean() }),
]);
export type SlopeCovariance = z.infer<typeof slopeCovariance>;

/** How many of a year's twelve months must be there for an annual mean. */
const minMonths = z.int().min(1).max(12);

export const logRegressionProcedure = z.object({
  kind: z.literal('log-regression'),
  temperatureSeriesId: recordId,
  co2SeriesId: recordId,
  minMonths,
  /** null: all years that both series have. */
  window: yearSpan.nullable(),
  /** C0 and T0: the values in the first year of the window, or their means over its first years. */
  anchor,
  intercept: z.boolean(),
  covariance: slopeCovariance,
  conversion: z.enum(['per-doubling', 'per-e-folding']),
});
export type LogRegressionProcedure = z.infer<typeof logRegressionProcedure>;

export const trendProcedure = z.object({
  kind: z.literal('trend'),
  seriesId: recordId,
  minMonths,
  window: yearSpan.nullable(),
  covariance: slopeCovariance,
  per: z.enum(['decade', 'year']),
});
export type TrendProcedure = z.infer<typeof trendProcedure>;

/** The number is the slope of a line, or a multiple of it. */
export type LineProcedure = LogRegressionProcedure | TrendProcedure;

export function fitsLine(procedure: Procedure | null | undefined): procedure is LineProcedure {
  return procedure?.kind === 'log-regression' || procedure?.kind === 'trend';
}

export const ratioProcedure = z.object({
  kind: z.literal('ratio'),
  numerator: z.object({ value: statedNumber, unit: shortText }),
  denominator: z.object({ value: statedNumber, unit: shortText }),
});
export type RatioProcedure = z.infer<typeof ratioProcedure>;

const draws = z.int().min(1000).max(2_000_000);

export const energyBudgetProcedure = z.object({
  kind: z.literal('energy-budget'),
  estimate: z.enum(['effective-climate-sensitivity', 'transient-climate-response', 'equilibrium-climate-sensitivity']),
  /** Warming, forcing change, heat-uptake change between two periods, and the forcing of a CO2 doubling. */
  warmingK: uncertainInput,
  forcingWm2: uncertainInput,
  uptakeWm2: uncertainInput,
  doublingWm2: uncertainInput,
  /** α′, needed for the equilibrium. */
  patternWm2PerK: uncertainInput.nullable(),
  /** Between the forcing change and the forcing of a doubling. */
  correlation: z.number().min(-1).max(1),
  draws,
});
export type EnergyBudgetProcedure = z.infer<typeof energyBudgetProcedure>;

/** A concentration before and after, as figures or as the values of a series in two years. */
const figures = z.object({
  kind: z.literal('figures'),
  reference: z.number().positive(),
  value: z.number().positive(),
});
const twoYears = z.object({ kind: z.literal('series'), referenceYear: year, year });

export const forcingProcedure = z.object({
  kind: z.literal('forcing'),
  formula: forcingFormula,
  /** With the adjustments of AR6 for the troposphere; else stratospherically adjusted forcing. */
  isEffective: z.boolean(),
  co2Ppm: z.discriminatedUnion('kind', [figures, twoYears]),
  /** Where the concentrations of CO2 are taken from, if not from figures. */
  co2SeriesId: recordId.nullable(),
  /** Counted in the sum when given. */
  ch4Ppb: figures.nullable(),
  n2oPpb: figures.nullable(),
});
export type ForcingProcedure = z.infer<typeof forcingProcedure>;

export const feedbackProcedure = z.object({
  kind: z.literal('feedback'),
  /** S = F2x/λ, or λ = F2x/S. */
  gives: z.enum(['sensitivity', 'feedback']),
  /** λ > 0 in W/m² per K, or S in K per doubling. */
  known: uncertainInput,
  doublingWm2: uncertainInput,
  draws,
});
export type FeedbackProcedure = z.infer<typeof feedbackProcedure>;

export const attributionProcedure = z.object({
  kind: z.literal('attribution'),
  /** The part and the whole in one unit: forcings, or warmings. */
  part: uncertainInput,
  whole: uncertainInput,
  unit: shortText,
  /** Between the part and the whole; a part that is in the whole shares its errors. */
  correlation: z.number().min(-1).max(1),
  draws,
});
export type AttributionProcedure = z.infer<typeof attributionProcedure>;

export const outgassingProcedure = z.object({
  kind: z.literal('outgassing'),
  source: exchangeSource,
  /** The change of temperature, and the water's temperature at its start. */
  warmingK: z.number(),
  temperatureC: z.number(),
  /** g/kg; null where the source does not depend on it. */
  salinity: z.number().nullable(),
  /** The level from which CO2 rises. */
  co2Ppm: z.number().positive(),
  /** The end of a recorded rise: which warming would be needed for it? */
  toPpm: z.number().positive().nullable(),
});
export type OutgassingProcedure = z.infer<typeof outgassingProcedure>;

/** Counted from the first year in use, which is 1; both ends belong to the span. */
const countedYears = z
  .object({ from: z.int().min(1).max(10_000), to: z.int().min(1).max(10_000) })
  .refine(({ from, to }) => from <= to, { error: 'the first year is after the last' });

export const gregoryProcedure = z.object({
  kind: z.literal('gregory'),
  /** The planet's imbalance, W/m², downward positive. */
  seriesId: recordId,
  /** Warming since the change, its zero the climate before. */
  temperatureSeriesId: recordId,
  minMonths,
  window: yearSpan.nullable(),
  /** The line through the early years is held against that through the late ones. */
  split: z.object({ early: countedYears, late: countedYears }),
  /** What turns the equilibrium of the change into that of a doubling: 2 for 4×CO2. */
  divisor: z.number().positive().max(100),
  covariance: slopeCovariance,
});
export type GregoryProcedure = z.infer<typeof gregoryProcedure>;

export const procedure = z.discriminatedUnion('kind', [
  logRegressionProcedure,
  trendProcedure,
  ratioProcedure,
  energyBudgetProcedure,
  forcingProcedure,
  feedbackProcedure,
  attributionProcedure,
  outgassingProcedure,
  gregoryProcedure,
]);
export type Procedure = z.infer<typeof procedure>;

/** In what a person or a script writes, series may be named instead of numbered, and most choices have defaults. */
export const seriesReference = z.union([recordId, z.string().min(1)]);

export const procedureDraft = z.discriminatedUnion('kind', [
  logRegressionProcedure
    .partial()
    .required({ kind: true })
    .extend({ temperatureSeriesId: seriesReference, co2SeriesId: seriesReference }),
  trendProcedure.partial().required({ kind: true }).extend({ seriesId: seriesReference }),
  ratioProcedure,
  energyBudgetProcedure.partial({ estimate: true, patternWm2PerK: true, correlation: true, draws: true }),
  forcingProcedure
    .partial({ isEffective: true, ch4Ppb: true, n2oPpb: true })
    .extend({ co2SeriesId: seriesReference.nullable().optional() }),
  feedbackProcedure.partial({ draws: true }),
  attributionProcedure.partial({ correlation: true, draws: true }),
  outgassingProcedure.partial({ warmingK: true, salinity: true, toPpm: true }),
  gregoryProcedure
    .partial()
    .required({ kind: true })
    .extend({ seriesId: seriesReference, temperatureSeriesId: seriesReference }),
]);
export type ProcedureDraft = z.infer<typeof procedureDraft>;
