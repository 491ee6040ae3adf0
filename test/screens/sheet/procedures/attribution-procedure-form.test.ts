import { describe, expect, it } from 'vitest';
import { procedureForm, type Refused } from '../../../helpers/procedure-form.ts';

const input = (best: number) => ({ best, low: best - 0.1, high: best + 0.1, levelPercent: 90, source: 'invented' });
const stored = {
  kind: 'attribution' as const,
  part: input(0.4),
  whole: input(0.9),
  unit: 'K',
  correlation: 0.3,
  draws: 6000,
};

describe('a part over the whole as the procedure', () => {
  it('is kept in one unit, with its correlation', async () => {
    const form = await procedureForm(null, { choose: 'attribution' });
    await form.fill({
      'Both in': 'GtC',
      'Correlation of the two': '−0.2',
      'The part, best value': '2',
      'The whole, best value': '5',
      'The whole, lower end': '4',
      'The whole, upper end': '6',
      'The whole, what the range is': '68.27',
      'The whole, source': ' an invented table ',
    });
    expect(form.screen.text()).toContain('The whole (GtC)');
    await form.press('Keep these figures');
    expect(form.kept()).toEqual([
      {
        kind: 'attribution',
        part: { best: 2, low: 2, high: 2, levelPercent: 90, source: '' },
        whole: { best: 5, low: 4, high: 6, levelPercent: 68.27, source: 'an invented table' },
        unit: 'GtC',
        correlation: -0.2,
        draws: 100_000,
      },
    ]);
  });

  it.each<Refused>([
    { name: 'no whole', change: {}, says: /The whole.*Expected a number.*nothing/ },
    { name: 'words for a whole', change: { 'The whole, best value': 'all' }, says: /The whole.*“all”/ },
  ])('is not kept with $name', async ({ change, says }) => {
    const form = await procedureForm(null, { choose: 'attribution' });
    await form.fill({ 'The part, best value': '2', ...change });
    await form.press('Keep these figures');
    expect(form.refusal()).toMatch(says);
    expect(form.kept()).toEqual([]);
  });

  it('shows what is stored, and keeps it', async () => {
    const form = await procedureForm(stored);
    expect(['The part, best value', 'Both in', 'Correlation of the two'].map(form.shown)).toEqual(['0.4', 'K', '0.3']);
    await form.press('Keep these figures');
    expect(form.kept()).toEqual([stored]);
  });

  it('cannot be changed once the finding is signed', async () => {
    expect((await procedureForm(stored)).workable().length).toBeGreaterThan(10);
    expect((await procedureForm(stored, { isFrozen: true })).workable()).toEqual([]);
  });
});
