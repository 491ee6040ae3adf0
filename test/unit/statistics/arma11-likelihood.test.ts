import { describe, it } from 'vitest';
import { arma11Likelihood } from '../../../src-main/statistics/arma11-likelihood.ts';
import { randomStream } from '../../../src-main/statistics/random-stream.ts';
import { expectClose } from '../../helpers/close.ts';

// Level C: the derivatives against difference quotients of the likelihood, which R gives the height of elsewhere.

const stream = randomStream(3, 0);
const y = Float64Array.from({ length: 30 }, () => stream.normal());
const columns = [new Float64Array(30).fill(1), y.map((_, t) => t / 10)];
const consecutive = new Float64Array(30).fill(1);
const withGaps = consecutive.map((_, t) => (t === 7 ? 4 : t === 19 ? 2 : 1));

describe('arma11Likelihood', () => {
  it.each([
    [0.5, 0.3],
    [-0.7, 0.9],
    [0.95, -0.6],
    [0.2, -0.2],
    [0.3, 1],
  ])('slopes at φ %d, θ %d', (phi, theta) => {
    for (const steps of [consecutive, withGaps]) {
      const height = arma11Likelihood(columns, y, steps);
      const { slopePhi, slopeTheta } = height(phi, theta);
      const step = 1e-4;
      // Fourth-order differences, so that the step may be large against rounding.
      const quotient = (at: (offset: number) => number) =>
        (8 * (at(step) - at(-step)) - (at(2 * step) - at(-2 * step))) / (12 * step);
      expectClose(
        [slopePhi, slopeTheta],
        [
          quotient((offset) => height(phi + offset, theta).logLikelihood),
          quotient((offset) => height(phi, theta + offset).logLikelihood),
        ],
        { rel: 1e-8, abs: 1e-8, why: 'rounding of the heights over a step of 1e-4' },
      );
    }
  });
});
