import { describe, expect, it } from 'vitest';
import { evaluateDerivation } from '../../src-main/sources/derivation.ts';
import { correlation } from '../../src-main/statistics/correlation.ts';
import { regression } from '../../src-main/statistics/regression.ts';
import { expectClose } from '../helpers/close.ts';

// Numbers that everyone in the field knows by heart: common practice, no single source, except where one is named.

const printed = (digits: number) => ({
  rel: 0,
  abs: 0.5 * 10 ** -digits,
  why: 'half a unit of the last printed digit',
});
const classical = { kind: 'classical' } as const;

describe('facts of the trade', () => {
  it('ln 2 = 0.693147', () => expectClose(Math.LN2, 0.693147, printed(6)));

  it('a CO2 doubling forces 5.35·ln 2 = 3.71 W/m² (Myhre et al. 1998)', () => {
    const [line] = evaluateDerivation(['5.35 * ln(560/280) = 3.71']).lines;
    expectClose(line?.value, 3.7083, printed(4));
    expect(line?.agrees).toBe(true);
  });

  it('a line through zero on x = ln(C/C0) whose slope is 2.71 K is 1.88 K per doubling', () => {
    const x = [0.1, 0.2, 0.3].map((share) => Math.log(1 + share));
    const { coefficients } = regression({
      x,
      y: x.map((value) => 2.71 * value),
      intercept: false,
      covariance: classical,
    });
    expectClose(coefficients[0]! * Math.LN2, 1.88, printed(2));
  });

  it('r = 0.61 is R² = 37 %, with an intercept', () => {
    // y = 0.61·u + √(1 − 0.61²)·v with u and v uncorrelated and of equal variance.
    const u = [1, 1, -1, -1];
    const v = [1, -1, 1, -1];
    const y = u.map((value, i) => 0.61 * value + Math.sqrt(1 - 0.61 ** 2) * v[i]!);
    expectClose(correlation(u, y), 0.61, { rel: 1e-14, abs: 0, why: 'by construction' });
    const { rSquaredCentred } = regression({ x: u, y, intercept: true, covariance: classical });
    expectClose(100 * (rSquaredCentred ?? 0), 37, printed(0));
  });
});
