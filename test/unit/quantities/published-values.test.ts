import { describe, expect, it } from 'vitest';
import { publishedValue } from '../../../src-main/contract/finding.ts';
import { quantityId } from '../../../src-main/contract/primitives.ts';
import { publishedBudget } from '../../../src-main/quantities/published-budget.ts';
import { publishedFor, publishedValues } from '../../../src-main/quantities/published-values.ts';
import { quantityNames } from '../../../src-main/quantities/quantity-names.ts';

describe('publishedValues', () => {
  it('fit the contract, each under its own id', () => {
    for (const value of publishedValues) expect(publishedValue.parse(value)).toEqual(value);
    expect(new Set(publishedValues.map(({ id }) => id)).size).toBe(publishedValues.length);
  });

  it('have ordered ranges around the best value, the wider one at the higher level', () => {
    for (const { best, ranges, id } of publishedValues) {
      const ends = ranges.map(({ interval }) => interval).sort((a, b) => a.levelPercent - b.levelPercent);
      for (const [index, { low, high }] of ends.entries()) {
        expect(low, id).toBeLessThan(high ?? NaN);
        if (best !== null) expect(best >= (low ?? NaN) && best <= (high ?? NaN), id).toBe(true);
        const narrower = ends[index - 1];
        if (narrower) expect((narrower.low ?? 0) >= (low ?? 0) && (narrower.high ?? 0) <= (high ?? 0), id).toBe(true);
      }
    }
  });

  // AR6 WG1 (2021), chapter 7, read there.
  it.each([
    ['ar6-ecs', 3, [66, 2.5, 4], [90, 2, 5]],
    ['ar6-tcr', 1.8, [66, 1.4, 2.2], [90, 1.2, 2.4]],
    ['ar6-effcs-energy-budget', 2.5, [90, 1.6, 4.8], null],
    ['ar6-tcr-energy-budget', 1.9, [90, 1.3, 2.7], null],
    ['ar6-ecs-pattern-observed', 3.5, [90, 1.7, 13.8], null],
  ] as const)('%s is quoted as printed', (id, best, first, second) => {
    const value = publishedValues.find((candidate) => candidate.id === id);
    expect(value?.best).toBe(best);
    expect(value?.provenance).toBe('seen');
    const ranges = value?.ranges.map(({ interval }) => [interval.levelPercent, interval.low, interval.high]);
    expect(ranges).toEqual(second ? [first, second] : [first]);
  });

  it('marks what was recalled and not looked up', () => {
    expect(publishedValues.filter(({ provenance }) => provenance === 'memory').map(({ id }) => id)).toEqual([
      'ar5-ecs',
      'ar5-tcr',
      'ar4-tcr',
    ]);
  });

  it('has ranges of the same quantity only, and none for an apparent sensitivity', () => {
    expect(publishedFor('apparent-sensitivity')).toEqual([]);
    expect(
      publishedFor('transient-climate-response').every(({ quantity }) => quantity === 'transient-climate-response'),
    ).toBe(true);
    expect(publishedFor('equilibrium-climate-sensitivity').length).toBeGreaterThan(3);
  });

  it('says which of two readings it takes of the doubling forcing’s uncertainty', () => {
    expect(publishedBudget.doublingWm2).toMatchObject({ best: 3.93, low: 3.46, high: 4.4, levelPercent: 90 });
    expect(publishedBudget.doublingWm2.source).toContain('5–95 %');
    // The other reading, one standard deviation, would be wider by the normal 95 % point.
    expect(0.47 * 1.645).toBeCloseTo(0.77, 2);
  });
});

describe('quantityNames', () => {
  it('name and define every quantity', () => {
    expect(Object.keys(quantityNames).sort()).toEqual([...quantityId.options].sort());
    for (const { label, definition, units } of Object.values(quantityNames)) {
      expect(label).not.toBe('');
      expect(definition).toMatch(/\.$/);
      expect(units.length).toBeGreaterThan(0);
    }
  });

  it('does not call b·ln 2 a climate sensitivity', () => {
    expect(quantityNames['apparent-sensitivity'].definition).toMatch(/none of ECS/);
  });
});
