import { describe, expect, it } from 'vitest';
import type { SlopeCovariance } from '../../../src-main/contract/procedure.ts';
import { growingSlope } from '../../../src-main/statistics/growing-slope.ts';
import { regression } from '../../../src-main/statistics/regression.ts';
import { expectClose } from '../../helpers/close.ts';

// Level C: a fit by pivoted QR with refinement, and covariances from lagged cross products, on the rows of each window.

const sameFit = { rel: 1e-10, abs: 0, why: 'running sums, and sums over L + 1 scores, against the definitions' };

const nRows = 45;
const x = Float64Array.from({ length: nRows }, (_, t) => 5.7 + 0.004 * t + 0.00002 * t * t);
const noise = x.map((_, t) => Math.sin(t * t) + Math.sin(t / 4));
const rows = (values: Float64Array, first: number, last: number, less: number) =>
  Array.from(values.subarray(first, last + 1), (value) => value - less);

describe('growingSlope', () => {
  const classical: SlopeCovariance = { kind: 'classical' };
  const neweyWest = (lag: number, smallSample = false): SlopeCovariance => ({ kind: 'newey-west', lag, smallSample });
  const covariances = [classical, neweyWest(0), neweyWest(1), neweyWest(5), neweyWest(5, true), neweyWest(9)];
  const records: [string, Float64Array][] = [
    ['a trend with noise', x.map((value, t) => 3 * value + 0.1 * noise[t]!)],
    // The doubles near 5.7 lie 9e-16 apart: 1e-10 of a standard error has digits of the data only where noise is above 1e-5.
    ['a close fit', x.map((value, t) => 3 * (value - 5.7) + 1e-4 * noise[t]!)],
    ['a far level', x.map((value, t) => 300 + 3 * value + 0.1 * noise[t]!)],
    ['a step', x.map((_, t) => (t < 20 ? 0 : 5) + 0.1 * noise[t]!)],
  ];
  const choices = records.flatMap(([record, y]) =>
    covariances.flatMap((covariance) =>
      [true, false].map((intercept) => ({ record, y, covariance, intercept, options: JSON.stringify(covariance) })),
    ),
  );

  it.each(choices)('$record, $options, intercept $intercept', ({ y, covariance, intercept }) => {
    const slopeFrom = growingSlope(x, y, { intercept, covariance });
    for (let first = 0; first + 10 <= nRows; first += 4) {
      const slopeTo = slopeFrom(first, { x0: x[first]!, y0: y[first]! });
      for (let last = first + 9; last < nRows; last++) {
        const fit = regression({
          x: rows(x, first, last, x[first]!),
          y: rows(y, first, last, y[first]!),
          intercept,
          covariance,
        });
        expectClose(
          slopeTo(last),
          { slope: fit.coefficients.at(-1), standardError: fit.standardErrors.at(-1) },
          sameFit,
        );
      }
    }
  });

  it('gives none where x does not vary, and goes on where it varies again', () => {
    const flat = x.map((value, t) => (t < 12 ? 5.7 : value));
    const slopeTo = growingSlope(flat, noise, { intercept: true, covariance: neweyWest(2) })(0, { x0: 5.7, y0: 0 });
    expect(slopeTo(11)).toBeNull();
    expect(slopeTo(12)).not.toBeNull();
  });

  it('takes a lag of all rows but one, by hand', () => {
    const line = Float64Array.of(-1, 0, 1);
    const y = Float64Array.of(1, -2, 1);
    const slope = growingSlope(line, y, { intercept: true, covariance: neweyWest(2) })(0, { x0: -1, y0: 1 })(2);
    // s = (−1, 0, 1): sums over three in a row −1, −1, 0, 1, 1; their squares 4; 4/3 over S_xx² = 4.
    expectClose(slope, { slope: 0, standardError: Math.sqrt(4 / 3) / 2 }, { rel: 1e-15, abs: 1e-15, why: 'by hand' });
  });
});
