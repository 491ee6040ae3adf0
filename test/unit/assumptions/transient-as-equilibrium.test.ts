import { describe, expect, it } from 'vitest';
import { testContext } from '../../../src-main/assumptions/test-context.ts';
import { transientAsEquilibrium } from '../../../src-main/assumptions/transient-as-equilibrium.ts';
import type { EnergyBudgetInputs, Statement } from '../../../src-main/contract/claim.ts';
import { expectClose } from '../../helpers/close.ts';
import { ar6EnergyBudget, inventedCo2, logRegressionClaim } from '../../helpers/log-regression-claim.ts';

const { years, co2Ppm, x } = inventedCo2(60);
const record = { years, co2Ppm, temperatureK: x.map((value) => (1.9 / Math.LN2) * value) };

const outcomeFor = (energyBudget: EnergyBudgetInputs | null, statement: Partial<Statement> = {}, procedure = {}) =>
  transientAsEquilibrium.test(
    testContext(logRegressionClaim({ ...record, statement, procedure, evidence: { energyBudget } })),
  );

/** Otto et al. 2013, the 2000s; standard deviations as half-widths of 5–95 %. Inputs partly from memory. */
const otto: EnergyBudgetInputs = {
  warmingK: { best: 0.75, low: 0.55, high: 0.95, levelPercent: 90, source: 'Otto et al. 2013' },
  forcingWm2: { best: 1.95, low: 1.37, high: 2.53, levelPercent: 90, source: 'Otto et al. 2013' },
  uptakeWm2: { best: 0.65, low: 0.38, high: 0.92, levelPercent: 90, source: 'Otto et al. 2013' },
  doublingWm2: { best: 3.44, low: 3.1, high: 3.78, levelPercent: 90, source: 'Otto et al. 2013' },
};

describe('transient-as-equilibrium', () => {
  it('gives the central values of AR6 §7.5.2.1: 3.93 · 1.03/(2.20 − 0.59) and 3.93 · 1.03/2.20', () => {
    const { alternative, effect, statistic, table } = outcomeFor(ar6EnergyBudget);
    const closed = { rel: 1e-12, abs: 0, why: 'closed form' };
    expectClose(alternative?.value, 4.0479 / 1.61, closed);
    expectClose(effect, 4.0479 / 1.61 - 1.9, { rel: 1e-9, abs: 0, why: 'the record is exact to rounding' });
    expectClose(statistic?.value, 2.2 / 1.61, closed);
    expectClose(Number(table?.rows[1]?.[1]), 4.0479 / 2.2, closed);
    expect(alternative?.quantity).toBe('effective-climate-sensitivity');
  });

  it('gives the published ranges of Otto et al. 2013 within what independent inputs allow', () => {
    // Published 1.2 – 3.9 and 0.9 – 2.0; with the forcing of a doubling independent 1.18 – 4.06 (two million draws).
    const { alternative, table } = outcomeFor(otto);
    expect(Math.abs((alternative?.interval?.low ?? NaN) - 1.18)).toBeLessThan(0.05);
    expect(Math.abs((alternative?.interval?.high ?? NaN) - 4.06)).toBeLessThan(0.15);
    expect(Math.abs(Number(table?.rows[1]?.[2]) - 0.9)).toBeLessThan(0.05);
    expect(Math.abs(Number(table?.rows[1]?.[6]) - 2.0)).toBeLessThan(0.06);
  });

  it('gives figures in the unit of the claim', () => {
    const fahrenheit = outcomeFor(ar6EnergyBudget, { unit: '°F per doubling', value: '3.4' });
    const perEFolding = outcomeFor(
      ar6EnergyBudget,
      { unit: 'K per e-folding', value: '2.7' },
      { conversion: 'per-e-folding' },
    );
    const exact = { rel: 1e-12, abs: 0, why: 'one factor' };
    expectClose(fahrenheit.alternative?.value, (1.8 * 4.0479) / 1.61, exact);
    expectClose(perEFolding.alternative?.value, 4.0479 / 1.61 / Math.LN2, exact);
    expectClose(
      perEFolding.alternative?.interval?.low,
      (outcomeFor(ar6EnergyBudget).alternative?.interval?.low ?? NaN) / Math.LN2,
      exact,
    );
  });

  it('proposes by what the number is presented as, not by the figures alone', () => {
    const marks = (
      ['equilibrium-climate-sensitivity', 'effective-climate-sensitivity', 'transient-climate-response', null] as const
    ).map((presentedAs) => outcomeFor(ar6EnergyBudget, { presentedAs }).proposal);
    expect(marks.map(({ mark }) => mark)).toEqual(['not met', 'not met', 'met', 'untested']);
    expect(marks[3]?.reason).toMatch(/Say so under Statement/);
    const named = outcomeFor(ar6EnergyBudget, { quantity: 'equilibrium-climate-sensitivity' });
    expect(named.proposal.mark).toBe('not met');
  });

  it('calls it decisive when the budget leaves no upper end', () => {
    const { alternative, effect, weight, statistic, reading } = outcomeFor({
      ...otto,
      uptakeWm2: { best: 2, low: 1.8, high: 2.2, levelPercent: 90, source: '' },
    });
    expect({ alternative, effect, weight, statistic }).toEqual({
      alternative: null,
      effect: null,
      weight: 'decisive',
      statistic: null,
    });
    expect(reading).toMatch(/no finite value .*unbounded/);
  });

  it('draws from the seed of the claim', () => {
    const intervalOf = (seed: number) =>
      transientAsEquilibrium.test(
        testContext(logRegressionClaim({ ...record, seed, evidence: { energyBudget: ar6EnergyBudget } })),
      ).alternative?.interval;
    expect(intervalOf(7)).toEqual(intervalOf(7));
    expect(intervalOf(7)).not.toEqual(intervalOf(8));
  });

  it('says what is missing', () => {
    const outcome = outcomeFor(null);
    expect(outcome).toMatchObject({ isTestable: false, missing: { reason: 'No energy budget is given.' } });
    expect(outcome.missing?.wouldNeed).toMatch(/with their ranges/);
  });
});
