import type { Caveat } from '../contract/primitives.ts';
import { refuseExactFit } from './exact-fit.ts';
import { finiteNumber } from './finite-values.ts';
import { LEVERAGE_OF_ONE, type LeastSquaresFit } from './least-squares.ts';
import { sumOfProducts } from './summation.ts';

export interface LeaveOneOut {
  /** [nObs] the coefficient of the fit without that row; null where the row alone decides some coefficient. */
  coefficients: (number | null)[];
  /** The row without which the coefficient moves furthest; null when every row decides something alone. */
  mostInfluential: { row: number; coefficient: number } | null;
  caveats: Caveat[];
}

/**
 * Leave-one-out: one coefficient of a least-squares fit without each row in turn, from the fit of all rows, without
 * fitting anew.
 *
 * Model    b without row i = b − [(X′WX)⁻¹ X′W]_i e_i/(1 − h_i), e_i the row's residual, h_i its leverage
 *
 * @param fit    a least-squares fit, weighted or not
 * @param place  which coefficient, counted from 0 in the order of the fit's columns
 * @returns  caveat leverage-of-one names the rows (counted from 1) without which the columns are dependent
 * @throws   InputError out-of-range; NumericError exact-fit, whose most influential row would be one of rounding
 *
 * Source   Miller 1974, Ann. Stat. 2, 880–891; Belsley, Kuh & Welsch 1980, Regression Diagnostics, equation 2.1
 * Checked  test/unit/statistics/leave-one-out.test.ts (C: refits), test/reference/statistics/leave-one-out.test.ts (B: R's lm.influence)
 */
export function leaveOneOut(fit: LeastSquaresFit, place: number): LeaveOneOut {
  finiteNumber('leaveOneOut', 'place', place, { isWhole: true, atLeast: 0, atMost: fit.nCoefficients - 1 });
  if (fit.nObs > fit.nCoefficients) {
    refuseExactFit('leaveOneOut', fit.residualSumOfSquares, sumOfProducts(fit.y, fit.y));
  }
  const whole = fit.coefficients[place]!;
  const influence = fit.observationInfluence[place]!;
  const coefficients = Array.from(fit.residuals, (residual, i) => {
    const leverage = fit.leverage[i]!;
    return leverage > LEVERAGE_OF_ONE ? null : whole - (influence[i]! * residual) / (1 - leverage);
  });
  let mostInfluential: LeaveOneOut['mostInfluential'] = null;
  coefficients.forEach((coefficient, row) => {
    if (coefficient === null) return;
    const isFurther =
      mostInfluential === null || Math.abs(coefficient - whole) > Math.abs(mostInfluential.coefficient - whole);
    if (isFurther) mostInfluential = { row, coefficient };
  });
  const alone = coefficients.flatMap((coefficient, i) => (coefficient === null ? [i + 1] : []));
  return {
    coefficients,
    mostInfluential,
    caveats:
      alone.length === 0
        ? []
        : [
            {
              code: 'leverage-of-one',
              detail: `Without row ${alone.join(' or ')} some coefficient has nothing to rest on: the fit without it does not exist.`,
            },
          ],
  };
}
