import { describe, expect, it } from 'vitest';
import { checkStatedUnit } from '../../../../src-main/climate/procedures/stated-unit.ts';
import { unboundedDraws } from '../../../../src-main/climate/procedures/unbounded-draws.ts';

describe('checkStatedUnit', () => {
  it('lets the unit pass that the procedure gives, and names both otherwise', () => {
    expect(() => checkStatedUnit('share', '%', '%')).not.toThrow();
    expect(() => checkStatedUnit('share', '1', '%')).toThrow(
      /procedure share: expected a statement in %, but found a statement in a plain number/,
    );
  });
});

describe('unboundedDraws', () => {
  it('says how many there are, and nothing when there are none', () => {
    expect(unboundedDraws(0, 'the forcing is not positive')).toEqual([]);
    expect(unboundedDraws(0.034, 'the forcing is not positive')[0]?.detail).toBe(
      'In 3.4 % of the draws the forcing is not positive; they count as unbounded above.',
    );
  });
});
