import { describe, expect, it } from 'vitest';
import { energyBudget } from '../../../src-main/climate/energy-budget.ts';
import { energyBudgetAnswer, type EnergyBudgetRequest } from '../../../src-main/contract/energy-budget.ts';

const request: EnergyBudgetRequest = {
  warmingK: { mean: 1, sd: 0.1 },
  forcingWm2: { mean: 2, sd: 0.4 },
  uptakeWm2: { mean: 0.5, sd: 0.2 },
  doublingWm2: { mean: 4, sd: 0.3 },
  draws: 150_000,
  seed: 5,
};
const codes = (changes: Partial<EnergyBudgetRequest>): string[] =>
  energyBudget({ ...request, ...changes }).caveats.map(({ code }) => code);

describe('energyBudget', () => {
  it('gives the same digits for the same seed and others for another, and says what it drew from', () => {
    const first = energyBudget(request);
    expect(energyBudget(request)).toEqual(first);
    expect(energyBudget({ ...request, seed: 6 }).effcs).not.toEqual(first.effcs);
    expect(first.random).toMatchObject({ seed: 5, nDraws: 150_000 });
    expect(energyBudgetAnswer.parse(first)).toEqual(first);
  });

  it('tells how far it is after each block', () => {
    const shares: number[] = [];
    energyBudget(request, (share) => shares.push(share));
    expect(shares).toEqual([65_536 / 150_000, 131_072 / 150_000, 1]);
  });

  it('stops when the progress call throws', () => {
    let nCalls = 0;
    const stop = (): void => {
      nCalls++;
      throw new Error('cancelled');
    };
    expect(() => energyBudget(request, stop)).toThrow('cancelled');
    expect(nCalls).toBe(1);
  });

  it('scales with the warming and with the doubling', () => {
    const base = energyBudget(request);
    const double = energyBudget({ ...request, warmingK: { mean: 2, sd: 0.2 } });
    expect(double.effcs.q50).toBeCloseTo(2 * (base.effcs.q50 ?? NaN), 12);
    expect(double.central.feedbackWm2PerK).toBeCloseTo(base.central.feedbackWm2PerK / 2, 12);
  });

  it('has no finite central value where forcing does not exceed heat uptake', () => {
    const { central, effcs, caveats } = energyBudget({ ...request, uptakeWm2: { mean: 2.5, sd: 0.1 } });
    expect(central.effcs).toBeNull();
    expect(central.tcr).toBe(2);
    expect(central.feedbackWm2PerK).toBe(-0.5);
    expect(effcs.q50).toBeNull();
    expect(caveats.map(({ code }) => code)).toEqual(
      expect.arrayContaining(['no-positive-net-forcing', 'unbounded-draws']),
    );
  });

  it('says where it is doubtful, and nothing where it is not', () => {
    expect(codes({ forcingWm2: { mean: 2, sd: 0.01 }, uptakeWm2: { mean: 0.5, sd: 0.01 } })).toEqual([]);
    expect(codes({ warmingK: { mean: 0.1, sd: 0.1 } })).toContain('warming-not-distinct');
    expect(codes({ forcingWm2: { mean: 0.5, sd: 0.5 }, uptakeWm2: { mean: 0, sd: 0 } })).toContain(
      'unbounded-draws-tcr',
    );
    expect(codes({ draws: 1000 })).toContain('few-draws');
  });

  it.each([
    [{ warmingK: { mean: NaN, sd: 0 } }, /warmingK\.mean/],
    [{ forcingWm2: { mean: 2, sd: -1 } }, /forcingWm2\.sd/],
    [{ uptakeWm2: { mean: Infinity, sd: 0 } }, /uptakeWm2\.mean/],
    [{ doublingWm2: { mean: -3, sd: 0 } }, /doublingWm2: expected a finite number above 0/],
    [{ correlation: 1.5 }, /correlation/],
    [{ draws: 0 }, /draws/],
    [{ warmingK: { mean: 0, sd: 0.1 } }, /a warming that is not zero/],
  ])('refuses %j', (changes, message) => {
    expect(() => energyBudget({ ...request, ...changes })).toThrow(message);
  });
});
