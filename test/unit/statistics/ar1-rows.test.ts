import { describe, it } from 'vitest';
import { ar1GapHeight } from '../../../src-main/statistics/ar1-log-likelihood.ts';
import { ar1GapVariance, ar1Rows } from '../../../src-main/statistics/ar1-rows.ts';
import { sumOfProducts } from '../../../src-main/statistics/summation.ts';
import { expectClose } from '../../helpers/close.ts';

const rounding = { rel: 1e-14, abs: 1e-15, why: 'a short exact calculation in doubles' };

describe('ar1Rows', () => {
  it.each([-0.9, 0, 0.6, 0.999])('at ρ = %d, gives rows whose products are those of the inverse covariance', (rho) => {
    // The inverse of the AR(1) covariance σ²ρ^|i−j|/(1 − ρ²): 1 and 1 + ρ² on the diagonal, −ρ beside it.
    const a = Float64Array.of(1, -2, 0.5, 3);
    const b = Float64Array.of(4, 1, -1, 2);
    const diagonal = [1, 1 + rho ** 2, 1 + rho ** 2, 1];
    const byHand = a.reduce((total, value, i) => {
      const beside = (b[i - 1] ?? 0) + (b[i + 1] ?? 0);
      return total + value * (diagonal[i]! * b[i]! - rho * beside);
    }, 0);
    expectClose(sumOfProducts(ar1Rows(a, rho), ar1Rows(b, rho)), byHand, { ...rounding, abs: 1e-13 });
  });

  it.each([-0.9, 0, 0.6, 0.999])(
    'across a gap, gives the products and the determinant of what is left, ρ = %d',
    (rho) => {
      // Rows at years 0 and d: covariance [1, ρ^d; ρ^d, 1]/(1 − ρ²), whose determinant is (1 − ρ^2d)/(1 − ρ²)².
      for (const d of [2, 3, 5]) {
        const [a, b] = [Float64Array.of(1, -2), Float64Array.of(4, 3)];
        const far = rho ** d;
        const byHand = ((1 - rho ** 2) * (1 * 4 + -2 * 3 - far * (1 * 3 + -2 * 4))) / (1 - far ** 2);
        const steps = Float64Array.of(1, d);
        const loss = { ...rounding, rel: 1e-9, abs: 1e-12 };
        expectClose(sumOfProducts(ar1Rows(a, rho, steps), ar1Rows(b, rho, steps)), byHand, loss);
        const { variance, slope } = ar1GapVariance(rho, d);
        expectClose(variance, (1 - far ** 2) / (1 - rho ** 2), loss);
        const step = 2 ** -16;
        const quotient = ar1GapVariance(rho + step, d).variance - ar1GapVariance(rho - step, d).variance;
        expectClose(slope, quotient / (2 * step), { ...loss, rel: 1e-7, abs: 1e-8, why: 'a difference quotient' });
        expectClose(
          ar1GapHeight(rho, steps),
          { height: Math.log(variance) / 2, slope: slope / variance / 2 },
          rounding,
        );
      }
    },
  );

  it('keeps its digits near a unit root', () => {
    expectClose(ar1Rows(Float64Array.of(1), 1 - 2 ** -40)[0], Math.sqrt(2 ** -39 - 2 ** -80), rounding);
  });
});
