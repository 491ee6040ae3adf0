import { ar1AboutLevel, type Ar1AboutLevel } from '../../statistics/ar1-about-level.ts';
import type { TwoLayerParameters } from './linear-response.ts';
import { yearlyResponse } from './yearly-response.ts';

/** Beyond these a fit is not followed: no planet, and a likelihood that has long been flat. */
export const searchBounds = {
  feedback: 20,
  exchange: 20,
  heatCapacity: { low: 0.5, high: 100 },
  deepHeatCapacity: { low: 5, high: 5000 },
} as const;

/** A record as rows of the forcing series. */
export interface FitRecord {
  values: Float64Array;
  /** [nObs] place of each row among the years of the forcing. */
  rows: Int32Array;
  /** [nObs] years since the row before. */
  steps: Float64Array;
  hasOffset: boolean;
}

export interface FitProblem {
  wm2: Float64Array;
  temperature: FitRecord | null;
  heatUptake: FitRecord | null;
  /** null: to be fitted. */
  heatCapacity: number | null;
  deepHeatCapacity: number | null;
  efficacy: number;
}

export interface FittedErrors {
  parameters: TwoLayerParameters;
  logLikelihood: number;
  temperature: (Ar1AboutLevel & { model: Float64Array }) | null;
  heatUptake: (Ar1AboutLevel & { model: Float64Array }) | null;
}

/** Parameters of a point of the search: √λ, √γ, and the logarithms of the heat capacities that are fitted. */
export function parametersAt(problem: FitProblem, point: readonly number[]): TwoLayerParameters {
  const [rootFeedback = 0, rootExchange = 0, ...logarithms] = point;
  return {
    feedback: rootFeedback ** 2,
    exchange: rootExchange ** 2,
    heatCapacity: problem.heatCapacity ?? Math.exp(logarithms.shift() ?? NaN),
    deepHeatCapacity: problem.deepHeatCapacity ?? Math.exp(logarithms.shift() ?? NaN),
    efficacy: problem.efficacy,
  };
}

/**
 * Likelihood of a temperature and a heat-uptake record under a two-layer model: the records are the model's annual means,
 * an offset where it is fitted, and errors that carry over from year to year.
 *
 * Model    log L = log L_T + log L_N, each the exact AR(1) likelihood of record less model at its own best ρ, σ and offset
 * Assumes  errors of the two records independent of each other; forcing known
 *
 * @returns  logLikelihood −∞ outside the bounds of the search
 *
 * Checked  test/reference/climate/two-layer-fit.test.ts (B: R's eigen and arima)
 */
export function fitLikelihood(problem: FitProblem, parameters: TwoLayerParameters): FittedErrors {
  if (!isWithinBounds(parameters)) {
    return { parameters, logLikelihood: -Infinity, temperature: null, heatUptake: null };
  }
  const { surfaceK, imbalanceWm2 } = yearlyResponse(parameters, problem.wm2);
  const temperature = problem.temperature && errorsOf(problem.temperature, surfaceK);
  const heatUptake = problem.heatUptake && errorsOf(problem.heatUptake, imbalanceWm2);
  const logLikelihood = (temperature?.logLikelihood ?? 0) + (heatUptake?.logLikelihood ?? 0);
  return { parameters, logLikelihood, temperature, heatUptake };
}

function errorsOf({ values, rows, steps, hasOffset }: FitRecord, yearly: Float64Array) {
  const model = new Float64Array(values.length);
  const errors = new Float64Array(values.length);
  for (let i = 0; i < values.length; i++) {
    model[i] = yearly[rows[i]!]!;
    errors[i] = values[i]! - model[i]!;
  }
  return { ...ar1AboutLevel(errors, steps, hasOffset), model };
}

function isWithinBounds({ feedback, exchange, heatCapacity, deepHeatCapacity }: TwoLayerParameters): boolean {
  // The bound itself, squared from its root, may be beyond by a rounding.
  const slack = 1 + 1e-12;
  const isFlat = feedback > slack * searchBounds.feedback || exchange > slack * searchBounds.exchange;
  return !isFlat && heatCapacity > 0 && deepHeatCapacity > 0;
}
