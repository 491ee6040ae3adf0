import type { GlsAr1Input } from '../../contract/line-estimators.ts';
import { ar1Line } from '../../statistics/ar1-line.ts';
import { tInterval, tWords, type ComparedLine, type Estimator, type SlopeEstimate } from './estimator.ts';

const model = 'e_t = ρ e_(t−1) + u_t';
const errorWords = 'its error takes ρ for known';
const shareWords = 'ρ = Σ e_t e_(t−1)/Σ e²_(t−1), repeated until ρ stands still';

function ar1Slope(
  { fit: { x, y, years }, intercept }: ComparedLine,
  estimator: GlsAr1Input['estimator'],
  words: string,
): SlopeEstimate {
  const isByCalendar = estimator === 'ml' || estimator === 'reml';
  const line = ar1Line({ x, y, intercept, estimator, ...(isByCalendar ? { years } : {}) });
  const place = intercept ? 1 : 0;
  const slope = line.coefficients[place] ?? NaN;
  const standardError = line.standardErrors[place] ?? NaN;
  const nRows = estimator === 'cochrane-orcutt' ? y.length - 1 : y.length;
  const degreesOfFreedom = nRows - line.coefficients.length;
  return {
    slope,
    standardError,
    interval95: tInterval(slope, standardError, degreesOfFreedom),
    convention: `${model}; ${words}; ${errorWords}; ${tWords(degreesOfFreedom)}`,
    parameters: [
      { symbol: 'ρ', value: line.rho },
      { symbol: 'σ', value: line.sigma },
    ],
    caveats: line.caveats,
  };
}

/** The line whose errors carry over a share ρ from year to year. */
export const ar1Estimators: readonly Estimator[] = [
  {
    id: 'gls-ar1-ml',
    label: 'AR(1), maximum likelihood',
    order: 'calendar',
    estimate: (line) => ar1Slope(line, 'ml', 'exact normal likelihood of all rows at its highest point'),
  },
  {
    id: 'gls-ar1-reml',
    label: 'AR(1), restricted likelihood',
    order: 'calendar',
    estimate: (line) =>
      ar1Slope(line, 'reml', 'exact restricted normal likelihood (REML), which allows for the fitted coefficients'),
  },
  {
    id: 'prais-winsten',
    label: 'AR(1), Prais–Winsten',
    order: 'rows',
    estimate: (line) =>
      ar1Slope(line, 'prais-winsten', `least squares on rows freed from ρ, the first kept; ${shareWords}`),
  },
  {
    id: 'cochrane-orcutt',
    label: 'AR(1), Cochrane–Orcutt',
    order: 'rows',
    estimate: (line) =>
      ar1Slope(line, 'cochrane-orcutt', `least squares on rows freed from ρ, the first left out; ${shareWords}`),
  },
];
