import { expect } from 'vitest';
import type { RegressionAnswer } from '../../src-main/contract/result.ts';
import { expectClose, type Tolerance } from './close.ts';

/** Reference figures by the name of the answer's field, tables flattened row by row. */
export type RegressionReference = Partial<Record<Exclude<keyof RegressionAnswer, 'caveats'>, number[]>>;

/** Named tolerances for the parts of a regression's answer that lose digits differently. */
export interface RegressionTolerances {
  figures: Tolerance;
  /** p and fP: of a tail, where a small difference of the statistic is magnified. */
  tails: Tolerance;
  /** Residuals and fitted values; abs in the unit of y. */
  rows: Tolerance;
}

/**
 * The one checker of regression answers: compares every figure that the reference has. What a reference may leave out
 * is the calling test's business; R's leaves out nothing.
 */
export function checkRegression(
  answer: RegressionAnswer,
  reference: RegressionReference,
  tolerances: RegressionTolerances,
): void {
  expect(Object.keys(reference).length).toBeGreaterThan(3);
  for (const [figure, expected] of Object.entries(reference)) {
    const value = answer[figure as keyof RegressionReference];
    const flat = Array.isArray(value) ? value.flat() : [value];
    expectClose(flat, expected, tolerances[kindOf(figure)], figure);
  }
}

function kindOf(figure: string): keyof RegressionTolerances {
  if (figure === 'p' || figure === 'fP') return 'tails';
  return figure === 'residuals' || figure === 'fitted' ? 'rows' : 'figures';
}
