import { describe, expect, it } from 'vitest';
import { prewhitenedScores } from '../../../src-main/statistics/prewhitened-scores.ts';
import { expectClose } from '../../helpers/close.ts';

const rounding = { rel: 1e-13, abs: 1e-14, why: 'a short calculation in doubles' };

describe('prewhitenedScores', () => {
  it('one score, by hand', () => {
    // (8 + 2 + 2)/(16 + 4 + 1) = 4/7
    const { innovations, recolouring } = prewhitenedScores([new Float64Array([4, 2, 1, 2])]);
    expectClose(innovations, [[2 - 16 / 7, 1 - 8 / 7, 2 - 4 / 7]], rounding);
    expectClose(recolouring, [[7 / 3]], rounding);
  });

  it('two scores: the innovations are uncorrelated with the row before, and the recolouring undoes I − A', () => {
    const scores = [new Float64Array([1, 3, -2, 0, 2, -1, 1]), new Float64Array([2, -1, 0, 4, -3, 1, 1])];
    const { innovations, recolouring } = prewhitenedScores(scores);
    for (const innovation of innovations) {
      for (const score of scores) {
        const product = innovation.reduce((total, u, t) => total + u * score[t]!, 0);
        expectClose(product, 0, { rel: 0, abs: 1e-12, why: 'rounding of a sum of size 30' });
      }
    }
    // (I − A) s_{t−1} = s_{t−1} − s_t + u_t, so that the recolouring gives s_{t−1} back.
    for (let t = 1; t < 7; t++) {
      const forgotten = scores.map((score, i) => score[t - 1]! - score[t]! + innovations[i]![t - 1]!);
      const back = recolouring.map((row) => row.reduce((total, share, j) => total + share * forgotten[j]!, 0));
      expectClose(back, [scores[0]![t - 1], scores[1]![t - 1]], { ...rounding, rel: 1e-12, abs: 1e-12 });
    }
  });

  it('refuses scores that grow, and too few rows', () => {
    expect(() => prewhitenedScores([new Float64Array([1, 2, 4, 8.5])])).toThrow(
      'expected scores that forget their past (eigenvalues below 1 in modulus), but found an eigenvalue of 2.1',
    );
    // A turning pair: eigenvalues ±1.49 i, whose real parts are zero.
    const turn = [new Float64Array([1, 0, -2.25, 0, 5]), new Float64Array([0, 1.5, 0, -3.4, 0])];
    expect(() => prewhitenedScores(turn)).toThrow('an eigenvalue of 1.49');
    expect(() => prewhitenedScores([new Float64Array([1, 2])])).toThrow('expected more than 2 rows');
    expect(() => prewhitenedScores([new Float64Array([0, 0, 0, 0])])).toThrow('prewhitenedScores');
  });
});
