import { z } from 'zod';
import { column, rowYears } from './line-estimators.ts';
import { caveat, year } from './primitives.ts';

const caveats = z.array(caveat);
const numbers = z.array(z.number());
const oneOrEach = z.union([z.number(), column]);
const seed = z.int().min(0).max(4_294_967_295);
const random = z.object({ generator: z.string(), seed: z.int(), nDraws: z.int() });
/** null at an end: unbounded there, or not within the range that was searched; a caveat says which. */
const openInterval = z.object({
  low: z.number().nullable(),
  high: z.number().nullable(),
  levelPercent: z.number(),
});
export type OpenInterval = z.infer<typeof openInterval>;

/** From a start in balance. */
const forcing = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('step'), wm2: z.number() }),
  z.object({ kind: z.literal('ramp'), wm2PerYr: z.number() }),
  /** One value for each year, held from its beginning to its end. */
  z.object({ kind: z.literal('annual'), wm2: column }),
]);
export type ResponseForcing = z.infer<typeof forcing>;

const twoLayerInput = z.object({
  /** Of the surface layer, W yr m⁻² K⁻¹: 1 is 31.6 MJ m⁻² K⁻¹, about 7.7 m of sea water. */
  heatCapacity: z.number(),
  /** W yr m⁻² K⁻¹. */
  deepHeatCapacity: z.number(),
  /** γ, W m⁻² K⁻¹. */
  exchange: z.number(),
  /** λ, W m⁻² K⁻¹; positive restores. */
  feedback: z.number(),
  /** ε; 1 unless given. */
  efficacy: z.number().optional(),
  forcing,
  /** Times since the start of the forcing, in years: the end of its first year is 1. */
  years: column,
  /** Forcing of a doubling of CO2, which ECS and TCR refer to; without it they are null. */
  doublingWm2: z.number().optional(),
});
export type TwoLayerInput = z.infer<typeof twoLayerInput>;

const twoLayerValue = z.object({
  /** At each of the years. */
  surfaceK: numbers,
  deepK: numbers,
  /** At the turn of a year, with the forcing of the year that ends. */
  imbalanceWm2: numbers,
  ecsK: z.number().nullable(),
  /** After 70 years of a ramp that then reaches the forcing of a doubling: F2x/70 per year, the same as F4x/140. */
  tcrK: z.number().nullable(),
  /** After 70 years of CO2 growing by 1 % a year, forcing by its logarithm: F2x ln 1.01/ln 2 per year. */
  tcrOnePercentK: z.number().nullable(),
  /** F2x/(λ + εγ): the limit in which the deep ocean has not warmed; slightly low. */
  tcrNoDeepWarmingK: z.number().nullable(),
  fastYr: z.number(),
  /** null without heat exchange: then there is one layer. */
  slowYr: z.number().nullable(),
  /** Shares of the warming that the modes bring after a step; they add up to 1. null when both have one time scale. */
  fastShare: z.number().nullable(),
  slowShare: z.number().nullable(),
  /** Warming of the deep over that of the surface layer in each mode. */
  fastDeepRatio: z.number().nullable(),
  slowDeepRatio: z.number().nullable(),
  caveats,
});
export type TwoLayerValue = z.infer<typeof twoLayerValue>;

const twoLayerEnsembleInput = z.object({
  /** Parameters as for one run: one value for each member, or one for all. */
  heatCapacity: oneOrEach,
  deepHeatCapacity: oneOrEach,
  exchange: oneOrEach,
  feedback: oneOrEach,
  efficacy: oneOrEach.optional(),
  forcing,
  /** As for one run; whole years, in order, where the forcing is annual. */
  years: z.array(z.number()).min(1).max(10_000),
  /** In order; 0.05, 0.17, 0.5, 0.83 and 0.95 unless given. */
  probabilities: z.array(z.number().min(0).max(1)).min(1).max(100).optional(),
  doublingWm2: oneOrEach.optional(),
});
export type TwoLayerEnsembleInput = z.infer<typeof twoLayerEnsembleInput>;

