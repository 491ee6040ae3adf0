import { glsArma11 } from '../../statistics/gls-arma11.ts';
import { tInterval, tWords, type Estimator } from './estimator.ts';

/** The line whose errors keep a memory longer than their first correlation says. */
export const arma11Estimators: readonly Estimator[] = [
  {
    id: 'gls-arma11',
    label: 'ARMA(1,1), maximum likelihood',
    order: 'calendar',
    estimate({ fit: { x, y, years }, intercept }) {
      const { coefficients, standardErrors, phi, theta, sigma, caveats } = glsArma11({ x, y, intercept, years });
      const place = intercept ? 1 : 0;
      const slope = coefficients[place] ?? NaN;
      const standardError = standardErrors[place] ?? NaN;
      const degreesOfFreedom = y.length - coefficients.length;
      return {
        slope,
        standardError,
        interval95: tInterval(slope, standardError, degreesOfFreedom),
        convention: `e_t = φ e_(t−1) + u_t + θ u_(t−1); exact normal likelihood of all rows, the highest of the tops climbed from many starts; its error takes φ and θ for known; ${tWords(degreesOfFreedom)}`,
        parameters: [
          { symbol: 'φ', value: phi },
          { symbol: 'θ', value: theta },
          { symbol: 'σ', value: sigma },
        ],
        caveats,
      };
    },
  },
];
