import { describe, expect, it } from 'vitest';
import { procedureForm, type Refused } from '../../../helpers/procedure-form.ts';

const stored = {
  kind: 'outgassing' as const,
  source: 'weiss1974' as const,
  warmingK: -4.5,
  temperatureC: 12,
  salinity: 34,
  co2Ppm: 280,
  toPpm: 190,
};
const figures = { 'Temperature of the water (°C)': '15,5', 'CO₂ at the start (ppm)': '280' };

describe('outgassing as the procedure', () => {
  it('is kept for one degree, without what was not given', async () => {
    const form = await procedureForm(null, { choose: 'outgassing' });
    await form.fill(figures);
    await form.press('Keep these figures');
    expect(form.kept()).toEqual([
      {
        kind: 'outgassing',
        source: 'takahashi1993',
        warmingK: 1,
        temperatureC: 15.5,
        salinity: null,
        co2Ppm: 280,
        toPpm: null,
      },
    ]);
  });

  it('asks for a salinity only where the law depends on it', async () => {
    const form = await procedureForm(null, { choose: 'outgassing' });
    expect(form.screen.text()).not.toContain('Salinity');
    await form.fill({ ...figures, Law: 'weiss1974' });
    await form.press('Keep these figures');
    expect(form.refusal()).toMatch(/Salinity.*0 g\/kg or more.*nothing/);
    await form.fill({ 'Salinity (g/kg)': '0' });
    await form.press('Keep these figures');
    expect(form.kept()).toMatchObject([{ source: 'weiss1974', salinity: 0 }]);
  });

  it.each<Refused>([
    { name: 'no warming', change: { 'Warming (K)': '' }, says: /Warming.*a number of degrees.*nothing/ },
    { name: 'no temperature', change: { 'Temperature of the water (°C)': 'mild' }, says: /in °C.*“mild”/ },
    { name: 'no level', change: { 'CO₂ at the start (ppm)': '0' }, says: /CO₂ at the start.*above 0 ppm.*“0”/ },
    {
      name: 'a wrong end',
      change: { 'CO₂ at the end of the recorded rise (ppm)': 'now' },
      says: /CO₂ at the end.*above 0 ppm, or none.*“now”/,
    },
  ])('is not kept with $name', async ({ change, says }) => {
    const form = await procedureForm(null, { choose: 'outgassing' });
    await form.fill({ ...figures, ...change });
    await form.press('Keep these figures');
    expect(form.refusal()).toMatch(says);
    expect(form.kept()).toEqual([]);
  });

  it('shows what is stored, and keeps it', async () => {
    const form = await procedureForm(stored);
    expect(['Law', 'Warming (K)', 'Salinity (g/kg)'].map(form.shown)).toEqual(['weiss1974', '-4.5', '34']);
    await form.press('Keep these figures');
    expect(form.kept()).toEqual([stored]);
  });

  it('cannot be changed once the finding is signed', async () => {
    expect((await procedureForm(stored)).workable().length).toBeGreaterThan(6);
    expect((await procedureForm(stored, { isFrozen: true })).workable()).toEqual([]);
  });
});
