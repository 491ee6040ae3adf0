import { describe, expect, it } from 'vitest';
import { budgetSensitivity } from '../../../../src-main/climate/procedures/budget-sensitivity.ts';
import { recompute } from '../../../../src-main/climate/procedures/recompute.ts';
import type { Statement } from '../../../../src-main/contract/claim.ts';
import type { EnergyBudgetProcedure } from '../../../../src-main/contract/procedure.ts';
import { recomputation } from '../../../../src-main/contract/result.ts';
import { publishedBudget } from '../../../../src-main/quantities/published-budget.ts';
import { computationOf } from '../../../helpers/claim-computation.ts';
import { expectClose } from '../../../helpers/close.ts';

const procedure: EnergyBudgetProcedure = {
  kind: 'energy-budget',
  estimate: 'effective-climate-sensitivity',
  ...publishedBudget,
  patternWm2PerK: null,
  correlation: 0,
  draws: 200_000,
};
const stated: Partial<Statement> = {
  quantity: 'effective-climate-sensitivity',
  unit: 'K per doubling',
  bound: 'equals',
  value: '2.5',
};
const run = (change: Partial<EnergyBudgetProcedure> = {}, statement: Partial<Statement> = {}) => {
  const changed = { ...procedure, ...change };
  return budgetSensitivity(computationOf(changed, {}, { ...stated, ...statement }), changed);
};
const printed = { rel: 0, abs: 0.05, why: 'printed with one decimal' };

describe('budgetSensitivity', () => {
  it('reproduces AR6 §7.5.2.1: 2.5 (1.6–4.8)', () => {
    const answer = recompute(computationOf(procedure, {}, stated));
    expectClose(answer.value, 2.514, { rel: 0, abs: 0.0006, why: 'worked by hand to three decimals' });
    expectClose(answer.interval?.low, 1.6, printed);
    expectClose(answer.interval?.high, 4.8, { ...printed, abs: 0.15, why: 'the long side; other draws' });
    expect(answer.interval?.levelPercent).toBe(90);
    expect(answer.agreement.isReproduced).toBe(true);
    expect(answer.quantity).toBe('effective-climate-sensitivity');
    expect(recomputation.parse(answer)).toEqual(answer);
  });

  it('does not call AR6’s TCR of 1.9 wrong: 1.84 from inputs that are rounded themselves', () => {
    const answer = run({ estimate: 'transient-climate-response' }, { value: '1.9' });
    expectClose(answer.value, 1.84, { rel: 0, abs: 0.0006, why: 'worked by hand' });
    expect(answer.agreement.isReproduced).toBe(true);
    expect(run({ estimate: 'transient-climate-response' }, { value: '2.1' }).agreement.isReproduced).toBe(false);
  });

  it('counts a pattern effect in the equilibrium: 3.93 · 1.03 / (1.61 − 0.5 · 1.03)', () => {
    const patternWm2PerK = { best: 0.5, low: 0, high: 1, levelPercent: 90, source: 'AR6 §7.5.2.1' };
    const answer = run({ estimate: 'equilibrium-climate-sensitivity', patternWm2PerK });
    expectClose(answer.value, (3.93 * 1.03) / (1.61 - 0.515), { rel: 1e-12, abs: 0, why: 'closed form' });
    expect(answer.working[1]?.rows.at(-1)?.[0]).toBe('equilibrium climate sensitivity');
  });

  it('gives °F where the source does, with the same digits but for the factor', () => {
    const celsius = run();
    const fahrenheit = run({}, { unit: '°F per doubling', value: '4.5' });
    expect(fahrenheit.value).toBeCloseTo(1.8 * celsius.value, 12);
    expect(fahrenheit.interval?.low).toBeCloseTo(1.8 * (celsius.interval?.low ?? NaN), 12);
    expect(fahrenheit.agreement.isReproduced).toBe(true);
  });

  it.each([
    {
      name: 'an uptake that eats the forcing',
      change: { uptakeWm2: { best: 2.3, low: 2, high: 2.6, levelPercent: 90, source: '' } },
      says: /a forcing change that exceeds the heat uptake/,
    },
    {
      name: 'an equilibrium without a pattern effect',
      change: { estimate: 'equilibrium-climate-sensitivity' as const },
      says: /a pattern effect/,
    },
  ])('refuses $name', ({ change, says }) => {
    expect(() => run(change)).toThrow(says);
  });

  it('refuses a statement that is no sensitivity', () => {
    expect(() => run({}, { unit: 'W/m²' })).toThrow(/K per doubling/);
  });
});