const twoLayerEnsembleValue = z.object({
  nMembers: z.int(),
  years: numbers,
  probabilities: numbers,
  /** By year, then by probability: exact quantiles of all members (type 7), each year for itself. */
  surfaceK: z.array(numbers),
  imbalanceWm2: z.array(numbers),
  /** By probability. */
  ecsK: numbers.nullable(),
  tcrK: numbers.nullable(),
  caveats,
});
export type TwoLayerEnsembleValue = z.infer<typeof twoLayerEnsembleValue>;

const annualRecord = z.object({ years: rowYears, values: column });

const twoLayerFitInput = z.object({
  /** Effective forcing, a value for each year from startYear on, in balance before. */
  forcing: z.object({ startYear: year, wm2: column }),
  /** Annual means of surface temperature, K; years may be missing. */
  temperature: annualRecord.optional(),
  /** fitted: the record is an anomaly on some baseline; zero: it counts from the balance before the forcing. */
  temperatureOffset: z.enum(['fitted', 'zero']),
  /** Annual means of the planet's heat uptake, W/m² of the whole Earth's surface; years may be missing. */
  heatUptake: annualRecord.optional(),
  /** W yr m⁻² K⁻¹, or to be fitted too. */
  heatCapacity: z.union([z.number(), z.literal('fitted')]),
  deepHeatCapacity: z.union([z.number(), z.literal('fitted')]),
  /** Taken as known; 1 unless given. */
  efficacy: z.number().optional(),
  /** Forcing of a doubling of CO2, on the footing of the forcing series. */
  doublingWm2: z.number(),
  levelPercent: z.number().min(50).max(99.9),
});
export type TwoLayerFitInput = z.infer<typeof twoLayerFitInput>;

const fittedRecord = z.object({
  nObs: z.int(),
  /** Added to the model's warming to give the record. */
  offset: z.number(),
  /** Lag-one coefficient of the residuals. */
  rho: z.number(),
  /** Standard deviation of the innovations. */
  sigma: z.number(),
  /** The model, offset included, in the years of the record. */
  fitted: numbers,
});

const twoLayerFitValue = z.object({
  feedbackWm2PerK: z.number(),
  exchangeWm2PerK: z.number(),
  heatCapacity: z.number(),
  deepHeatCapacity: z.number(),
  /** null where the likelihood is highest without any feedback. */
  ecsK: z.number().nullable(),
  tcrK: z.number(),
  intervals: z.object({ feedbackWm2PerK: openInterval, exchangeWm2PerK: openInterval, ecsK: openInterval }),
  isEcsBoundedAbove: z.boolean(),
  /** How far the log-likelihood falls from its top to λ = 0, and how far it must fall to bound ECS from above. */
  fallAtZeroFeedback: z.number(),
  fallOfInterval: z.number(),
  logLikelihood: z.number(),
  temperature: fittedRecord.nullable(),
  heatUptake: fittedRecord.nullable(),
  /** Climbs of the likelihood from different starts, and how many of them ended at the top. */
  starts: z.object({ nClimbs: z.int(), nAtTop: z.int() }),
  caveats,
});
export type TwoLayerFitValue = z.infer<typeof twoLayerFitValue>;

const yearRange = z.object({ from: z.number(), to: z.number() });

/** Years of a Gregory regression that are compared, counted from the first; both ends belong to a span. */
export const usualSplit = { early: { from: 1, to: 20 }, late: { from: 21, to: 150 } };

