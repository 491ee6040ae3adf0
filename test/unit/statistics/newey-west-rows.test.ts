import { describe, expect, it } from 'vitest';
import { leastSquares } from '../../../src-main/statistics/least-squares.ts';
import { neweyWestRows } from '../../../src-main/statistics/newey-west-rows.ts';
import { expectClose } from '../../helpers/close.ts';

const rounding = { rel: 1e-13, abs: 1e-15, why: 'a short calculation in doubles' };

describe('neweyWestRows', () => {
  // Through the origin: x = 1, 2, 2; y = 2, 1, 3; weights 1, 2, 1: Σwx² = 13, Σwxy = 12.
  const x = [1, 2, 2];
  const fit = leastSquares({ columns: [x], y: [2, 1, 3], weights: [1, 2, 1] });
  const scores = [2 - 12 / 13, 4 * (1 - 24 / 13), 2 * (3 - 24 / 13)] as const;

  it('are x w e and their share in the coefficient, by hand', () => {
    const rows = neweyWestRows(fit, {});
    expectClose(rows.scores, [scores], rounding);
    expectClose(rows.influence, [scores.map((score) => score / 13)], rounding);
  });

  it('stand in their years', () => {
    const rows = neweyWestRows(fit, { years: [2000, 2001, 2003] });
    expectClose(rows.scores, [[scores[0], scores[1], 0, scores[2]]], rounding);
    expectClose(rows.influence, [[scores[0] / 13, scores[1] / 13, 0, scores[2] / 13]], rounding);
  });

  it('prewhitened: innovations, and what they do to the coefficient once recoloured, by hand', () => {
    const carryOver = (scores[0] * scores[1] + scores[1] * scores[2]) / (scores[0] ** 2 + scores[1] ** 2);
    const innovations = [scores[1] - carryOver * scores[0], scores[2] - carryOver * scores[1]];
    const rows = neweyWestRows(fit, { prewhiten: 'var1', years: [2000, 2001, 2002] });
    expectClose(rows.scores, [innovations], rounding);
    expectClose(rows.influence, [innovations.map((u) => u / (1 - carryOver) / 13)], rounding);
  });

  it('refuses to prewhiten across a gap', () => {
    expect(() => neweyWestRows(fit, { prewhiten: 'var1', years: [2000, 2001, 2003] })).toThrow(
      'expected consecutive years, each foretold by the one before, but found 1 year is missing in 1 gap',
    );
  });
});
