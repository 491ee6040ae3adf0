import type { RegressionRequest } from '../../contract/compute.ts';
import type { RegressionAnswer } from '../../contract/result.ts';
import { regression } from '../../statistics/regression.ts';
import { covarianceWords } from '../procedures/slope-estimates.ts';
import { tWords, type ComparedLine, type Estimator, type SlopeEstimate } from './estimator.ts';

/** Doubts that bear on a slope and its error; those on figures that are not shown here stay out. */
const telling = ['few-degrees-of-freedom', 'short-series-for-lag', 'ill-conditioned', 'exact-fit'];

function leastSquaresSlope(
  { fit: { x, y } }: ComparedLine,
  intercept: boolean,
  covariance: RegressionRequest['covariance'],
  words: string,
): SlopeEstimate {
  return slopeEstimate(regression({ x, y, intercept, covariance }), intercept, words);
}

function slopeEstimate(answer: RegressionAnswer, intercept: boolean, words: string): SlopeEstimate {
  const place = intercept ? 1 : 0;
  const [low, high] = answer.confidence95[place] ?? [NaN, NaN];
  return {
    slope: answer.coefficients[place] ?? NaN,
    standardError: answer.standardErrors[place] ?? NaN,
    interval95: { low, high },
    convention: `${words}; ${tWords(answer.degreesOfFreedom)}`,
    caveats: answer.caveats.filter(({ code }) => telling.includes(code)),
  };
}

function scoreWords(intercept: boolean): string {
  return intercept ? 'the products of x and residual, the constant’s left out' : 'the products of x and residual';
}

const classical = covarianceWords({ kind: 'classical' });

/** The least-squares line with its error counted in the usual ways. */
export const leastSquaresEstimators: readonly Estimator[] = [
  {
    id: 'ols-classical',
    label: 'Least squares, classical',
    order: 'not used',
    estimate: (line) => leastSquaresSlope(line, line.intercept, { kind: 'classical' }, classical),
  },
  {
    id: 'ols-hc3',
    label: 'Least squares, HC3',
    order: 'not used',
    estimate: (line) =>
      leastSquaresSlope(
        line,
        line.intercept,
        { kind: 'hc3' },
        'HC3: variances may differ from row to row, each squared residual over (1 − leverage)²; errors uncorrelated',
      ),
  },
  {
    id: 'ols-newey-west',
    label: 'Least squares, Newey–West',
    order: 'rows',
    estimate(line) {
      const { procedure, serialCovariance } = line;
      const origin =
        procedure.covariance.kind === 'newey-west'
          ? 'the lag is the procedure’s own'
          : 'the lag is the rule of thumb floor(4 (n/100)^(2/9))';
      return leastSquaresSlope(
        line,
        line.intercept,
        serialCovariance,
        `${covarianceWords(serialCovariance)}; ${origin}`,
      );
    },
  },
  {
    id: 'ols-newey-west-1994',
    label: 'Least squares, Newey–West, lag from the data',
    order: 'calendar',
    estimate({ fit: { x, y, years }, intercept }) {
      const covariance = { kind: 'newey-west', lag: 'newey-west-1994' } as const;
      const answer = regression({ x, y, years, intercept, covariance });
      const words = covarianceWords({ kind: 'newey-west', lag: answer.chosenLag ?? NaN, smallSample: false });
      return slopeEstimate(
        answer,
        intercept,
        `${words}; the lag is that of Newey & West 1994 for ${scoreWords(intercept)}`,
      );
    },
  },
  {
    id: 'ols-free-intercept',
    label: 'Least squares, free intercept',
    order: 'not used',
    applies: ({ intercept }) => !intercept,
    estimate: (line) =>
      leastSquaresSlope(line, true, { kind: 'classical' }, `${classical}; the line need not pass through the anchor`),
  },
];
