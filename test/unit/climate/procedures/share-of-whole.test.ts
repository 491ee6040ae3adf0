import { describe, expect, it } from 'vitest';
import { recompute } from '../../../../src-main/climate/procedures/recompute.ts';
import { shareOfWhole } from '../../../../src-main/climate/procedures/share-of-whole.ts';
import type { Statement } from '../../../../src-main/contract/claim.ts';
import type { AttributionProcedure } from '../../../../src-main/contract/procedure.ts';
import { recomputation } from '../../../../src-main/contract/result.ts';
import { computationOf } from '../../../helpers/claim-computation.ts';

// AR6 WG1, forcing 1750–2019: CO2 2.16 (1.90 to 2.41), all human activity 2.72 (1.96 to 3.48) W/m².
const procedure: AttributionProcedure = {
  kind: 'attribution',
  part: { best: 2.16, low: 1.9, high: 2.41, levelPercent: 90, source: 'AR6' },
  whole: { best: 2.72, low: 1.96, high: 3.48, levelPercent: 90, source: 'AR6' },
  unit: 'W/m²',
  correlation: 0,
  draws: 50_000,
};
const stated: Partial<Statement> = { quantity: 'share', unit: '%', bound: 'equals', value: '79' };
const run = (change: Partial<AttributionProcedure> = {}, statement: Partial<Statement> = {}) => {
  const changed = { ...procedure, ...change };
  return shareOfWhole(computationOf(changed, {}, { ...stated, ...statement }), changed);
};

describe('shareOfWhole', () => {
  it('gives 100 · 2.16/2.72 = 79.4 %, within a wide range', () => {
    const answer = recompute(computationOf(procedure, {}, stated));
    expect(answer.value).toBeCloseTo(79.4117647, 6);
    expect(answer.agreement.isReproduced).toBe(true);
    expect(answer.interval?.low).toBeGreaterThan(55);
    expect(answer.interval?.low).toBeLessThan(70);
    expect(answer.interval?.high).toBeGreaterThan(100);
    expect(recomputation.parse(answer)).toEqual(answer);
  });

  it('is narrower where both err together', () => {
    const width = ({ interval }: ReturnType<typeof run>) => (interval?.high ?? NaN) - (interval?.low ?? NaN);
    expect(width(run({ correlation: 0.8 }))).toBeLessThan(width(run()));
  });

  it('says why a share can exceed the whole', () => {
    const answer = run({ part: { best: 3.32, low: 3.03, high: 3.61, levelPercent: 90, source: 'AR6' } });
    expect(answer.value).toBeCloseTo(122.06, 2);
    expect(answer.caveats.map(({ code }) => code)).toContain('more-than-the-whole');
  });

  it('refuses a whole that is not there, and a statement that is no share', () => {
    const none = { best: 0, low: -0.1, high: 0.1, levelPercent: 90, source: '' };
    expect(() => run({ whole: none })).toThrow(/a whole above zero/);
    expect(() => run({}, { unit: '1' })).toThrow(/a statement in %/);
  });
});
