import { describe, expect, it } from 'vitest';
import { rSquared } from '../../../src-main/assumptions/r-squared.ts';
import { statedRSquared } from '../../../src-main/assumptions/stated-r-squared.ts';
import { testContext } from '../../../src-main/assumptions/test-context.ts';
import { slopeEstimates } from '../../../src-main/climate/procedures/slope-estimates.ts';
import { correlation } from '../../../src-main/statistics/correlation.ts';
import { annualSeries, computationOf } from '../../helpers/claim-computation.ts';
import { expectClose } from '../../helpers/close.ts';
import { ar1Noise, inventedCo2, logRegressionClaim } from '../../helpers/log-regression-claim.ts';

/** NIST StRD NoInt1: y = 130 … 140 on x = 60 … 70, a line y = 70 + x fitted through the origin. */
const noInt1 = {
  x: Array.from({ length: 11 }, (_, row) => 60 + row),
  y: Array.from({ length: 11 }, (_, row) => 130 + row),
};

const { years, co2Ppm, x } = inventedCo2(60);
const noise = ar1Noise(60, { sd: 0.1, carryOver: 0.3, seed: 29 });
const temperatureK = x.map((value, row) => 2.7 * value + (row === 0 ? 0 : 0.4 + (noise[row] ?? 0)));
const record = { years, co2Ppm, temperatureK };

describe('r-squared', () => {
  it('tells the two R² of NoInt1 apart (certified uncentred value; centred by hand)', () => {
    const context = testContext(logRegressionClaim({ ...record, statement: { statedRSquared: '0.99937' } }));
    const { fit } = context.recomputation;
    if (!fit) throw new Error('a log-regression has a fit');
    const { diagnostics } = slopeEstimates(noInt1.x, noInt1.y, { intercept: false, covariance: { kind: 'classical' } });
    const outcome = rSquared.test({
      ...context,
      recomputation: { ...context.recomputation, fit: { ...fit, ...noInt1, years: noInt1.x, diagnostics } },
    });
    const values = outcome.table?.rows.slice(0, 3).map((row) => Number(row[1]));
    expectClose(values, [-0.15702479338843, 0.999365492298663, 1], {
      rel: 1e-12,
      abs: 0,
      why: 'NIST StRD prints 15 digits',
    });
    expect(outcome.table?.rows.slice(0, 3).map((row) => row[2])).toEqual(['no', 'yes', 'no']);
    expect(outcome.proposal).toEqual({
      mark: 'not met',
      reason:
        'The stated figure equals the uncentred R², which compares the line with zero; in the usual sense R² is −0.157.',
    });
  });

  it('names which measure the stated figure equals within rounding', () => {
    const context = testContext(logRegressionClaim(record));
    const { rSquaredCentred, rSquaredUncentred, correlation: r } = context.recomputation.fit?.diagnostics ?? {};
    const measures = [rSquaredCentred, rSquaredUncentred, r, (r ?? NaN) ** 2].map((value) => (value ?? NaN).toFixed(4));
    expect(new Set(measures).size).toBe(4);
    const reasons = [...measures, '0.1234'].map(
      (stated) =>
        rSquared.test(testContext(logRegressionClaim({ ...record, statement: { statedRSquared: stated } }))).proposal,
    );
    expect(reasons.map(({ mark }) => mark)).toEqual(['met', 'not met', 'not met', 'not met', 'not met']);
    expect(reasons[1]?.reason).toMatch(/uncentred R²/);
    expect(reasons[2]?.reason).toMatch(/correlation r, not its square/);
    expect(reasons[3]?.reason).toMatch(/line with a free intercept/);
    expect(reasons[4]?.reason).toMatch(/neither R² nor r/);
  });

  it('sets rival predictors beside it', () => {
    const forcing = x.map((value, row) => 4 * value + 0.1 * Math.sin(row));
    const outcome = rSquared.test(
      testContext(
        logRegressionClaim({
          ...record,
          totalForcingWm2: forcing,
          evidence: { doublingWm2: { best: 3.93, low: 3.46, high: 4.4, levelPercent: 90, source: 'AR6' } },
        }),
      ),
    );
    const rivals = outcome.table?.rows.slice(3).map((row) => Number(row[1]));
    expectClose(
      rivals,
      [x, years, forcing].map((predictor) => correlation(predictor, temperatureK) ** 2),
      { rel: 1e-10, abs: 0, why: 'R² with an intercept is r²' },
    );
    expect(outcome.proposal.mark).toBe('untested');
  });

  it('does without a rival that cannot be read', () => {
    const claim = logRegressionClaim({
      ...record,
      totalForcingWm2: x,
      evidence: { doublingWm2: { best: 3.93, low: 3.46, high: 4.4, levelPercent: 90, source: '' } },
    });
    const series = { ...claim.series, totalForcingSeriesId: annualSeries('odd', 'forcing', 'furlongs', years, x) };
    expect(rSquared.test(testContext({ ...claim, series })).table?.rows).toHaveLength(5);
  });

  it('applies to a trend only where an R² is stated', () => {
    const trend = (statedR: string | null) =>
      computationOf(
        { kind: 'trend', seriesId: 1, minMonths: 12, window: null, covariance: { kind: 'classical' }, per: 'decade' },
        { seriesId: annualSeries('air', 'temperature', 'K', years, temperatureK) },
        { unit: 'K per decade', quantity: 'trend', value: '0.2', statedRSquared: statedR },
      );
    expect(rSquared.applies(trend(null))).toBe(false);
    expect(rSquared.applies(trend('0.9'))).toBe(true);
    expect(rSquared.test(testContext(trend('0.9'))).table?.rows).toHaveLength(3);
  });
});

describe('statedRSquared', () => {
  it.each([
    ['0.88', 0.88, 0.8849, 0.885],
    ['88 %', 0.88, 0.8849, 0.885],
    ['R² = 0,9', 0.9, 0.949, 0.95],
    ['R2 of 37 percent', 0.37, 0.3749, 0.375],
    ['r = .61', 0.61, 0.6149, 0.615],
  ])('reads “%s”', (text, value, inside, outside) => {
    const stated = statedRSquared(text);
    expect(stated.value).toBeCloseTo(value, 12);
    expect(stated.agreesWith(inside)).toBe(true);
    expect(stated.agreesWith(outside)).toBe(false);
    expect(stated.agreesWith(null)).toBe(false);
  });

  it('refuses words', () => {
    expect(() => statedRSquared('an excellent fit')).toThrow(/such as 0.88 or 88 %/);
  });
});
