import { describe, expect, it } from 'vitest';
import { ratio } from '../../../../src-main/climate/procedures/ratio.ts';
import { recompute } from '../../../../src-main/climate/procedures/recompute.ts';
import type { Statement } from '../../../../src-main/contract/claim.ts';
import type { RatioProcedure } from '../../../../src-main/contract/procedure.ts';
import { recomputation } from '../../../../src-main/contract/result.ts';
import { computationOf } from '../../../helpers/claim-computation.ts';

const procedure = (numerator: string, denominator: string): RatioProcedure => ({
  kind: 'ratio',
  numerator: { value: numerator, unit: 'W/m²' },
  denominator: { value: denominator, unit: 'W/m²' },
});
const stated: Partial<Statement> = { quantity: 'ratio', unit: '1', bound: 'equals', value: '1.9' };

describe('ratio', () => {
  it('divides two stated numbers and keeps the interval that their digits leave open: 3.7/1.9 by hand', () => {
    const answer = recompute(computationOf(procedure('3.7', '1.9'), {}, stated));
    expect(answer.value).toBeCloseTo(3.7 / 1.9, 15);
    // (3.65/1.95, 3.75/1.85) = (1.872, 2.027)
    expect(answer.conversion?.replaceAll('\u202f', '_')).toBe(
      '3.7_W/m² ÷ 1.9_W/m² = 1.947; between 1.872 and 2.027 when both are taken with their rounding',
    );
    expect(answer.agreement.isReproduced).toBe(true);
    expect(recomputation.parse(answer)).toEqual(answer);
  });

  it('is not reproduced when no inputs that round to these digits give the stated number', () => {
    const { agreement } = ratio(
      computationOf(procedure('3.7', '1.9'), {}, { ...stated, value: '2.1' }),
      procedure('3.7', '1.9'),
    );
    expect(agreement.isReproduced).toBe(false);
  });

  it('takes the signs of both into account', () => {
    const { value, conversion } = recompute(
      computationOf(procedure('-0.88', '2.83'), {}, { ...stated, value: '-0.31' }),
    );
    expect(value).toBeCloseTo(-0.311, 3);
    expect(conversion).toContain('−0.88');
  });

  it('refuses a denominator that may be zero within its rounding', () => {
    expect(() => recompute(computationOf(procedure('3.7', '0.0'), {}, stated))).toThrow(
      /not zero within its rounding, but found 0\.0/,
    );
    expect(() => recompute(computationOf(procedure('3.7', '0'), {}, stated))).toThrow(/not zero/);
  });

  it('refuses a ratio that no number can hold, its rounding included', () => {
    for (const [n, d] of [
      ['1e308', '1.0e-308'],
      ['1.7e308', '1.0'],
    ] as const) {
      expect(() => recompute(computationOf(procedure(n, d), {}, stated))).toThrow(/within the range of numbers/);
    }
  });
});
