import { describe, expect, it } from 'vitest';
import { iteratedAr1 } from '../../../src-main/statistics/iterated-ar1.ts';
import { expectClose } from '../../helpers/close.ts';

const rounding = { rel: 1e-10, abs: 1e-12, why: 'rho stands still to 1e-12' };

describe('iteratedAr1', () => {
  it('level C: ends where both steps leave everything as it is', () => {
    // A level alone, the first row left out: b = mean of y_t − ρ y_{t−1} over 1 − ρ, ρ = Σ e_t e_{t−1}/Σ e²_{t−1}.
    const y = [1, 2, 4, 3, 3, 5, 6, 4, 3, 2];
    const { coefficients, rho, standardErrors, residualStandardDeviation, degreesOfFreedom } = iteratedAr1(
      'test',
      { x: y.map(() => 1), y, intercept: false },
      (column, share) => column.subarray(1).map((value, t) => value - share * (column[t] ?? NaN)),
    );
    const [level = NaN] = coefficients;
    const freed = y.slice(1).map((value, t) => value - rho * (y[t] ?? NaN));
    expectClose(level * (1 - rho), freed.reduce((sum, value) => sum + value, 0) / 9, rounding);
    const e = y.map((value) => value - level);
    const products = (lag: number) => e.slice(1).reduce((sum, _, t) => sum + (e[t] ?? NaN) * (e[t + lag] ?? NaN), 0);
    expectClose(rho, products(1) / products(0), rounding);
    const variance = freed.reduce((sum, value) => sum + (value - level * (1 - rho)) ** 2, 0) / 8;
    expect(degreesOfFreedom).toBe(8);
    expectClose(residualStandardDeviation ** 2, variance, rounding);
    expectClose(standardErrors, [Math.sqrt(variance / 9) / (1 - rho)], rounding);
  });

  it('names its caller in a refusal', () => {
    const drop = (column: Float64Array) => column.subarray(2);
    expect(() => iteratedAr1('someone', { x: [1, 2, 3, 5], y: [1, 3, 2, 4], intercept: true }, drop)).toThrow(
      'someone: expected more than 2 freed rows for 2 coefficients, but found 2',
    );
  });
});
