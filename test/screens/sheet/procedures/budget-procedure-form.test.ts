import { describe, expect, it } from 'vitest';
import { procedureForm, type Refused } from '../../../helpers/procedure-form.ts';
import { inventedSheet } from '../../../helpers/sheet-screen.ts';

const { publishedBudget } = inventedSheet();
const figures = {
  'Warming between the two periods, ΔT, best value': '1,1',
  'Forcing change, ΔF, best value': '2.3',
  'Forcing change, ΔF, lower end': '1.6',
  'Forcing change, ΔF, upper end': '3',
  'Heat-uptake change, ΔN, best value': '0.6',
  'Forcing of a CO₂ doubling, F2x, best value': '3.9',
};

describe('an energy budget as the procedure', () => {
  it('is kept with what was written, exact where no range was given', async () => {
    const form = await procedureForm(null, { choose: 'energy-budget' });
    expect(form.kept()).toEqual([]);
    await form.fill({ ...figures, 'The budget gives the': 'transient-climate-response' });
    await form.press('Keep these figures');
    expect(form.kept()).toEqual([
      {
        kind: 'energy-budget',
        estimate: 'transient-climate-response',
        warmingK: { best: 1.1, low: 1.1, high: 1.1, levelPercent: 90, source: '' },
        forcingWm2: { best: 2.3, low: 1.6, high: 3, levelPercent: 90, source: '' },
        uptakeWm2: { best: 0.6, low: 0.6, high: 0.6, levelPercent: 90, source: '' },
        doublingWm2: { best: 3.9, low: 3.9, high: 3.9, levelPercent: 90, source: '' },
        patternWm2PerK: null,
        correlation: 0,
        draws: 100_000,
      },
    ]);
  });

  it('takes over the published values, but keeps them only when told', async () => {
    const form = await procedureForm(null, { choose: 'energy-budget' });
    await form.press('Fill in the values of AR6 §7.5.2.1');
    expect(form.kept()).toEqual([]);
    await form.press('Keep these figures');
    expect(form.kept()).toMatchObject([publishedBudget]);
  });

  it.each<Refused>([
    {
      name: 'nothing',
      change: { 'Warming between the two periods, ΔT, best value': '' },
      says: /Warming between the two periods, ΔT.*Expected a number.*nothing/,
    },
    {
      name: 'half a range',
      change: { 'Forcing change, ΔF, upper end': '' },
      says: /Forcing change, ΔF.*both ends of its range/,
    },
    {
      name: 'a best value outside its range',
      change: { 'Forcing change, ΔF, best value': '4' },
      says: /a best value within its range/,
    },
    {
      name: 'words',
      change: { 'Forcing of a CO₂ doubling, F2x, best value': 'about four' },
      says: /F2x.*“about four”/,
    },
  ])('keeps no budget with $name', async ({ change, says }) => {
    const form = await procedureForm(null, { choose: 'energy-budget' });
    await form.fill({ ...figures, ...change });
    await form.press('Keep these figures');
    expect(form.refusal()).toMatch(says);
    expect(form.kept()).toEqual([]);
  });

  it('takes no correlation beyond one', async () => {
    const form = await procedureForm(null, { choose: 'energy-budget' });
    await form.fill({ ...figures, 'Correlation of ΔF and F2x': '1.4' });
    expect(form.screen.text()).toContain('A number from −1 to 1.');
    await form.press('Keep these figures');
    expect(form.kept()).toEqual([]);
  });
});

describe('a stored energy budget', () => {
  const stored = {
    kind: 'energy-budget' as const,
    estimate: 'equilibrium-climate-sensitivity' as const,
    ...publishedBudget,
    patternWm2PerK: { best: 0.5, low: 0, high: 1, levelPercent: 95, source: 'invented' },
    correlation: 0.4,
    draws: 5000,
  };

  it('is shown, and kept as it was but for what is changed', async () => {
    const form = await procedureForm(stored);
    expect(form.shown('Warming between the two periods, ΔT, best value')).toBe('1.01');
    expect(form.shown('Pattern effect, α′, if counted, what the range is')).toBe('95');
    expect(form.shown('Correlation of ΔF and F2x')).toBe('0.4');
    await form.fill({ 'Warming between the two periods, ΔT, best value': '1.05' });
    await form.press('Keep these figures');
    expect(form.kept()).toEqual([{ ...stored, warmingK: { ...stored.warmingK, best: 1.05 } }]);
  });

  it('cannot be changed once the finding is signed', async () => {
    expect((await procedureForm(stored)).workable().length).toBeGreaterThan(20);
    expect((await procedureForm(stored, { isFrozen: true })).workable()).toEqual([]);
  });
});
