import { describe, expect, it } from 'vitest';
import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import normalCdf from '@stdlib/stats-base-dists-normal-cdf';
import { energyBudget } from '../../../src-main/climate/energy-budget.ts';
import type { EnergyBudgetRequest } from '../../../src-main/contract/energy-budget.ts';
import { expectClose, type Tolerance } from '../../helpers/close.ts';

/** Standard deviation of a normal distribution from its 5–95 % half-width. */
const sd = (halfWidth90: number): number => halfWidth90 / 1.645;
const exact = (mean: number) => ({ mean, sd: 0 });
const draws = 200_000;

// Inputs: Otto et al. 2013, 2000s; central values second-hand, half-widths from memory.
const otto = {
  warmingK: { mean: 0.75, sd: sd(0.2) },
  forcingWm2: { mean: 1.95, sd: sd(0.58) },
  uptakeWm2: { mean: 0.65, sd: sd(0.27) },
  doublingWm2: { mean: 3.44, sd: sd(0.34) },
  draws,
  seed: 11,
} satisfies EnergyBudgetRequest;

// Inputs: AR6 WG1 §7.5.2.1 (read there); the forcing range 1.53–2.91 taken as symmetric.
const ar6 = {
  warmingK: { mean: 1.03, sd: sd(0.2) },
  forcingWm2: { mean: 2.2, sd: sd((2.91 - 1.53) / 2) },
  uptakeWm2: { mean: 0.59, sd: sd(0.35) },
  doublingWm2: { mean: 3.93, sd: sd(0.47) },
  draws,
  seed: 12,
} satisfies EnergyBudgetRequest;

describe('central values', () => {
  const hand: Tolerance = { rel: 0, abs: 0.0006, why: 'worked by hand to three decimals' };

  it('are those of Otto et al. 2013 (published 2.0 and 1.3)', () => {
    const { central } = energyBudget({ ...otto, draws: 100 });
    expectClose(central, { effcs: 1.985, tcr: 1.323, ecs: null, feedbackWm2PerK: 1.733 }, hand);
  });

  it('are those of AR6 §7.5.2.1 (published 2.5; its TCR of 1.9 is 1.84 from its own inputs)', () => {
    const { central } = energyBudget({ ...ar6, draws: 100 });
    expectClose(central, { effcs: 2.514, tcr: 1.84, ecs: null, feedbackWm2PerK: 1.563 }, hand);
  });
});

describe('ranges of published budgets', () => {
  // The references come from other draws (two million, another generator and program), some from skewed inputs.
  const middle: Tolerance = { rel: 0, abs: 0.05, why: 'inputs rounded and partly skewed in the publication' };
  const upper: Tolerance = { rel: 0, abs: 0.15, why: 'the same, where the distribution is long' };

  function expectQuantiles(
    found: { q05: number | null; q17: number | null; q50: number | null; q83: number | null; q95: number | null },
    expected: { q05: number; q17?: number; q50: number; q83?: number; q95: number },
  ): void {
    const { q95, ...rest } = expected;
    for (const [name, value] of Object.entries(rest)) expectClose(found[name as 'q05'], value, middle, name);
    expectClose(found.q95, q95, upper, 'q95');
  }

  it('AR6 §7.5.2.1: 1.56/1.88/2.50/3.53/4.87 and 1.26/1.47/1.83/2.31/2.79 (published 1.6–4.8 and 1.3–2.7)', () => {
    const { effcs, tcr } = energyBudget(ar6);
    expectQuantiles(effcs, { q05: 1.56, q17: 1.88, q50: 2.5, q83: 3.53, q95: 4.87 });
    expectQuantiles(tcr, { q05: 1.26, q17: 1.47, q50: 1.83, q83: 2.31, q95: 2.79 });
  });

  it('Otto et al. 2013, published 2.0 (1.2–3.9) and 1.3 (0.9–2.0): doubling and greenhouse forcing share their error', () => {
    // ±10 % of the greenhouse-gas forcing of 2.83 W/m² is common to both.
    const correlation = sd(0.283) / otto.forcingWm2.sd;
    const { effcs, tcr } = energyBudget({ ...otto, correlation });
    expectQuantiles(effcs, { q05: 1.2, q50: 2, q95: 3.9 });
    expectQuantiles(tcr, { q05: 0.9, q50: 1.32, q95: 2 });
  });

  it('Otto et al. 2013 with independent errors: 1.18/1.98/4.06', () => {
    expectQuantiles(energyBudget(otto).effcs, { q05: 1.18, q50: 1.98, q95: 4.06 });
  });

  it('AR6 §7.5.2.1 with its skewed forcing of 1.53 to 2.91, kept as it is', () => {
    const forcingWm2 = { best: 2.2, low: 1.53, high: 2.91, levelPercent: 90 };
    const { effcs, tcr } = energyBudget({ ...ar6, forcingWm2 });
    expectQuantiles(effcs, { q05: 1.56, q17: 1.88, q50: 2.5, q83: 3.53, q95: 4.87 });
    expectQuantiles(tcr, { q05: 1.26, q17: 1.47, q50: 1.83, q83: 2.31, q95: 2.79 });
  });

  it('AR6 §7.5.2.1 with the pattern effect: 3.5 (from 1.7) for 0.5 ± 0.5, 2.7 (1.7–5.9) for 0.1 ± 0.3', () => {
    const strong = energyBudget({ ...ar6, patternWm2PerK: { best: 0.5, low: 0, high: 1, levelPercent: 90 } });
    // AR6 does not say how it drew: for 0.5 ± 0.5 its ends are 1.7 and 13.8, those of independent draws 1.9 and beyond 20.
    const published: Tolerance = { rel: 0, abs: 0.15, why: 'one decimal, and inputs rounded for print' };
    expectClose(strong.ecs?.q50, 3.5, { ...published, abs: 0.25 });
    expectClose(strong.central.ecs, 3.7, { rel: 0, abs: 0.005, why: 'worked by hand: 3.93 / (1.563 − 0.5)' });
    const weak = energyBudget({ ...ar6, patternWm2PerK: { best: 0.1, low: -0.2, high: 0.4, levelPercent: 90 } });
    expectClose(weak.ecs?.q50, 2.7, published);
    expectClose(weak.ecs?.q05, 1.7, published);
    expectClose(weak.ecs?.q95, 5.9, { ...published, abs: 0.3 });
  });

  it('AR6 §7.5.2.1 by Fieller: near the Monte Carlo ends, and open above where the forcing is too small', () => {
    const { effcs } = energyBudget(ar6).fieller90;
    expectClose(effcs?.low, 1.56, { rel: 0, abs: 0.1, why: 'another definition of the same range' });
    expectClose(effcs?.high, 4.87, { rel: 0, abs: 0.3, why: 'another definition of the same range' });
    const open = energyBudget({ ...ar6, forcingWm2: { mean: 1, sd: 0.4 } }).fieller90.effcs;
    expect(open?.high).toBeNull();
    expect(open?.low).toBeGreaterThan(0);
  });

  it('Gregory et al. 2002: no upper bound, 5 % at 1.63 (published 1.6), 29 % unbounded', () => {
    const { effcs, shareUndefined, caveats } = energyBudget({
      warmingK: { mean: 0.335, sd: 0.033 },
      forcingWm2: { mean: 0.35, sd: 0.33 },
      uptakeWm2: { mean: 0.16, sd: 0.08 },
      doublingWm2: exact(3.71),
      draws,
      seed: 13,
    });
    expectClose(effcs.q05, 1.63, middle, 'q05');
    expect([effcs.q83, effcs.q95]).toEqual([null, null]);
    expectShare(shareUndefined, normalCdf(0, 0.35 - 0.16, Math.hypot(0.33, 0.08)));
    expect(caveats.map(({ code }) => code)).toContain('unbounded-draws');
  });
});

