import { describe, expect, it } from 'vitest';
import { procedureForm } from '../../helpers/procedure-form.ts';
import { inventedSheet } from '../../helpers/sheet-screen.ts';

const line = inventedSheet().claim.procedure;
const kind = 'How the source gets the number';

describe('the choice of a procedure', () => {
  it('keeps nothing for a kind with a form of its own until that is filled in', async () => {
    const form = await procedureForm(line, { choose: 'outgassing' });
    expect(form.kept()).toEqual([]);
    expect(form.shown(kind)).toBe('outgassing');
    expect(form.screen.text()).not.toContain('A year counts with');
    await form.fill({ 'Temperature of the water (°C)': '15', 'CO₂ at the start (ppm)': '280' });
    await form.press('Keep these figures');
    expect(form.kept()).toMatchObject([{ kind: 'outgassing' }]);
    expect(form.shown(kind)).toBe('outgassing');
  });

  it('shows one form at a time, and goes back to the stored procedure as it was', async () => {
    const form = await procedureForm(line, { choose: 'feedback' });
    await form.fill({ [kind]: 'forcing' });
    expect(form.screen.text()).toContain('Formulas');
    expect(form.screen.text()).not.toContain('The source works out');
    await form.fill({ [kind]: 'log-regression' });
    expect(form.screen.text()).toContain('A year counts with');
    expect(form.kept()).toEqual([]);
  });

  it('keeps a ratio of the stated number at once, and no procedure at all', async () => {
    const form = await procedureForm(line, { choose: 'ratio' });
    expect(form.kept()).toMatchObject([{ kind: 'ratio', numerator: { value: '1.9', unit: 'K per doubling' } }]);
    const [none] = form.control(kind).findAll('option');
    await none?.setValue();
    await expect.poll(() => form.kept().at(-1)).toBeNull();
  });

  it('cannot be changed once the finding is signed', async () => {
    expect((await procedureForm(line)).workable().length).toBeGreaterThan(3);
    expect((await procedureForm(line, { isFrozen: true })).workable()).toEqual([]);
  });
});
