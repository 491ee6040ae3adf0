import { describe, expect, it } from 'vitest';
import { testContext } from '../../../src-main/assumptions/test-context.ts';
import { window } from '../../../src-main/assumptions/window.ts';
import { claimSweep } from '../../../src-main/robustness/claim-sweep.ts';
import { quantile } from '../../../src-main/statistics/quantile.ts';
import { expectClose } from '../../helpers/close.ts';
import { ar1Noise, inventedCo2, logRegressionClaim } from '../../helpers/log-regression-claim.ts';

const exact = { rel: 1e-12, abs: 1e-12, why: 'the same windows' };
const { years, co2Ppm, x } = inventedCo2(40);
const noise = ar1Noise(40, { sd: 0.1, carryOver: 0.3, seed: 23 });
const temperatureK = x.map((value, row) => 2.7 * value + (noise[row] ?? 0));

describe('window', () => {
  const claim = logRegressionClaim({ years, co2Ppm, temperatureK, procedure: { window: { start: 1955, end: 1985 } } });

  it('sweeps all windows of at least 20 years of the whole record', () => {
    const { alternative, effect, statistic, table } = window.test(testContext(claim));
    const sweep = claimSweep({ ...claim, minYears: 20 });
    expect(sweep.windows).toHaveLength(231);
    const numbers = sweep.windows.map(({ slope }) => slope * Math.LN2);
    const own = sweep.windows.find(({ start, end }) => start === 1955 && end === 1985)?.slope ?? NaN;
    expectClose(alternative?.value, quantile(numbers, 0.5), exact);
    expectClose(
      alternative?.interval,
      { low: quantile(numbers, 0.05), high: quantile(numbers, 0.95), levelPercent: 90 },
      exact,
    );
    expectClose(effect, quantile(numbers, 0.5) - own * Math.LN2, exact);
    expectClose(statistic?.value, (100 * numbers.filter((number) => number <= own * Math.LN2).length) / 231, exact);
    expect(table?.rows.at(-1)?.[0]).toBe('stated window, 1955–1985');
  });

  it('finds nothing in an exact line, much in a bent one', () => {
    const line = logRegressionClaim({ years, co2Ppm, temperatureK: x.map((value) => 2.7 * value) });
    expect(window.test(testContext(line))).toMatchObject({ weight: 'negligible', proposal: { mark: 'met' } });
    const bent = logRegressionClaim({ years, co2Ppm, temperatureK: x.map((value) => 40 * value * value) });
    expect(window.test(testContext(bent))).toMatchObject({ weight: 'decisive', proposal: { mark: 'not met' } });
  });

  it('makes windows long enough for the procedure’s own anchor and lag', () => {
    const long = { anchor: { kind: 'mean-of-first', years: 25 } } as const;
    expect(
      window.test(testContext(logRegressionClaim({ years, co2Ppm, temperatureK, procedure: long }))).reading,
    ).toMatch(/at least 26 years/);
    const lag = { covariance: { kind: 'newey-west', lag: 29, smallSample: false } } as const;
    expect(
      window.test(testContext(logRegressionClaim({ years, co2Ppm, temperatureK, procedure: lag }))).reading,
    ).toMatch(/at least 30 years/);
  });

  it('says what would make it testable when the record is one window', () => {
    const rows = (values: number[]) => values.slice(0, 20);
    const short = logRegressionClaim({ years: rows(years), co2Ppm: rows(co2Ppm), temperatureK: rows(temperatureK) });
    expect(window.test(testContext(short))).toMatchObject({
      isTestable: false,
      missing: { reason: 'The series do not share more than 20 years.' },
      proposal: { mark: 'untested' },
    });
  });
});
