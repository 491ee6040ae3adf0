import type { LogRegressionProcedure, Statement } from '../../src-main/contract/claim.ts';
import type { ClaimComputation } from '../../src-main/contract/compute.ts';
import type { SeriesData, SeriesQuantity } from '../../src-main/contract/series.ts';

/** An annual series with invented or given values. */
export function annualSeries(
  name: string,
  quantity: SeriesQuantity,
  unit: string,
  years: readonly number[],
  values: readonly (number | null)[],
): SeriesData {
  return {
    name,
    quantity,
    agent: quantity === 'forcing' ? 'total' : null,
    unit,
    step: 'year',
    baseline: null,
    partialYears: [],
    values: {
      years: [...years],
      months: null,
      values: [...values],
      lower: null,
      upper: null,
      boundsLevelPercent: null,
    },
  };
}

export interface LogRegressionClaim {
  years: readonly number[];
  co2Ppm: readonly number[];
  temperatureK: readonly number[];
  totalForcingWm2?: readonly (number | null)[];
  co2ForcingWm2?: readonly number[];
  statement?: Partial<Statement>;
  procedure?: Partial<LogRegressionProcedure>;
  evidence?: Partial<ClaimComputation['evidence']>;
  tolerance?: ClaimComputation['tolerance'];
  seed?: number;
}

/** A claim of "at most 1.9 K per doubling" from a line through its first year, unless said otherwise. */
export function logRegressionClaim(claim: LogRegressionClaim): ClaimComputation {
  const { years, co2Ppm, temperatureK, totalForcingWm2, co2ForcingWm2 } = claim;
  return {
    statement: {
      words: 'A doubling of CO2 warms the planet by 1.9 °C at the most.',
      sourceId: null,
      locator: 'slide 14',
      quantity: 'apparent-sensitivity',
      value: '1.9',
      unit: 'K per doubling',
      bound: 'at most',
      definition: '',
      presentedAs: null,
      statedRSquared: null,
      ...claim.statement,
    },
    procedure: {
      kind: 'log-regression',
      temperatureSeriesId: 1,
      co2SeriesId: 2,
      minMonths: 12,
      window: null,
      anchor: { kind: 'first-year' },
      intercept: false,
      covariance: { kind: 'classical' },
      conversion: 'per-doubling',
      ...claim.procedure,
    },
    tolerance: claim.tolerance ?? { notableShare: 0.1, decisiveShare: 0.25 },
    seed: claim.seed ?? 20_261,
    series: {
      temperatureSeriesId: annualSeries('air', 'temperature-anomaly', 'K', years, temperatureK),
      co2SeriesId: annualSeries('carbon', 'co2', 'ppm', years, co2Ppm),
      ...(totalForcingWm2 && {
        totalForcingSeriesId: annualSeries('forcing', 'forcing', 'W/m²', years, totalForcingWm2),
      }),
      ...(co2ForcingWm2 && {
        co2ForcingSeriesId: annualSeries('co2 forcing', 'forcing', 'W/m²', years, co2ForcingWm2),
      }),
    },
    evidence: { energyBudget: null, comparedWith: null, doublingWm2: null, ...claim.evidence },
  };
}

/** The inputs of AR6 WG1 §7.5.2.1 (1850–1900 to 2006–2019); the forcing range as symmetric. */
export const ar6EnergyBudget = {
  warmingK: { mean: 1.03, halfWidth90: 0.2, source: 'AR6 WG1 §7.5.2.1' },
  forcingWm2: { mean: 2.2, halfWidth90: 0.7, source: 'AR6 WG1 §7.5.2.1' },
  uptakeWm2: { mean: 0.59, halfWidth90: 0.35, source: 'AR6 WG1 §7.5.2.1' },
  doublingWm2: { mean: 3.93, halfWidth90: 0.47, source: 'AR6 WG1 §7.3.2.1' },
};
