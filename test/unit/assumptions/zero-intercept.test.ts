import { describe, expect, it } from 'vitest';
import { testContext } from '../../../src-main/assumptions/test-context.ts';
import { zeroIntercept } from '../../../src-main/assumptions/zero-intercept.ts';
import { expectClose } from '../../helpers/close.ts';
import { ar1Noise, inventedCo2, logRegressionClaim } from '../../helpers/log-regression-claim.ts';

const exact = { rel: 1e-10, abs: 1e-12, why: 'closed form' };
const { years, co2Ppm, x } = inventedCo2(60);
const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
const bias = sum(x) / sum(x.map((value) => value * value));

/** All years but the first lie on a + b x; the first is at zero. */
const offsetRecord = (a: number, b: number) => ({
  years,
  co2Ppm,
  temperatureK: x.map((value, row) => (row === 0 ? 0 : a + b * value)),
});

describe('zero-intercept', () => {
  it.each([-0.12, 0.3])(
    'an offset of %f K biases the slope through zero by a Σx/Σx², which a free intercept finds',
    (a) => {
      const b = 2.5;
      const context = testContext(logRegressionClaim(offsetRecord(a, b)));
      expectClose(context.recomputation.value, (b + a * bias) * Math.LN2, exact);
      const { alternative, effect, test, reading } = zeroIntercept.test(context);
      // The first row is off the line, so the free intercept is not quite a; the identity holds for the one that it is.
      const fitted = Number(/intercept ([−\d.]+) K/.exec(test)?.[1]?.replace('−', '-'));
      expect(Math.abs(fitted - a)).toBeLessThan(0.15 * Math.abs(a));
      expect(Math.abs((effect ?? NaN) + fitted * bias * Math.LN2)).toBeLessThan(0.0005 * bias);
      expectClose(effect, (alternative?.value ?? NaN) - context.recomputation.value, exact);
      expect(Math.sign(effect ?? 0)).toBe(-Math.sign(a));
      const hidden = Number(/−a·Σx\/Σx² = ([+−][\d.]+) K/.exec(reading)?.[1]?.replace('−', '-'));
      expect(Math.abs(hidden * Math.LN2 - (effect ?? NaN))).toBeLessThan(0.0005);
    },
  );

  it('gives no effect for a record through zero, and proposes "met" whatever the p-value', () => {
    const noise = ar1Noise(60, { sd: 0.001, carryOver: 0, seed: 3 });
    const temperatureK = x.map((value, row) => 2.7 * value + (row === 0 ? 0 : 0.01 + (noise[row] ?? 0)));
    const outcome = zeroIntercept.test(testContext(logRegressionClaim({ years, co2Ppm, temperatureK })));
    expect(outcome.statistic?.p).toBeLessThan(0.001);
    expect(outcome.weight).toBe('negligible');
    expect(outcome.proposal.mark).toBe('met');
  });

  it('leaves it open when the record does not tell whether there is an intercept', () => {
    const noise = ar1Noise(60, { sd: 0.6, carryOver: 0, seed: 12 });
    const temperatureK = x.map((value, row) => 2.7 * value + (noise[row] ?? 0));
    const outcome = zeroIntercept.test(
      testContext(
        logRegressionClaim({
          years,
          co2Ppm,
          temperatureK,
          procedure: { anchor: { kind: 'mean-of-first', years: 10 } },
        }),
      ),
    );
    expect(outcome.statistic?.p).toBeGreaterThan(0.05);
    expect(outcome.weight).not.toBe('negligible');
    expect(outcome.proposal.mark).toBe('untested');
    expect(outcome.proposal.reason).toMatch(/the record does not tell/);
  });

  it('takes the procedure’s own lag, or the rule of thumb', () => {
    const noise = ar1Noise(60, { sd: 0.1, carryOver: 0.5, seed: 5 });
    const temperatureK = x.map((value, row) => 2.7 * value + (noise[row] ?? 0));
    const withLag = (lag: number) =>
      zeroIntercept.test(
        testContext(
          logRegressionClaim({
            years,
            co2Ppm,
            temperatureK,
            procedure: { covariance: { kind: 'newey-west', lag, smallSample: true } },
          }),
        ),
      ).statistic;
    const ruleOfThumb = zeroIntercept.test(testContext(logRegressionClaim({ years, co2Ppm, temperatureK }))).statistic;
    expect(ruleOfThumb?.convention).toMatch(/lag 3, .* without the factor/);
    expect(withLag(1)?.convention).toMatch(/lag 1, .* with the factor/);
    expect(withLag(1)?.value).not.toBe(withLag(6)?.value);
  });

  it('lists the mean residual of both lines by decade', () => {
    const { table } = zeroIntercept.test(testContext(logRegressionClaim(offsetRecord(-0.2, 2.5))));
    expect(table?.rows.map(([decade, n]) => [decade, n])).toEqual(
      ['1950s', '1960s', '1970s', '1980s', '1990s', '2000s'].map((decade) => [decade, 10]),
    );
    const means = (table?.rows ?? []).map((row) => Number(row[3]));
    expect(Math.abs(sum(means))).toBeLessThan(1e-12);
    expect(table?.rows.some((row) => Number(row[2]) < -0.01)).toBe(true);
  });

  it('applies to lines through zero only', () => {
    expect(zeroIntercept.applies(logRegressionClaim(offsetRecord(0, 2)))).toBe(true);
    expect(zeroIntercept.applies(logRegressionClaim({ ...offsetRecord(0, 2), procedure: { intercept: true } }))).toBe(
      false,
    );
  });
});
