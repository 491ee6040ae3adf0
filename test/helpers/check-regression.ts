import { expect } from 'vitest';
import type { RegressionAnswer } from '../../src-main/contract/result.ts';
import { expectClose, type Tolerance } from './close.ts';
import type { RNumbers } from './r-session.ts';

/** Named tolerances for the parts of a regression's answer that lose digits differently. */
export interface RegressionTolerances {
  figures: Tolerance;
  /** p and fP: of a tail, where a small difference of the statistic is magnified. */
  tails: Tolerance;
  /** Residuals and fitted values; abs in the unit of y. */
  rows: Tolerance;
}

/** Compares every figure of a regression's answer with the list that reference_regression of regression.R returns. */
export function checkRegression(answer: RegressionAnswer, fromR: RNumbers, tolerances: RegressionTolerances): void {
  const { caveats, ...table } = answer;
  expect(Array.isArray(caveats)).toBe(true);
  expect(Object.keys(table).sort()).toEqual(Object.keys(fromR).sort());
  for (const [name, value] of Object.entries(table)) {
    const flat = Array.isArray(value) ? value.flat() : [value];
    expectClose(flat, fromR[name], tolerances[kindOf(name)], name);
  }
}

function kindOf(figure: string): keyof RegressionTolerances {
  if (figure === 'p' || figure === 'fP') return 'tails';
  return figure === 'residuals' || figure === 'fitted' ? 'rows' : 'figures';
}
