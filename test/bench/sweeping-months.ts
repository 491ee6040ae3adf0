import { growingSlope } from '../../src-main/statistics/growing-slope.ts';
import type { BenchCase } from './bench-case.ts';
import { sameNumbers } from './comparison.ts';
import { pythonRecord } from './python-peer.ts';

const fewestMonths = 240;
const step = 6;

/** What a sweep is made of, on 744 months: windows of at least 240, every sixth start and end, Newey–West errors of lag 12. */
export function caseOfSweepingMonths(): BenchCase {
  const { co2Ppm, temperatureK } = pythonRecord('monthly');
  const y = Float64Array.from(temperatureK);
  return {
    name: 'window sweep, 744 months',
    own: () => {
      const x = Float64Array.from(co2Ppm, Math.log);
      const covariance = { kind: 'newey-west', lag: 12, smallSample: false } as const;
      const slopeFrom = growingSlope(x, y, { intercept: true, covariance });
      let [total, count] = [0, 0];
      for (let first = 0; first + fewestMonths <= x.length; first += step) {
        const slopeTo = slopeFrom(first, { x0: x[first]!, y0: y[first]! });
        for (let last = first + fewestMonths - 1; last < x.length; last += step) {
          const { slope, standardError } = slopeTo(last) ?? { slope: NaN, standardError: NaN };
          total += slope + standardError;
          count++;
        }
      }
      return [total, count];
    },
    peers: [
      {
        name: 'a loop in numpy',
        work: { task: 'sweep-monthly' },
        atMost: 1 / 4,
        compare: sameNumbers({ rel: 1e-10, why: 'the same rows, summed otherwise' }),
      },
    ],
  };
}
