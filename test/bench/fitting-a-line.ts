import { SimpleLinearRegression } from 'ml-regression';
import { linearRegression } from 'simple-statistics';
import { straightLine } from '../../src-main/statistics/straight-line.ts';
import type { BenchCase, Values } from './bench-case.ts';
import { sameNumbers } from './comparison.ts';

/** Enough for a clock: one fit takes a tenth of a microsecond. */
const nFits = 1000;

/** Slope and intercept of a line through 61 rows, over and over. */
export function caseOfFitting(): BenchCase {
  const x = Array.from({ length: 61 }, (_, place) => 0.0044 * place + 0.000015 * place ** 2);
  const y = x.map((value, place) => 0.2 + 3 * value + 0.1 * Math.sin(place ** 2));
  const pairs = x.map((value, place) => [value, y[place]!]);
  const compare = sameNumbers({ rel: 1e-12, why: 'the same rows, summed otherwise' });
  return {
    name: `a line through 61 rows, ${nFits} times`,
    own: repeated(() => straightLine(x, y) ?? { intercept: NaN, slope: NaN }),
    peers: [
      {
        name: 'simple-statistics linearRegression',
        work: repeated(() => {
          const { m: slope, b: intercept } = linearRegression(pairs);
          return { intercept, slope };
        }),
        atMost: 1,
        compare,
      },
      {
        name: 'ml-regression SimpleLinearRegression',
        work: repeated(() => new SimpleLinearRegression(x, y)),
        atMost: 1,
        compare,
      },
    ],
  };
}

/** The sums of all fits, so that none can be left out. */
function repeated(fit: () => { intercept: number; slope: number }): () => Values {
  return () => {
    let [intercepts, slopes] = [0, 0];
    for (let done = 0; done < nFits; done++) {
      const { intercept, slope } = fit();
      intercepts += intercept;
      slopes += slope;
    }
    return [intercepts, slopes];
  };
}