describe('closed forms', () => {
  const levels = { q05: 0.05, q17: 0.17, q50: 0.5, q83: 0.83, q95: 0.95 };

  /** Bounds of 4.5 standard errors of an order statistic: one false alarm in 150 000 checks. */
  function expectQuantilesOf(found: Record<string, number | null>, quantile: (p: number) => number): void {
    for (const [name, p] of Object.entries(levels)) {
      const spread = 4.5 * Math.sqrt((p * (1 - p)) / draws);
      const value = found[name];
      expect(value, name).toBeGreaterThan(quantile(p - spread));
      expect(value, name).toBeLessThan(quantile(p + spread));
    }
  }
  const z = (p: number): number => normalQuantile(p, 0, 1);

  it('only the warming uncertain: both sensitivities are normal', () => {
    const request = { ...ar6, forcingWm2: exact(2.2), uptakeWm2: exact(0.59), doublingWm2: exact(3.93) };
    const { effcs, tcr } = energyBudget(request);
    const warming = (p: number): number => 1.03 + sd(0.2) * z(p);
    expectQuantilesOf(effcs, (p) => (3.93 * warming(p)) / (2.2 - 0.59));
    expectQuantilesOf(tcr, (p) => (3.93 * warming(p)) / 2.2);
  });

  it('only forcing and uptake uncertain: the reciprocal of a normal', () => {
    const { effcs } = energyBudget({ ...ar6, warmingK: exact(1.03), doublingWm2: exact(3.93) });
    const spread = Math.hypot(ar6.forcingWm2.sd, ar6.uptakeWm2.sd);
    expectQuantilesOf(effcs, (p) => (3.93 * 1.03) / (2.2 - 0.59 + spread * z(1 - p)));
  });

  it('forcing and doubling in step (correlation 1) and against each other (−1)', () => {
    for (const correlation of [1, -1]) {
      const { tcr } = energyBudget({ ...ar6, warmingK: exact(1.03), correlation });
      const at = (normal: number): number =>
        (1.03 * (3.93 + sd(0.47) * correlation * normal)) / (2.2 + ar6.forcingWm2.sd * normal);
      expectQuantilesOf(tcr, (p) => at(z(1 - p)));
    }
  });

  it('the share without a finite answer is that of a normal below zero', () => {
    const request = { ...ar6, forcingWm2: { mean: 0.5, sd: 0.4 }, uptakeWm2: { mean: 0.3, sd: 0.3 } };
    const { shareUndefined, shareUndefinedTcr } = energyBudget(request);
    expectShare(shareUndefined, normalCdf(0, 0.2, 0.5));
    expectShare(shareUndefinedTcr, normalCdf(0, 0.5, 0.4));
  });
});

/** A share of draws, within 4.5 binomial standard errors. */
function expectShare(found: number, expected: number): void {
  const bound = 4.5 * Math.sqrt((expected * (1 - expected)) / draws);
  expectClose(found, expected, { rel: 0, abs: bound, why: '4.5 binomial standard errors of the draws' }, 'share');
}
