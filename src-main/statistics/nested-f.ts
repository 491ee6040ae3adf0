import { refuseExactFit } from './exact-fit.ts';
import { upperTailF } from './upper-tail-f.ts';

export interface FTest {
  statistic: number;
  /** Coefficients that the larger model has more. */
  numeratorDegrees: number;
  /** Rows less coefficients of the larger model. */
  denominatorDegrees: number;
  p: number;
}

/**
 * F test of a model against a larger one that holds it: do the further coefficients explain more than chance would?
 *
 * Model    [(RSS − RSS_larger)/(difference of coefficients)]/[RSS_larger/(n − k_larger)], F-distributed when the smaller
 *          model is right and the errors independent, normal and of one variance
 *
 * @param sumOfSquares  Σ y², against which an exact fit is told
 * @throws   NumericError exact-fit
 *
 * Checked  test/reference/statistics/specification-tests.test.ts (B: R's anova, through `resetTest` and `chowTest`)
 */
export function nestedF(
  caller: string,
  smaller: { residualSumOfSquares: number; nCoefficients: number },
  larger: { residualSumOfSquares: number; nCoefficients: number },
  { nObs, sumOfSquares }: { nObs: number; sumOfSquares: number },
): FTest {
  refuseExactFit(caller, larger.residualSumOfSquares, sumOfSquares);
  const numeratorDegrees = larger.nCoefficients - smaller.nCoefficients;
  const denominatorDegrees = nObs - larger.nCoefficients;
  const gained = Math.max(0, smaller.residualSumOfSquares - larger.residualSumOfSquares) / numeratorDegrees;
  const statistic = gained / (larger.residualSumOfSquares / denominatorDegrees);
  return {
    statistic,
    numeratorDegrees,
    denominatorDegrees,
    p: upperTailF(statistic, numeratorDegrees, denominatorDegrees),
  };
}
