import { readFileSync } from 'node:fs';
import type { Statement } from '../../src-main/contract/claim.ts';
import type { LogRegressionProcedure, Procedure } from '../../src-main/contract/procedure.ts';
import type { ClaimComputation } from '../../src-main/contract/compute.ts';
import type { SeriesData, SeriesQuantity } from '../../src-main/contract/series.ts';

/** An annual series of invented or given values; `null` is a missing value. */
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
    agent: null,
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

/** A monthly series; a month is [year, month, value]. */
export function monthlySeries(
  name: string,
  quantity: SeriesQuantity,
  unit: string,
  months: readonly (readonly [number, number, number | null])[],
): SeriesData {
  return {
    ...annualSeries(
      name,
      quantity,
      unit,
      months.map(([year]) => year),
      months.map(([, , value]) => value),
    ),
    step: 'month',
    values: {
      ...annualSeries(
        name,
        quantity,
        unit,
        months.map(([year]) => year),
        months.map(([, , value]) => value),
      ).values,
      months: months.map(([, month]) => month),
    },
  };
}

/** An invented statement. */
export const statement: Statement = {
  words: 'A doubling gives at most 1.9 degrees.',
  sourceId: null,
  locator: 'slide 1',
  quantity: 'apparent-sensitivity',
  value: '1.9',
  unit: 'K per doubling',
  bound: 'at most',
  definition: '',
  presentedAs: null,
  statedRSquared: null,
};

export const logRegressionProcedure: LogRegressionProcedure = {
  kind: 'log-regression',
  temperatureSeriesId: 1,
  co2SeriesId: 2,
  minMonths: 12,
  window: null,
  anchor: { kind: 'first-year' },
  intercept: false,
  covariance: { kind: 'classical' },
  conversion: 'per-doubling',
};

export function computationOf(
  procedure: Procedure,
  series: ClaimComputation['series'],
  changes: Partial<Statement> = {},
): ClaimComputation {
  return {
    statement: { ...statement, ...changes },
    procedure,
    tolerance: { notableShare: 0.1, decisiveShare: 0.25 },
    seed: 1,
    series,
    evidence: { energyBudget: null, comparedWith: null, quotedRange: null, doublingWm2: null },
  };
}

const rowsOf = (name: string): string[][] =>
  readFileSync(new URL(`../../node_modules/vega-datasets/data/${name}`, import.meta.url), 'utf8')
    .trim()
    .split(/\r?\n/)
    .slice(1)
    .map((line) => line.split(','));

/** Mauna Loa CO2 by month, as in vega-datasets (co2-concentration.csv, column CO2). */
export function realCo2(): SeriesData {
  const months = rowsOf('co2-concentration.csv').map(
    ([date = '', value]) => [Number(date.slice(0, 4)), Number(date.slice(5, 7)), Number(value)] as const,
  );
  return monthlySeries('mauna-loa', 'co2', 'ppm', months);
}

/** Global temperature anomaly by year, as in vega-datasets (global-temp.csv). */
export function realTemperature(): SeriesData {
  const rows = rowsOf('global-temp.csv');
  const years = rows.map(([year]) => Number(year));
  return annualSeries(
    'global-temperature',
    'temperature-anomaly',
    '°C',
    years,
    rows.map(([, value]) => Number(value)),
  );
}
