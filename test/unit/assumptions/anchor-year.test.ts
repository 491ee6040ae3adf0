import { describe, expect, it } from 'vitest';
import { anchorYear } from '../../../src-main/assumptions/anchor-year.ts';
import { testContext } from '../../../src-main/assumptions/test-context.ts';
import { fitLogRegression } from '../../../src-main/climate/procedures/fit-log-regression.ts';
import { recompute } from '../../../src-main/climate/procedures/recompute.ts';
import { lagOneAutocorrelation } from '../../../src-main/statistics/lag-one-autocorrelation.ts';
import { quantile } from '../../../src-main/statistics/quantile.ts';
import { expectClose } from '../../helpers/close.ts';
import { ar1Noise, inventedCo2, logRegressionClaim } from '../../helpers/log-regression-claim.ts';

const exact = { rel: 1e-10, abs: 1e-12, why: 'closed form' };
const { years, co2Ppm, x } = inventedCo2(45);
const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
const noise = ar1Noise(45, { sd: 0.1, carryOver: 0.5, seed: 17 });
const temperatureK = x.map((value, row) => 14 + 2.7 * value + (noise[row] ?? 0));
const perKelvin = (sum(x) / sum(x.map((value) => value * value))) * Math.LN2;

describe('anchor-year', () => {
  it.each([-0.15, 0.08])('an error of %f K at the anchor shifts the number by −e0 Σx/Σx² ln 2', (error) => {
    const wrong = temperatureK.map((value, row) => (row === 0 ? value + error : value));
    const before = recompute(logRegressionClaim({ years, co2Ppm, temperatureK })).value;
    const after = recompute(logRegressionClaim({ years, co2Ppm, temperatureK: wrong })).value;
    expectClose(after - before, -error * perKelvin, exact);
  });

  it.each([1, 2, 8])('gives the standard error that the scatter makes by way of an anchor of %i years', (nAnchor) => {
    const anchor = { kind: 'mean-of-first', years: nAnchor } as const;
    const { statistic } = anchorYear.test(
      testContext(logRegressionClaim({ years, co2Ppm, temperatureK, procedure: { anchor } })),
    );
    const { regression, rows } = fitLogRegression(
      { years, co2Ppm, temperatureK },
      { anchor, intercept: true, covariance: { kind: 'classical' } },
    );
    // Variance of a mean of AR(1) values, from the whole covariance matrix.
    const r = lagOneAutocorrelation(regression.residuals);
    expect(r).toBeGreaterThan(0.2);
    let total = 0;
    for (let i = 0; i < nAnchor; i++) for (let j = 0; j < nAnchor; j++) total += r ** Math.abs(i - j);
    const anchorSd = (regression.residualStandardDeviation * Math.sqrt(total)) / nAnchor;
    const { logRatio } = rows;
    const slopePerKelvin = sum(logRatio) / sum(logRatio.map((value) => value * value));
    expectClose(statistic?.value, anchorSd * slopePerKelvin * Math.LN2, exact);
  });

  it('takes every other year as the anchor, over all rows', () => {
    const { alternative, effect, table } = anchorYear.test(
      testContext(logRegressionClaim({ years, co2Ppm, temperatureK })),
    );
    // The line through the point of another year is the line through zero of the rows counted from there.
    const numbers = years.map((_, row) => {
      const dx = co2Ppm.map((value) => Math.log(value / (co2Ppm[row] ?? NaN)));
      const dy = temperatureK.map((value) => value - (temperatureK[row] ?? NaN));
      return (sum(dx.map((value, i) => value * (dy[i] ?? NaN))) / sum(dx.map((value) => value * value))) * Math.LN2;
    });
    const others = numbers.slice(1);
    expectClose(alternative?.value, quantile(others, 0.5), exact);
    expectClose(
      alternative?.interval,
      { low: quantile(others, 0.05), high: quantile(others, 0.95), levelPercent: 90 },
      exact,
    );
    expectClose(effect, quantile(others, 0.5) - (numbers[0] ?? NaN), exact);
    const listed = (table?.rows ?? []).filter(([label]) => /^\d{4}$/.test(String(label)));
    expectClose(
      listed.map((row) => Number(row[1])),
      numbers,
      exact,
    );
    expect(table?.rows.slice(0, 3).map(([label]) => label)).toEqual([
      'mean of 1950–1959',
      'mean of 1950–1969',
      'mean of 1950–1979',
    ]);
  });

  it('weighs what half of the other years do, not only their median', () => {
    // Alternating years: the median anchor is right, half of the anchors are far off.
    const jumpy = x.map((value, row) => 2.7 * value + (row === 0 ? 0 : ([0.35, 0, -0.35][row % 3] ?? 0)));
    const outcome = anchorYear.test(testContext(logRegressionClaim({ years, co2Ppm, temperatureK: jumpy })));
    expect(Math.abs(outcome.effect ?? NaN)).toBeLessThan(0.19);
    expect(outcome.weight).toBe('decisive');
    expect(outcome.proposal.mark).toBe('not met');
  });

  it('finds nothing in a record without scatter', () => {
    const outcome = anchorYear.test(
      testContext(logRegressionClaim({ years, co2Ppm, temperatureK: x.map((value) => 2.7 * value) })),
    );
    expect(outcome.statistic?.value).toBeLessThan(1e-12);
    expect(outcome.weight).toBe('negligible');
    expect(outcome.proposal.mark).toBe('met');
  });

  it('says what would make it testable in too short a record', () => {
    const four = { years: years.slice(0, 4), co2Ppm: co2Ppm.slice(0, 4), temperatureK: temperatureK.slice(0, 4) };
    const outcome = anchorYear.test(testContext(logRegressionClaim(four)));
    expect(outcome.isTestable).toBe(false);
    expect(outcome.missing?.wouldNeed).toMatch(/at least five years/);
  });
});
