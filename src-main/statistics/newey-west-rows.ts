import { InputError } from '../errors.ts';
import { calendarRows } from './calendar-rows.ts';
import { errorInfluence } from './error-influence.ts';
import type { LeastSquaresFit } from './least-squares.ts';
import { prewhitenedScores } from './prewhitened-scores.ts';
import { missingYears } from './year-steps.ts';

export interface NeweyWestSetting {
  /** By a VAR(1) of the scores; not unless given. */
  prewhiten?: 'var1' | undefined;
  /** [nObs] whole, increasing: distances are then those of the calendar. */
  years?: ArrayLike<number> | undefined;
}

export interface NeweyWestRows {
  /** Scores s_t = x_t w_t e_t, or what a VAR(1) leaves of them: nCoefficients × [nRows]. */
  scores: readonly Float64Array[];
  /** What each row of scores does to the coefficients: nCoefficients × [nRows], unit of the coefficients. */
  influence: readonly Float64Array[];
}

/**
 * The rows whose lagged products make up a Newey–West covariance: in the order of the fit, or in their years with zeros
 * where there is none, or prewhitened.
 *
 * @throws   as `yearSteps` and `prewhitenedScores`; InputError gap-in-years for prewhitening across a missing year
 *
 * Checked  test/unit/statistics/newey-west-rows.test.ts (C: by hand); through `regression` (B)
 */
export function neweyWestRows(fit: LeastSquaresFit, { prewhiten, years }: NeweyWestSetting): NeweyWestRows {
  const { columns, residuals, weights, nCoefficients, unscaledCovariance } = fit;
  const scores = columns.map((column) => column.map((value, t) => value * residuals[t]! * (weights?.[t] ?? 1)));
  if (prewhiten === undefined) {
    return {
      scores: calendarRows('neweyWest', scores, years),
      influence: calendarRows('neweyWest', errorInfluence(fit), years),
    };
  }
  refuseGaps(years, fit.nObs);
  const { innovations, recolouring } = prewhitenedScores(scores);
  const recoloured = combined(recolouring, innovations);
  const bread = Array.from({ length: nCoefficients }, (_, j) =>
    unscaledCovariance.subarray(j * nCoefficients, (j + 1) * nCoefficients),
  );
  return { scores: innovations, influence: combined(bread, recoloured) };
}

/** The matrix times each row of the columns. */
function combined(matrix: readonly ArrayLike<number>[], columns: readonly Float64Array[]): Float64Array[] {
  return matrix.map((shares) =>
    Float64Array.from(columns[0]!, (_, t) => columns.reduce((total, column, j) => total + shares[j]! * column[t]!, 0)),
  );
}

function refuseGaps(years: ArrayLike<number> | undefined, nObs: number): void {
  const missing = missingYears('neweyWest', years, nObs);
  if (missing === null) return;
  throw new InputError({
    code: 'gap-in-years',
    where: 'neweyWest, prewhiten',
    expected: 'consecutive years, each foretold by the one before',
    received: missing.slice(0, -1),
    hint: 'Leave prewhitening out, or take a window without a gap.',
  });
}
