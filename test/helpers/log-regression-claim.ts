import type { EnergyBudgetInputs, Statement } from '../../src-main/contract/claim.ts';
import type { LogRegressionProcedure } from '../../src-main/contract/procedure.ts';
import type { ClaimComputation } from '../../src-main/contract/compute.ts';
import { randomStream } from '../../src-main/statistics/random-stream.ts';
import { annualSeries, computationOf, logRegressionProcedure } from './claim-computation.ts';

export interface AnnualRecord {
  years: number[];
  co2Ppm: number[];
  temperatureK: number[];
}

export interface LogRegressionClaim extends AnnualRecord {
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
  const forcing = (name: string, values: readonly (number | null)[]) =>
    annualSeries(name, 'forcing', 'W/m²', years, values);
  const series: ClaimComputation['series'] = {
    temperatureSeriesId: annualSeries('air', 'temperature-anomaly', 'K', years, temperatureK),
    co2SeriesId: annualSeries('carbon', 'co2', 'ppm', years, co2Ppm),
    ...(totalForcingWm2 && { totalForcingSeriesId: forcing('all-forcings', totalForcingWm2) }),
    ...(co2ForcingWm2 && { co2ForcingSeriesId: forcing('co2-forcing', co2ForcingWm2) }),
  };
  const computation = computationOf({ ...logRegressionProcedure, ...claim.procedure }, series, claim.statement);
  return {
    ...computation,
    evidence: { ...computation.evidence, ...claim.evidence },
    tolerance: claim.tolerance ?? computation.tolerance,
    seed: claim.seed ?? computation.seed,
  };
}

/** Invented: concentrations that rise faster and faster; x is their logarithm from the first year. */
export function inventedCo2(nYears: number, startYear = 1950) {
  const years = Array.from({ length: nYears }, (_, row) => startYear + row);
  const co2Ppm = years.map((_, row) => 310 * Math.exp(0.002 * row + 0.00003 * row * row));
  const x = co2Ppm.map((value) => Math.log(value / 310));
  return { years, co2Ppm, x };
}

/** Noise whose every value carries over a share of the one before; standard deviation `sd` throughout. */
export function ar1Noise(nYears: number, { sd, carryOver, seed }: { sd: number; carryOver: number; seed: number }) {
  const { normal } = randomStream(seed, 0);
  const noise: number[] = [];
  for (let row = 0; row < nYears; row++) {
    const before = noise[row - 1];
    noise.push(
      before === undefined ? sd * normal() : carryOver * before + sd * Math.sqrt(1 - carryOver ** 2) * normal(),
    );
  }
  return noise;
}

/** The inputs of AR6 WG1 §7.5.2.1 (1850–1900 to 2006–2019); the forcing range, 1.53 to 2.91, taken as symmetric. */
export const ar6EnergyBudget: EnergyBudgetInputs = {
  warmingK: { best: 1.03, low: 0.83, high: 1.23, levelPercent: 90, source: 'AR6 WG1 §7.5.2.1' },
  forcingWm2: { best: 2.2, low: 1.5, high: 2.9, levelPercent: 90, source: 'AR6 WG1 §7.5.2.1' },
  uptakeWm2: { best: 0.59, low: 0.24, high: 0.94, levelPercent: 90, source: 'AR6 WG1 §7.5.2.1' },
  doublingWm2: { best: 3.93, low: 3.46, high: 4.4, levelPercent: 90, source: 'AR6 WG1 §7.3.2.1' },
};
