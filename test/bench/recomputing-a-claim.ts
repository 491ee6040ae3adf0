import { recompute } from '../../src-main/climate/procedures/recompute.ts';
import { claimComputation } from '../../src-main/contract/compute.ts';
import { regression } from '../../src-main/statistics/regression.ts';
import type { BenchCase } from './bench-case.ts';
import { sameNumbers } from './comparison.ts';

const nYears = 70;
const years = Array.from({ length: nYears }, (_, place) => 1950 + place);
const values = (value: (place: number) => number) => ({
  years,
  months: null,
  values: years.map((_, place) => value(place)),
  lower: null,
  upper: null,
  boundsLevelPercent: null,
});
const common = { agent: null, step: 'year', baseline: null, partialYears: [] } as const;

/** The whole recomputation of a log-regression claim beside one least-squares fit of the same rows. */
export function caseOfRecomputing(): BenchCase {
  const co2 = (place: number) => 311 * Math.exp(0.002 * place + 0.00003 * place * place);
  const warming = (place: number) => 2.6 * Math.log(co2(place) / 311) + 0.1 * Math.sin(1.7 * place);
  const computation = claimComputation.parse({
    statement: {
      words: 'invented',
      sourceId: null,
      locator: '',
      quantity: 'apparent-sensitivity',
      value: '1.8',
      unit: 'K per doubling',
      bound: 'equals',
      definition: '',
      presentedAs: null,
      statedRSquared: null,
    },
    procedure: {
      kind: 'log-regression',
      temperatureSeriesId: 1,
      co2SeriesId: 2,
      minMonths: 12,
      window: null,
      anchor: { kind: 'first-year' },
      intercept: false,
      covariance: { kind: 'newey-west', lag: 3, smallSample: false },
      conversion: 'per-doubling',
    },
    tolerance: { notableShare: 0.1, decisiveShare: 0.25 },
    seed: 1,
    evidence: { energyBudget: null, comparedWith: null, quotedRange: null, doublingWm2: null },
    series: {
      temperatureSeriesId: {
        name: 't',
        quantity: 'temperature-anomaly',
        unit: 'K',
        values: values(warming),
        ...common,
      },
      co2SeriesId: { name: 'c', quantity: 'co2', unit: 'ppm', values: values(co2), ...common },
    },
  });
  const x = years.map((_, place) => Math.log(co2(place) / co2(0)));
  const y = years.map((_, place) => warming(place) - warming(0));
  return {
    name: 'recomputing a claim, 70 years',
    own: () => recompute(computation).fit?.regression.coefficients ?? [],
    peers: [
      {
        name: 'one least-squares fit with its table',
        work: () => regression({ x, y, intercept: false, covariance: { kind: 'classical' } }).coefficients,
        compare: sameNumbers({ rel: 1e-10, why: 'the same rows; logarithms of quotients' }),
      },
    ],
  };
}
