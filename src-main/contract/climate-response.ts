import { z } from 'zod';
import { column } from './line-estimators.ts';
import { caveat } from './primitives.ts';

const caveats = z.array(caveat);
const numbers = z.array(z.number());
const seed = z.int().min(0).max(4_294_967_295);
const random = z.object({ generator: z.string(), seed: z.int(), nDraws: z.int() });
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
  'coupled-slope': { input: coupledSlopeInput, value: coupledSlopeValue },
} as const;
