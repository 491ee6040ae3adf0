import { huber } from '../../statistics/huber.ts';
import { theilSen } from '../../statistics/theil-sen.ts';
import { freeInterceptCaveats, tInterval, tWords, type Estimator } from './estimator.ts';

/** Keeps 95 % efficiency where errors are normal (Huber 1964). */
const k = 1.345;

/** Lines that single wild years cannot carry away. */
export const robustEstimators: readonly Estimator[] = [
  {
    id: 'theil-sen',
    label: 'Theil–Sen',
    order: 'not used',
    estimate(line) {
      const { slope, confidence, caveats } = theilSen({ x: line.fit.x, y: line.fit.y });
      return {
        slope,
        standardError: null,
        interval95: confidence && { low: confidence[0], high: confidence[1] },
        convention:
          'median of the slopes of all pairs of years; interval of Sen 1968 with ties, which takes errors as independent',
        caveats: [...freeInterceptCaveats(line), ...caveats],
      };
    },
  },
  {
    id: 'huber',
    label: 'Huber',
    order: 'not used',
    estimate({ fit: { x, y }, intercept }) {
      const { coefficients, standardErrors, scale, caveats } = huber({ x, y, intercept, k });
      const place = intercept ? 1 : 0;
      const slope = coefficients[place] ?? NaN;
      const standardError = standardErrors[place] ?? NaN;
      const degreesOfFreedom = y.length - coefficients.length;
      return {
        slope,
        standardError,
        interval95: tInterval(slope, standardError, degreesOfFreedom),
        convention: `k = ${k} scales, scale median |e|/0.6745, iterated to standstill; Huber’s first formula for the error, which takes errors as independent; ${tWords(degreesOfFreedom)}`,
        parameters: [{ symbol: 'scale', value: scale }],
        caveats,
      };
    },
  },
];
