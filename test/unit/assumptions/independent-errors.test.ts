import { describe, expect, it } from 'vitest';
import { independentErrors } from '../../../src-main/assumptions/independent-errors.ts';
import { testContext } from '../../../src-main/assumptions/test-context.ts';
import type { AssumptionOutcome } from '../../../src-main/contract/result.ts';
import { praisWinsten } from '../../../src-main/statistics/prais-winsten.ts';
import { expectClose } from '../../helpers/close.ts';
import { ar1Noise, inventedCo2, logRegressionClaim } from '../../helpers/log-regression-claim.ts';

const nYears = 100;
const { years, co2Ppm, x } = inventedCo2(nYears, 1900);
const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
const mean = (values: readonly number[]) => sum(values) / values.length;

function claimWithNoise(options: Parameters<typeof ar1Noise>[1]) {
  const noise = ar1Noise(nYears, options);
  return logRegressionClaim({
    years,
    co2Ppm,
    temperatureK: x.map((value, row) => 2.7 * value + (noise[row] ?? 0)),
    procedure: { intercept: true },
  });
}

const figure = ({ table }: AssumptionOutcome, label: RegExp) =>
  Number(table?.rows.find(([name]) => label.test(String(name)))?.[1] ?? NaN);

describe('independent-errors', () => {
  it.each([0.3, 0.7])(
    'AR(1) noise with carry-over %f widens the number’s spread as its covariance says',
    (carryOver) => {
      const nRecords = 200;
      const sd = 0.1;
      const values: number[] = [];
      const ar1: number[] = [];
      const ratios: number[] = [];
      const classicalVariances: number[] = [];
      for (let record = 0; record < nRecords; record++) {
        const context = testContext(claimWithNoise({ sd, carryOver, seed: 1000 + record }));
        const outcome = independentErrors.test(context);
        values.push(context.recomputation.value);
        ar1.push(outcome.alternative?.value ?? NaN);
        ratios.push(figure(outcome, /^standard error/));
        classicalVariances.push((context.recomputation.standardError ?? NaN) ** 2);
      }
      // Var(b) = x̃′Ωx̃/(x̃′x̃)² for the centred predictor x̃ and the AR(1) covariance Ω: no large-sample shortcut.
      const centred = x.map((value) => value - mean(x));
      const xx = sum(centred.map((value) => value * value));
      let quadratic = 0;
      centred.forEach((a, i) => centred.forEach((b, j) => (quadratic += a * b * carryOver ** Math.abs(i - j))));
      const trueVariance = (sd ** 2 * quadratic * Math.LN2 ** 2) / xx ** 2;
      const sampleVariance = sum(values.map((value) => (value - mean(values)) ** 2)) / (nRecords - 1);
      // A sample variance of normal values has relative standard error √(2/(n − 1)).
      const fourSigma = 4 * Math.sqrt(2 / (nRecords - 1));
      expect(Math.abs(sampleVariance / trueVariance - 1)).toBeLessThan(fourSigma);
      // Classical errors miss the inflation; Newey–West errors find part of it.
      const inflation = trueVariance / mean(classicalVariances);
      expect(inflation).toBeGreaterThan(carryOver === 0.3 ? 1.5 : 3.5);
      expect(mean(ratios) ** 2).toBeGreaterThan(1.2);
      expect(mean(ratios) ** 2).toBeLessThan(inflation * (1 + fourSigma));
      // The line with AR(1) errors is not biased: its mean is within four standard errors of the truth.
      const truth = 2.7 * Math.LN2;
      const ar1Sd = Math.sqrt(sum(ar1.map((value) => (value - mean(ar1)) ** 2)) / (nRecords - 1));
      expect(Math.abs(mean(ar1) - truth)).toBeLessThan((4 * ar1Sd) / Math.sqrt(nRecords));
    },
  );

  it('gives the number of the line with AR(1) errors, and its own 90 % interval', () => {
    const claim = claimWithNoise({ sd: 0.12, carryOver: 0.6, seed: 4 });
    const context = testContext(claim);
    const { alternative, effect } = independentErrors.test(context);
    const { fit } = context.recomputation;
    const line = praisWinsten({ x: fit?.x ?? [], y: fit?.y ?? [], intercept: true });
    const value = (line.coefficients[1] ?? NaN) * Math.LN2;
    // t quantile at 95 % with 98 degrees of freedom: 1.660551 (R, qt(0.95, 98)).
    const halfWidth = 1.660551 * (line.standardErrors[1] ?? NaN) * Math.LN2;
    const near = { rel: 1e-6, abs: 0, why: 'the quantile is written with seven digits' };
    expectClose(alternative?.value, value, near);
    expectClose(alternative?.interval, { low: value - halfWidth, high: value + halfWidth, levelPercent: 90 }, near);
    expectClose(effect, value - context.recomputation.value, {
      rel: 1e-9,
      abs: 1e-12,
      why: 'difference of close numbers',
    });
  });

  it('does not call correlated residuals a failure when nothing moves', () => {
    const outcome = independentErrors.test(testContext(claimWithNoise({ sd: 0.02, carryOver: 0.7, seed: 6 })));
    expect(figure(outcome, /^Durbin/)).toBeLessThan(1);
    expect(Number(outcome.table?.rows[1]?.[2])).toBeLessThan(0.001);
    expect(outcome).toMatchObject({ weight: 'negligible', proposal: { mark: 'met' } });
  });

  it('does when the interval widens beyond the tolerance', () => {
    const outcome = independentErrors.test(testContext(claimWithNoise({ sd: 0.8, carryOver: 0.8, seed: 6 })));
    expect(outcome.weight).not.toBe('negligible');
    expect(outcome.proposal.mark).toBe('not met');
  });

  it('takes its lags from the procedure', () => {
    const claim = claimWithNoise({ sd: 0.1, carryOver: 0.5, seed: 8 });
    const withLag = (lag: number) =>
      independentErrors.test(
        testContext({
          ...claim,
          procedure: {
            ...claim.procedure,
            covariance: { kind: 'newey-west', lag, smallSample: false },
          } as typeof claim.procedure,
        }),
      );
    expect(withLag(2).table?.rows[1]?.[0]).toBe('Breusch–Godfrey, 2 lags');
    expect(withLag(7).table?.rows[1]?.[0]).toBe('Breusch–Godfrey, 7 lags');
    expect(figure(withLag(2), /^standard error/)).not.toBe(figure(withLag(7), /^standard error/));
  });

  it('has nothing to judge in an exact line', () => {
    const exact = logRegressionClaim({ years, co2Ppm, temperatureK: x.map((value) => 2.7 * value) });
    expect(independentErrors.test(testContext(exact))).toMatchObject({
      isTestable: false,
      proposal: { mark: 'untested' },
    });
  });
});