const gregoryInput = z.object({
  /** Annual means after an abrupt change, in order of time. */
  imbalanceWm2: column,
  warmingK: column,
  /** Since the change; 1, 2, 3, … unless given. */
  years: column.optional(),
  /** 1–20 and 21–150 unless given. */
  split: z.object({ early: yearRange, late: yearRange }).optional(),
  /** What the forcing and the equilibrium of the change are divided by to give those of a doubling: 2 for 4×CO2. */
  doublingDivisor: z.number().optional(),
  /** classical unless given. */
  covariance: z
    .discriminatedUnion('kind', [
      z.object({ kind: z.literal('classical') }),
      z.object({ kind: z.literal('newey-west'), lag: z.int().min(0), smallSample: z.boolean() }),
    ])
    .optional(),
  /** Variance of the scatter of N over that of ΔT for the line of total least squares, (W m⁻² K⁻¹)²; 1 unless given. */
  delta: z.number().optional(),
});
export type GregoryInput = z.infer<typeof gregoryInput>;

const gregoryLine = z.object({
  nYears: z.int(),
  forcingWm2: z.number(),
  feedbackWm2PerK: z.number(),
  /** null where the feedback cannot be told from none. */
  equilibriumK: z.number().nullable(),
  forcingStandardErrorWm2: z.number(),
  feedbackStandardErrorWm2PerK: z.number(),
  /** By the delta method. */
  equilibriumStandardErrorK: z.number().nullable(),
  /** Fieller's interval; null where it is not an interval. */
  equilibriumFieller95: openInterval.nullable(),
});
export type GregoryLine = z.infer<typeof gregoryLine>;
const bracketLine = z.object({
  forcingWm2: z.number(),
  feedbackWm2PerK: z.number(),
  equilibriumK: z.number().nullable(),
});

const gregoryValue = gregoryLine.extend({
  /** forcingWm2 and equilibriumK over the divisor; null without one. */
  perDoubling: z
    .object({ forcingWm2: z.number(), equilibriumK: z.number().nullable(), divisor: z.number() })
    .nullable(),
  /** null where the years hold fewer than three points. */
  early: gregoryLine.nullable(),
  late: gregoryLine.nullable(),
  /** The same points with the scatter laid to N, to ΔT, or to both. null where N and ΔT do not vary together. */
  bracket: z
    .object({ imbalanceOnWarming: bracketLine, warmingOnImbalance: bracketLine, totalLeastSquares: bracketLine })
    .nullable(),
  convention: z.string(),
  caveats,
});
export type GregoryValue = z.infer<typeof gregoryValue>;

const coupledSlopeInput = z.object({
  /** γ: warming for one e-folding of CO2, K. */
  response: z.number(),
  /** τ: warming that raises CO2 by one e-folding, K. */
  exchange: z.number(),
  /** σ_e: of temperature that CO2 does not cause, K. */
  sdTemperature: z.number(),
  /** σ_v: of ln CO2 that temperature does not cause. */
  sdCarbon: z.number(),
  simulation: z.object({ draws: z.int().min(100).max(10_000_000), seed }).optional(),
});
export type CoupledSlopeInput = z.infer<typeof coupledSlopeInput>;

const coupledSlopeValue = z.object({
  /** Least-squares slope of T on ln CO2 in a large sample, K per e-folding. */
  slope: z.number(),
  /** w in slope = wγ + (1 − w)τ. */
  weightOnResponse: z.number(),
  /** 1/(1 − γ/τ): what the loop makes of a disturbance. */
  gain: z.number(),
  simulated: z.object({ slope: z.number(), standardError: z.number(), random }).nullable(),
  caveats,
});
export type CoupledSlopeValue = z.infer<typeof coupledSlopeValue>;

/** How warming, imbalance and CO2 answer to each other. */
export const climateResponseMethods = {
  'two-layer': { input: twoLayerInput, value: twoLayerValue },
  'two-layer-ensemble': { input: twoLayerEnsembleInput, value: twoLayerEnsembleValue },
  'two-layer-fit': { input: twoLayerFitInput, value: twoLayerFitValue },
  gregory: { input: gregoryInput, value: gregoryValue },
  'coupled-slope': { input: coupledSlopeInput, value: coupledSlopeValue },
} as const;
