import { describe, expect, it } from 'vitest';
import { procedureForm, type Refused } from '../../../helpers/procedure-form.ts';

const figures = (reference: number, value: number) => ({ kind: 'figures' as const, reference, value });
const stored = {
  kind: 'forcing' as const,
  formula: 'etminan2016' as const,
  isEffective: true,
  co2Ppm: figures(280, 420),
  co2SeriesId: null,
  ch4Ppb: figures(720, 1900),
  n2oPpb: null,
};

describe('a forcing as the procedure', () => {
  it('is kept with concentrations', async () => {
    const form = await procedureForm(null, { choose: 'forcing' });
    await form.fill({ 'CO₂, from (ppm)': '278', 'CO₂, to (ppm)': '556,5', Formulas: 'ipcc1990' });
    await form.press('Keep these figures');
    expect(form.kept()).toEqual([
      {
        kind: 'forcing',
        formula: 'ipcc1990',
        isEffective: false,
        co2Ppm: figures(278, 556.5),
        co2SeriesId: null,
        ch4Ppb: null,
        n2oPpb: null,
      },
    ]);
  });

  it('is kept with two years of a CO₂ series, which alone are offered', async () => {
    const form = await procedureForm(null, { choose: 'forcing' });
    const offered = form.control('CO₂ from').findAll('option');
    expect(offered.map((option) => option.text())).toEqual(['figures, given here', 'gas-at-the-light']);
    await offered[1]?.setValue();
    await form.fill({ 'CO₂, from the mean of the year': '1970', 'CO₂, to the mean of the year': '2020' });
    await form.press('Keep these figures');
    expect(form.kept()).toMatchObject([
      { co2SeriesId: 2, co2Ppm: { kind: 'series', referenceYear: 1970, year: 2020 } },
    ]);
  });

  it.each<Refused>([
    { name: 'no CO₂', change: {}, says: /CO₂.*two concentrations above 0 ppm/ },
    { name: 'one concentration', change: { 'CO₂, from (ppm)': '278' }, says: /CO₂.*two concentrations above 0 ppm/ },
    {
      name: 'a negative one',
      change: { 'CO₂, from (ppm)': '278', 'CO₂, to (ppm)': '556', 'CH₄, from (ppb)': '-7', 'CH₄, to (ppb)': '1800' },
      says: /CH₄.*two concentrations above 0 ppb, or none/,
    },
    {
      name: 'half of a pair',
      change: { 'CO₂, from (ppm)': '278', 'CO₂, to (ppm)': '556', 'N₂O, to (ppb)': '330' },
      says: /N₂O.*two concentrations above 0 ppb, or none/,
    },
  ])('is not kept with $name', async ({ change, says }) => {
    const form = await procedureForm(null, { choose: 'forcing' });
    await form.fill(change);
    await form.press('Keep these figures');
    expect(form.refusal()).toMatch(says);
    expect(form.kept()).toEqual([]);
  });

  it('is not kept with half a year', async () => {
    const inYears = { ...stored, co2SeriesId: 2, co2Ppm: { kind: 'series' as const, referenceYear: 1970, year: 2020 } };
    const form = await procedureForm(inYears);
    await form.fill({ 'CO₂, to the mean of the year': '2019.5' });
    await form.press('Keep these figures');
    expect(form.refusal()).toMatch(/CO₂, years.*two whole years/);
    expect(form.kept()).toEqual([]);
  });

  it('shows what is stored, and keeps it', async () => {
    const form = await procedureForm(stored);
    expect(['Formulas', 'CO₂, to (ppm)', 'CH₄, from (ppb)', 'N₂O, from (ppb)'].map(form.shown)).toEqual([
      'etminan2016',
      '420',
      '720',
      '',
    ]);
    await form.press('Keep these figures');
    expect(form.kept()).toEqual([stored]);
  });

  it('cannot be changed once the finding is signed', async () => {
    expect((await procedureForm(stored)).workable().length).toBeGreaterThan(8);
    expect((await procedureForm(stored, { isFrozen: true })).workable()).toEqual([]);
  });
});
