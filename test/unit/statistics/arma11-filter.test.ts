import { describe, it } from 'vitest';
import { arma11Filter } from '../../../src-main/statistics/arma11-filter.ts';
import { expectClose } from '../../helpers/close.ts';

// Level C: products of freed rows are a′V⁻¹b and the variances multiply to |V|, V the covariance of the process at the
// rows' times, written out for three rows and inverted by cofactors.

const rounding = { rel: 1e-11, abs: 1e-11, why: 'a three by three inverse' };
const [a, b] = [Float64Array.of(1.3, -0.4, 2.2), Float64Array.of(0.7, 1.9, -1.1)];

function covariance(phi: number, theta: number, times: number[]): number[][] {
  return times.map((one) =>
    times.map((other) => {
      const lag = Math.abs(one - other);
      if (lag === 0) return (1 + 2 * phi * theta + theta ** 2) / (1 - phi ** 2);
      return (phi ** (lag - 1) * (phi + theta) * (1 + phi * theta)) / (1 - phi ** 2);
    }),
  );
}

describe('arma11Filter', () => {
  it.each([
    [0.7, 0.3, [0, 1, 2]],
    [0.7, 0.3, [0, 3, 4]],
    [-0.6, 0.9, [0, 1, 5]],
    [0.95, -0.8, [0, 2, 4]],
    [0.4, 1, [0, 1, 2]],
    [0.4, -1, [0, 1, 3]],
    [0.5, 0, [0, 2, 3]],
    [0.5, -0.5, [0, 2, 3]],
  ])('φ %d, θ %d, rows at %j', (phi, theta, times) => {
    const v = covariance(phi, theta, times);
    const at = (i: number, j: number) => v[i % 3]![j % 3]!;
    const cofactor = (i: number, j: number) =>
      at(i + 1, j + 1) * at(i + 2, j + 2) - at(i + 1, j + 2) * at(i + 2, j + 1);
    const determinant = [0, 1, 2].reduce((sum, j) => sum + at(0, j) * cofactor(0, j), 0);
    const product = (p: Float64Array, q: Float64Array) =>
      [0, 1, 2].reduce((sum, i) => sum + [0, 1, 2].reduce((part, j) => part + p[i]! * cofactor(i, j) * q[j]!, 0), 0) /
      determinant;
    const filter = arma11Filter(
      phi,
      theta,
      Float64Array.from(times, (time, t) => (t === 0 ? 1 : time - times[t - 1]!)),
    );
    const [freedA, freedB] = [filter.freed(a), filter.freed(b)];
    const dot = (p: Float64Array, q: Float64Array) => p.reduce((sum, value, t) => sum + value * q[t]!, 0);
    expectClose(
      [dot(freedA, freedB), dot(freedA, freedA), dot(freedB, freedB)],
      [product(a, b), product(a, a), product(b, b)],
      rounding,
    );
    expectClose(filter.logVariances, Math.log(determinant), rounding);
  });
});
