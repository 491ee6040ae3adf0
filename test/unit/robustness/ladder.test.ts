import { describe, expect, it } from 'vitest';
import { jointDraws, ladder, type LadderPlan } from '../../../src-main/robustness/ladder.ts';

/** A toy number: (10 + 2·slope) with each of two changes a shift, a factor, or a share of a drawn denominator. */
interface Footing {
  shift: number;
  factor: number;
  denominatorSd: number | null;
}

const nDraws = 20_000;
/** Standard error of a quantile is √(p(1 − p)/n)/density; at 5 % of a normal the density is 0.1031 per σ. */
const quantileError = Math.sqrt((0.05 * 0.95) / nDraws) / 0.1031;

const plan: LadderPlan<Footing> = {
  start: { shift: 0, factor: 1, denominatorSd: null },
  rungs: [
    { assumptionId: 'zero-intercept', label: 'shifted', change: (footing) => ({ ...footing, shift: -3 }) },
    { assumptionId: 'omitted-forcings', label: 'halved', change: (footing) => ({ ...footing, factor: 0.5 }) },
    { assumptionId: 'transient-as-equilibrium', label: 'divided', change: (f) => ({ ...f, denominatorSd: 1 }) },
  ],
  numberOn: ({ shift, factor, denominatorSd }, draws) => {
    const slope = draws.standardNormal('slope');
    const forcing = draws.standardNormal('forcing');
    return {
      value: (10 + shift) * factor,
      draws: slope.map((z, draw) => {
        const numerator = (10 + shift + 2 * z) * factor;
        if (denominatorSd === null) return numerator;
        const denominator = 1 + denominatorSd * (forcing[draw] ?? NaN);
        return denominator > 0 ? numerator / denominator : Infinity;
      }),
      quantity: denominatorSd === null ? 'apparent-sensitivity' : 'effective-climate-sensitivity',
    };
  },
  notApplied: [{ assumptionId: 'anchor-year', reason: 'not asked for' }],
  unit: 'K per doubling',
  draws: jointDraws(7, nDraws),
  caveats: [],
};

describe('ladder', () => {
  it('applies each change on top of the ones before; the steps add up to the move', () => {
    const { start, rungs, notApplied } = ladder(plan);
    expect(start.value).toBe(10);
    expect(rungs.map(({ value }) => value)).toEqual([7, 3.5, 3.5]);
    expect(rungs.map(({ step }) => step)).toEqual([-3, -3.5, 0]);
    expect(start.value + rungs.reduce((total, { step }) => total + step, 0)).toBe(rungs.at(-1)?.value);
    expect(rungs.map(({ quantity }) => quantity)).toEqual([
      'apparent-sensitivity',
      'apparent-sensitivity',
      'effective-climate-sensitivity',
    ]);
    expect(notApplied).toEqual(plan.notApplied);
  });

  it('ends at the same number in another order, by other steps', () => {
    const [first, second, third] = plan.rungs;
    if (!first || !second || !third) throw new Error('three rungs');
    const other = ladder({ ...plan, rungs: [third, second, first] });
    expect(other.rungs.map(({ value }) => value)).toEqual([10, 5, 3.5]);
    expect(other.rungs.at(-1)?.interval90).toEqual(ladder(plan).rungs.at(-1)?.interval90);
  });

  it('gives the central 90 % of the drawn numbers, shared between rungs', () => {
    const { start, rungs } = ladder(plan);
    const tolerance = 4 * quantileError * 2;
    expect(Math.abs((start.interval90.low ?? NaN) - (10 - 1.644854 * 2))).toBeLessThan(tolerance);
    expect(Math.abs((start.interval90.high ?? NaN) - (10 + 1.644854 * 2))).toBeLessThan(tolerance);
    // Same draws, so the shift moves both ends by exactly the shift, to rounding.
    expect(rungs[0]?.interval90.low).toBeCloseTo((start.interval90.low ?? NaN) - 3, 12);
    expect(rungs[1]?.interval90.high).toBeCloseTo(((start.interval90.high ?? NaN) - 3) / 2, 12);
  });

  it('leaves an end open that is not bounded', () => {
    // The denominator is not positive in Φ(−1) = 16 % of the draws: more than the upper 5 %.
    const { rungs } = ladder(plan);
    expect(rungs[2]?.interval90.high).toBeNull();
    expect(rungs[2]?.interval90.low).toBeTypeOf('number');
  });

  it('does not apply a change without a finite central value', () => {
    const { rungs, notApplied } = ladder({
      ...plan,
      rungs: [
        { assumptionId: 'zero-intercept', label: 'unbounded', change: (footing) => ({ ...footing, factor: Infinity }) },
        ...plan.rungs.slice(1),
      ],
    });
    expect(rungs.map(({ value }) => value)).toEqual([5, 5]);
    expect(notApplied.at(-1)).toEqual({
      assumptionId: 'zero-intercept',
      reason: 'The number has no finite central value under this change.',
    });
  });

  it('gives the same digits for the same seed and others for another', () => {
    expect(ladder(plan)).toEqual(ladder(plan));
    const other = ladder({ ...plan, draws: jointDraws(8, nDraws) });
    expect(other.start.interval90).not.toEqual(ladder(plan).start.interval90);
    expect(other.random.seed).toBe(8);
  });

  it('does not depend on which draws are asked for first', () => {
    const inOrder = jointDraws(3, 5);
    const slopeFirst = [inOrder.standardNormal('slope'), inOrder.standardNormal('uptake')];
    const reversed = jointDraws(3, 5);
    const uptakeFirst = [reversed.standardNormal('uptake'), reversed.standardNormal('slope')].reverse();
    expect(slopeFirst).toEqual(uptakeFirst);
    expect(slopeFirst[0]).not.toEqual(slopeFirst[1]);
    expect(inOrder.standardNormal('slope')).toBe(slopeFirst[0]);
  });
});
