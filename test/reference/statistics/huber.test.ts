import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { huber } from '../../../src-main/statistics/huber.ts';
import { leastSquares } from '../../../src-main/statistics/least-squares.ts';
import { expectClose } from '../../helpers/close.ts';
import { startR, type RSession } from '../../helpers/r-session.ts';
import { co2AndTemperature } from '../../helpers/real-series.ts';

let r: RSession;
beforeAll(async () => {
  r = await startR(new URL('./huber.R', import.meta.url));
});
afterAll(() => r.close());

async function stackloss() {
  const { 'stack.loss': y = [], ...predictors } = await r.numbers('as.list(stackloss)');
  return { x: Object.values(predictors), y };
}

describe('huber', () => {
  // Level B: base R, beside this file.
  it('base R, with and without intercept, two values of k', async () => {
    const { co2Ppm, temperatureK } = co2AndTemperature();
    const record = {
      x: [co2Ppm.map((value) => Math.log(value / co2Ppm[0]!))],
      y: temperatureK.map((value, i) => value - temperatureK[0]! + (i % 13 === 5 ? 0.4 : 0)),
    };
    for (const { x, y } of [await stackloss(), record]) {
      for (const intercept of [true, false]) {
        for (const k of [1.345, 0.8]) {
          const { coefficients, standardErrors, scale, weights } = huber({ x, y, intercept, k });
          const variables = { x: x.flat(), y, nPredictors: x.length, intercept, k };
          const fromR = await r.numbers('huber_fit(x, y, nPredictors, intercept, k)', variables);
          const near = { rel: 1e-9, abs: 0, why: 'two iterations to a standstill' };
          expectClose({ coefficients, standardErrors, scale: [scale], weights }, fromR, near);
        }
      }
    }
  });

  // Printed in the documentation of statsmodels for RLM with HuberT (k = 1.345), cov H1 — quoted from memory.
  it('stackloss as statsmodels prints it', async () => {
    const { coefficients, standardErrors } = huber({ ...(await stackloss()), intercept: true, k: 1.345 });
    const why = 'statsmodels stops at 1e-8 of its criterion';
    expectClose(coefficients, [-41.02649835, 0.82938433, 0.92606597, -0.12784672], { rel: 1e-5, abs: 0, why });
    expectClose(standardErrors, [9.79189854, 0.11100521, 0.30293016, 0.12864961], { rel: 1e-4, abs: 0, why });
  });

  // Level C: a k beyond every residual is least squares.
  it('is least squares when nothing is wild', () => {
    const x = [1, 2, 3, 4, 5, 6];
    const y = [1.1, 1.9, 3.2, 3.9, 5.1, 5.8];
    const plain = leastSquares({ columns: [x.map(() => 1), x], y });
    const { coefficients, standardErrors } = huber({ x, y, intercept: true, k: 100 });
    const near = { rel: 1e-12, abs: 0, why: 'the same line' };
    expectClose(coefficients, plain.coefficients, near);
    const s = Math.sqrt(plain.residualSumOfSquares / 4);
    expectClose(
      standardErrors,
      [0, 3].map((j) => s * Math.sqrt(plain.unscaledCovariance[j]!)),
      near,
    );
  });

  it('says when much of the data counts less', () => {
    const x = Array.from({ length: 12 }, (_, i) => i);
    const y = x.map((value, i) => value + [0.1, -0.2, 3, 0.15, -0.1, -4][i % 6]!);
    expect(huber({ x, y, intercept: true, k: 1.345 }).caveats.map(({ code }) => code)).toEqual(['many-downweighted']);
    expect(huber({ x, y, intercept: true, k: 40 }).caveats).toEqual([]);
  });

  it.each([
    ['k = 0', { x: [1, 2, 3], y: [1, 2, 4], intercept: true, k: 0 }, 'huber, k'],
    ['a line through most rows', { x: [1, 2, 3, 4, 5], y: [1, 2, 3, 4, 9], intercept: true, k: 1 }, 'huber, scale'],
    ['as many rows as coefficients', { x: [1, 2], y: [1, 2], intercept: true, k: 1 }, 'more than 2 rows'],
    ['a constant x', { x: [1, 1, 1], y: [1, 2, 4], intercept: true, k: 1 }, 'huber'],
    ['a missing value', { x: [1, 2, NaN], y: [1, 2, 4], intercept: true, k: 1 }, 'huber, x[2]'],
  ])('refuses %s', (_, request, sentence) => expect(() => huber(request)).toThrow(sentence));
});
