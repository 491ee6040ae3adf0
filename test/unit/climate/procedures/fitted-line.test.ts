import { describe, expect, it } from 'vitest';
import { fittedLine } from '../../../../src-main/climate/procedures/fitted-line.ts';
import { recompute } from '../../../../src-main/climate/procedures/recompute.ts';
import type { ClaimComputation } from '../../../../src-main/contract/compute.ts';
import { annualSeries, computationOf } from '../../../helpers/claim-computation.ts';
import { inventedCo2, logRegressionClaim } from '../../../helpers/log-regression-claim.ts';

const { years, co2Ppm, x } = inventedCo2(50);
const temperatureK = x.map((value, row) => 0.1 + 2.5 * value + 0.05 * Math.sin(row));
const lineOf = (computation: ClaimComputation) => fittedLine({ computation, recomputation: recompute(computation) });

describe('fittedLine', () => {
  it('has the factor that turns the slope into the number, in every unit', () => {
    const trends = (['decade', 'year'] as const).map((per) =>
      computationOf(
        { kind: 'trend', seriesId: 1, minMonths: 12, window: null, covariance: { kind: 'classical' }, per },
        { seriesId: annualSeries('t', 'temperature-anomaly', 'K', years, temperatureK) },
        { quantity: 'trend', unit: `K per ${per}`, value: '0.2' },
      ),
    );
    const logs = (['K per doubling', 'K per e-folding', '°F per doubling'] as const).map((unit) =>
      logRegressionClaim({
        years,
        co2Ppm,
        temperatureK,
        statement: { unit },
        procedure: { conversion: unit === 'K per e-folding' ? 'per-e-folding' : 'per-doubling' },
      }),
    );
    for (const computation of [...trends, ...logs]) {
      const { value } = recompute(computation);
      const { fit, factor } = lineOf(computation);
      expect((fit.slopes[0]?.value ?? NaN) * factor).toBe(value);
    }
  });

  it('takes the procedure’s own lag, or the rule of thumb’s', () => {
    const claim = { years, co2Ppm, temperatureK };
    const own = { kind: 'newey-west', lag: 7, smallSample: true } as const;
    expect(lineOf(logRegressionClaim({ ...claim, procedure: { covariance: own } })).serialCovariance).toEqual(own);
    // floor(4 (50/100)^(2/9)) = 3
    expect(lineOf(logRegressionClaim(claim)).serialCovariance).toEqual({
      kind: 'newey-west',
      lag: 3,
      smallSample: false,
    });
  });

  it('refuses a ratio', () => {
    const ratio = computationOf(
      { kind: 'ratio', numerator: { value: '3.7', unit: 'W/m²' }, denominator: { value: '2', unit: 'W/m²' } },
      {},
      { quantity: 'ratio', unit: '1', value: '1.9' },
    );
    expect(() => lineOf(ratio)).toThrow('a procedure that fits a line');
  });
});
