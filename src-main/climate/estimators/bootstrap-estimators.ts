import { lagOneAutocorrelation } from '../../statistics/lag-one-autocorrelation.ts';
import { movingBlockBootstrap } from '../../statistics/moving-block-bootstrap.ts';
import { wilksBlockLength } from '../../statistics/wilks-block-length.ts';
import type { Estimator } from './estimator.ts';

const draws = 2000;

/** The least-squares line with its error from records put together anew. */
export const bootstrapEstimators: readonly Estimator[] = [
  {
    id: 'block-bootstrap',
    label: 'Least squares, block bootstrap',
    order: 'rows',
    estimate({ fit: { x, y, regression }, intercept, computation: { seed } }) {
      const blockLength = wilksBlockLength(y.length, lagOneAutocorrelation(regression.residuals));
      // Residuals on the years as they are: blocks of whole rows would now and then leave x without a spread.
      const request = { x, y, intercept, blockLength, draws, seed, resample: 'residuals' } as const;
      const { slope, standardError, quantiles, random, caveats } = movingBlockBootstrap(request);
      return {
        slope,
        standardError,
        interval95: { low: quantiles.q025, high: quantiles.q975 },
        convention: `moving blocks of ${blockLength} ${blockLength === 1 ? 'year' : 'years'} of centred residuals put back on the line, the length after Wilks 1997; error and interval are standard deviation and quantiles of ${draws} slopes, seed ${seed}`,
        random,
        caveats,
      };
    },
  },
];
