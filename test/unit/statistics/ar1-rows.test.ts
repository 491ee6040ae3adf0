import { describe, it } from 'vitest';
import { ar1Rows } from '../../../src-main/statistics/ar1-rows.ts';
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

  it('keeps its digits near a unit root', () => {
    expectClose(ar1Rows(Float64Array.of(1), 1 - 2 ** -40)[0], Math.sqrt(2 ** -39 - 2 ** -80), rounding);
  });
});
