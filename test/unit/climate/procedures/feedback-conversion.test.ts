import { describe, expect, it } from 'vitest';
import { feedbackConversion } from '../../../../src-main/climate/procedures/feedback-conversion.ts';
import { recompute } from '../../../../src-main/climate/procedures/recompute.ts';
import type { Statement } from '../../../../src-main/contract/claim.ts';
import type { FeedbackProcedure } from '../../../../src-main/contract/procedure.ts';
import { recomputation } from '../../../../src-main/contract/result.ts';
import { computationOf } from '../../../helpers/claim-computation.ts';
import { expectClose } from '../../../helpers/close.ts';

// AR6 WG1: α = −1.16 (−1.81 to −0.51) W/m² per K, §7.4.2.7; F2x = 3.93 ± 0.47 W/m², §7.3.2.1.
const procedure: FeedbackProcedure = {
  kind: 'feedback',
  gives: 'sensitivity',
  known: { best: 1.16, low: 0.51, high: 1.81, levelPercent: 90, source: 'AR6' },
  doublingWm2: { best: 3.93, low: 3.46, high: 4.4, levelPercent: 90, source: 'AR6' },
  draws: 200_000,
};
const stated: Partial<Statement> = {
  quantity: 'equilibrium-climate-sensitivity',
  unit: 'K per doubling',
  bound: 'equals',
  value: '3.4',
};

describe('feedbackConversion', () => {
  it('gives AR6’s process-based sensitivity: 3.4, very likely 2.1 to 7.7', () => {
    const answer = recompute(computationOf(procedure, {}, stated));
    expectClose(answer.value, 3.93 / 1.16, { rel: 1e-14, abs: 0, why: 'closed form' });
    expect(answer.agreement.isReproduced).toBe(true);
    expectClose(answer.interval?.low, 2.1, { rel: 0, abs: 0.05, why: 'printed with one decimal' });
    // Computed elsewhere with two million draws: 7.89; the steep side moves by 0.1 with the rounding of 0.51.
    expectClose(answer.interval?.high, 7.89, { rel: 0, abs: 0.15, why: 'steep side of other draws' });
    expect(recomputation.parse(answer)).toEqual(answer);
  });

  it('goes the other way: λ = F2x/S', () => {
    const back: FeedbackProcedure = {
      ...procedure,
      gives: 'feedback',
      known: { best: 3, low: 2, high: 5, levelPercent: 90, source: 'AR6' },
    };
    const statement = { quantity: 'climate-feedback', unit: 'W/m² per K', value: '1.3' } as const;
    const answer = feedbackConversion(computationOf(back, {}, { ...stated, ...statement }), back);
    expect(answer.value).toBeCloseTo(1.31, 14);
    expect(answer.quantity).toBe('climate-feedback');
    expect(answer.agreement.isReproduced).toBe(true);
    expect(() => feedbackConversion(computationOf(back, {}, stated), back)).toThrow(/a statement in W\/m² per K/);
  });

  it('counts a feedback that may not restore as unbounded, and refuses one that does not', () => {
    const weak = { ...procedure, known: { ...procedure.known, low: -0.2 } };
    const answer = feedbackConversion(computationOf(weak, {}, stated), weak);
    expect(answer.interval?.high).toBeNull();
    expect(answer.caveats.map(({ code }) => code)).toEqual(['unbounded-draws']);
    const negative = { ...procedure, known: { best: -1.16, low: -1.81, high: -0.51, levelPercent: 90, source: '' } };
    expect(() => feedbackConversion(computationOf(negative, {}, stated), negative)).toThrow(/λ = 1.16/);
  });
});
