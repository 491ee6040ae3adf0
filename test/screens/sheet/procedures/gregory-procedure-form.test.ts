import { describe, expect, it } from 'vitest';
import { procedureForm, type Refused } from '../../../helpers/procedure-form.ts';

const stored = {
  kind: 'gregory' as const,
  seriesId: 3,
  temperatureSeriesId: 1,
  minMonths: 11,
  window: { start: 1971, end: 2020 },
  split: { early: { from: 1, to: 15 }, late: { from: 16, to: 50 } },
  divisor: 2.1,
  covariance: { kind: 'newey-west' as const, lag: 6, smallSample: true },
};

describe('a Gregory regression as the procedure', () => {
  it('is kept with the usual choices once an imbalance is chosen', async () => {
    const form = await procedureForm(null, { choose: 'gregory' });
    await form.press('Keep these choices');
    expect(form.refusal()).toMatch(/Imbalance.*a series.*none/);
    await form.fill({ Imbalance: '3' });
    await form.press('Keep these choices');
    expect(form.kept()).toEqual([
      {
        kind: 'gregory',
        seriesId: 3,
        temperatureSeriesId: 1,
        minMonths: 12,
        window: null,
        split: { early: { from: 1, to: 20 }, late: { from: 21, to: 150 } },
        divisor: 2,
        covariance: { kind: 'classical' },
      },
    ]);
  });

  it('offers series that fit first, and says what the others are', async () => {
    const form = await procedureForm(null, { choose: 'gregory' });
    const offered = (name: string) =>
      form
        .control(name)
        .findAll('option')
        .map((option) => option.text());
    expect(offered('Imbalance')).toEqual([
      'not chosen yet',
      'forcing-total',
      'forcing-co2',
      'harbour-air (temperature-anomaly)',
      'gas-at-the-light (co2)',
    ]);
    expect(offered('Warming').slice(0, 2)).toEqual(['not chosen yet', 'harbour-air']);
  });

  it('asks for a lag only with Newey–West errors', async () => {
    const form = await procedureForm(null, { choose: 'gregory' });
    expect(form.screen.text()).not.toContain('Lag (years)');
    await form.fill({ Imbalance: '3', 'Standard errors': 'newey-west' });
    await form.fill({ 'Lag (years)': '2.5' });
    await form.press('Keep these choices');
    expect(form.refusal()).toMatch(/Lag.*a whole number of years.*“2.5”/);
    await form.fill({ 'Lag (years)': '8' });
    await form.press('Keep these choices');
    expect(form.kept()).toMatchObject([{ covariance: { kind: 'newey-west', lag: 8, smallSample: false } }]);
  });

  it.each<Refused>([
    { name: 'half a window', change: { 'Last year': '' }, says: /Years.*two whole years/ },
    { name: 'a window turned round', change: { 'First year': '2025' }, says: /Years.*“2025” to “2020”/ },
    {
      name: 'a split turned round',
      change: { 'Early years, to': '0' },
      says: /Early years.*the first not after the last/,
    },
    { name: 'a split before the first year', change: { 'Late years, from': '-3' }, says: /Late years/ },
    { name: 'no divisor', change: { 'Equilibrium divided by': '0' }, says: /Divisor.*above 0.*“0”/ },
  ])('is not kept with $name', async ({ change, says }) => {
    const form = await procedureForm(stored);
    await form.fill(change);
    await form.press('Keep these choices');
    expect(form.refusal()).toMatch(says);
    expect(form.kept()).toEqual([]);
  });

  it('shows what is stored, and keeps it; an empty window is all years', async () => {
    const form = await procedureForm(stored);
    const names = ['First year', 'Late years, from', 'Equilibrium divided by', 'Lag (years)', 'Standard errors'];
    expect(names.map(form.shown)).toEqual(['1971', '16', '2.1', '6', 'newey-west']);
    await form.press('Keep these choices');
    await form.fill({ 'First year': '', 'Last year': ' ' });
    await form.press('Keep these choices');
    expect(form.kept()).toEqual([stored, { ...stored, window: null }]);
  });

  it('cannot be changed once the finding is signed', async () => {
    expect((await procedureForm(stored)).workable().length).toBeGreaterThan(10);
    expect((await procedureForm(stored, { isFrozen: true })).workable()).toEqual([]);
  });
});
