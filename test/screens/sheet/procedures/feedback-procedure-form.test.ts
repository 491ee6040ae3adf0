import { describe, expect, it } from 'vitest';
import { procedureForm } from '../../../helpers/procedure-form.ts';
import { inventedSheet } from '../../../helpers/sheet-screen.ts';

const input = (best: number, low: number, high: number) => ({ best, low, high, levelPercent: 66, source: 'invented' });
const stored = {
  kind: 'feedback' as const,
  gives: 'feedback' as const,
  known: input(3.1, 2.4, 4.2),
  doublingWm2: input(3.9, 3.7, 4.1),
  draws: 4000,
};

describe('feedback and sensitivity as the procedure', () => {
  it('is kept with λ, and with the doubling filled in', async () => {
    const form = await procedureForm(null, { choose: 'feedback' });
    await form.fill({ 'Feedback parameter, λ, restoring above 0, best value': '1,3' });
    await form.press('Fill in the doubling of AR6');
    expect(form.kept()).toEqual([]);
    await form.press('Keep these figures');
    expect(form.kept()).toEqual([
      {
        kind: 'feedback',
        gives: 'sensitivity',
        known: { best: 1.3, low: 1.3, high: 1.3, levelPercent: 90, source: '' },
        doublingWm2: inventedSheet().publishedBudget.doublingWm2,
        draws: 100_000,
      },
    ]);
  });

  it('asks for the sensitivity when it is the feedback that is worked out', async () => {
    const form = await procedureForm(null, { choose: 'feedback' });
    await form.fill({ 'The source works out': 'feedback' });
    expect(form.screen.text()).toContain('Sensitivity, S (K per doubling)');
    await form.fill({ 'Sensitivity, S, best value': '3' });
    await form.press('Keep these figures');
    expect(form.refusal()).toMatch(/Forcing of a CO₂ doubling, F2x.*nothing/);
    expect(form.kept()).toEqual([]);
  });

  it('shows what is stored, and keeps its draws', async () => {
    const form = await procedureForm(stored);
    expect(form.shown('Sensitivity, S, best value')).toBe('3.1');
    expect(form.shown('The source works out')).toBe('feedback');
    await form.fill({ 'Sensitivity, S, lower end': '2.5' });
    await form.press('Keep these figures');
    expect(form.kept()).toEqual([{ ...stored, known: { ...stored.known, low: 2.5 } }]);
  });

  it('cannot be changed once the finding is signed', async () => {
    expect((await procedureForm(stored)).workable().length).toBeGreaterThan(10);
    expect((await procedureForm(stored, { isFrozen: true })).workable()).toEqual([]);
  });
});
