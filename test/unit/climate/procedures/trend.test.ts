import { describe, expect, it } from 'vitest';
import { recompute } from '../../../../src-main/climate/procedures/recompute.ts';
import { trend } from '../../../../src-main/climate/procedures/trend.ts';
import type { Statement } from '../../../../src-main/contract/claim.ts';
import type { TrendProcedure } from '../../../../src-main/contract/procedure.ts';
import { recomputation } from '../../../../src-main/contract/result.ts';
import { annualSeries, computationOf } from '../../../helpers/claim-computation.ts';

const years = Array.from({ length: 40 }, (_, row) => 1980 + row);
const procedure: TrendProcedure = {
  kind: 'trend',
  seriesId: 1,
  minMonths: 12,
  window: null,
  covariance: { kind: 'classical' },
  per: 'decade',
};
const stated: Partial<Statement> = { quantity: 'trend', unit: 'K per decade', value: '0.18', bound: 'equals' };
const line = (unit: string, kPerYear: number) =>
  annualSeries(
    't',
    'temperature-anomaly',
    unit,
    years,
    years.map((year, row) => kPerYear * (year - 1980) + 0.01 * (-1) ** row),
  );
const run = (change: Partial<TrendProcedure> = {}, statement: Partial<Statement> = {}, unit = 'K') =>
  recompute(computationOf({ ...procedure, ...change }, { seriesId: line(unit, 0.018) }, { ...stated, ...statement }));

describe('trend', () => {
  it('is ten times the slope per year in K per decade', () => {
    const perYear = run({ per: 'year' }, { unit: 'K per year', value: '0.018' });
    expect(run().value).toBeCloseTo(0.18, 3);
    expect(run().value).toBeCloseTo(10 * perYear.value, 14);
    expect([run().unit, perYear.unit, run().quantity]).toEqual(['K per decade', 'K per year', 'trend']);
    expect(run().agreement.isReproduced).toBe(true);
    expect(recomputation.parse(run())).toEqual(run());
    expect(run().conversion).toMatch(/K per year × 10 = /);
    expect(perYear.conversion).toBeNull();
  });

  it('turns Fahrenheit into K', () => {
    expect(run({}, {}, '°F').value).toBeCloseTo(run().value / 1.8, 14);
  });

  it('says when it is taken per year and stated per decade', () => {
    expect(run({ per: 'year' }).caveats.map(({ code }) => code)).toContain('unit-differs');
  });

  it('refuses a statement or a series of another kind', () => {
    expect(() => run({}, { unit: 'W/m²' })).toThrow(
      /a statement in K per decade or K per year, but found a statement in W\/m²/,
    );
    const co2 = annualSeries('c', 'co2', 'ppm', years, years);
    expect(() => trend(computationOf(procedure, { seriesId: co2 }, stated), procedure)).toThrow(
      /series c: expected a temperature series/,
    );
  });

  it('takes only the window, and its years are counted from the middle', () => {
    const { fit } = run({ window: { start: 1990, end: 2001 } });
    expect(fit?.years).toHaveLength(12);
    expect(fit?.x[0]).toBe(-5.5);
    expect(fit?.xLabel).toBe('year − 1995.5');
  });
});
