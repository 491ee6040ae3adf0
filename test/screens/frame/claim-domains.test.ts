import { describe, expect, it } from 'vitest';
import type { ClaimLine } from '../../../src-main/contract/project.ts';
import { claimDomains } from '../../../src-renderer/frame/claim-domains.ts';

const claim = (unit: string, statedValue: number, recomputed: ClaimLine['recomputed'] = null): ClaimLine => ({
  id: 1,
  title: '',
  unit,
  stated: String(statedValue),
  statedValue,
  recomputed,
  status: '',
  isSigned: false,
});

describe('claimDomains', () => {
  it('spans everything that claims of one unit state and recompute', () => {
    const domains = claimDomains([
      claim('K per doubling', 1.9, { value: 1.87, low: 1.7, high: null }),
      claim('K per doubling', 3, { value: 2.7, low: 1.5, high: 4.4 }),
      claim('W/m²', 3.7),
    ]);
    expect(domains.size).toBe(2);
    const { low, high } = domains.get('K per doubling')!;
    expect(low).toBeCloseTo(1.5 - 0.08 * 2.9, 12);
    expect(high).toBeCloseTo(4.4 + 0.08 * 2.9, 12);
  });

  it('does not blow up a difference in the third digit', () => {
    const { low, high } = claimDomains([claim('W/m²', 3.7, { value: 3.708, low: null, high: null })]).get('W/m²')!;
    expect(high - low).toBeGreaterThan(0.9);
    expect((3.7 - low) / (high - low)).toBeCloseTo(0.5, 1);
  });

  it('has room around a lonely zero', () => {
    const { low, high } = claimDomains([claim('1', 0)]).get('1')!;
    expect(low).toBeLessThan(0);
    expect(high).toBeGreaterThan(0);
  });
});
