import { describe, expect, it } from 'vitest';
import { coefficientCovariance, type CovarianceSetting } from '../../../src-main/statistics/coefficient-covariance.ts';
import { heteroskedasticCovariance } from '../../../src-main/statistics/heteroskedastic-covariance.ts';
import { leastSquares } from '../../../src-main/statistics/least-squares.ts';
import { neweyWest } from '../../../src-main/statistics/newey-west.ts';

describe('coefficientCovariance', () => {
  const y = [2, 1, 3, 5, 4, 6, 8, 6];
  const fit = leastSquares({ columns: [new Float64Array(8).fill(1), y.map((_, t) => t)], y });
  const years = [1, 2, 3, 5, 6, 7, 8, 9];
  const of = (covariance: CovarianceSetting['covariance'], years?: number[]) =>
    coefficientCovariance(fit, { covariance, hasIntercept: true, years });

  it('classical is RSS/(n − k) (X′X)⁻¹', () => {
    const variance = fit.residualSumOfSquares / 6;
    expect(of({ kind: 'classical' })).toEqual({
      matrix: fit.unscaledCovariance.map((value) => value * variance),
      lag: null,
      caveats: [],
    });
  });

  it('passes on what was asked for', () => {
    expect(of({ kind: 'hc2' }).matrix).toEqual(heteroskedasticCovariance(fit, 'hc2'));
    const options = { lag: 2, smallSample: true, prewhiten: 'var1' } as const;
    expect(of({ kind: 'newey-west', ...options }, [1, 2, 3, 4, 5, 6, 7, 8])).toMatchObject({
      matrix: neweyWest(fit, options),
      lag: 2,
      caveats: [{ code: 'prewhitened' }],
    });
    expect(of({ kind: 'newey-west', lag: 3 }, years)).toMatchObject({
      matrix: neweyWest(fit, { lag: 3, smallSample: false, years }),
      lag: 3,
      caveats: [{ code: 'gaps-by-calendar' }],
    });
  });

  it('says nothing of gaps where the errors do not look at the order', () => {
    expect(of({ kind: 'hc0' }, years).caveats).toEqual([]);
  });
});
