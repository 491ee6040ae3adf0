import { describe, expect, it } from 'vitest';
import RobustnessSection from '../../../src-renderer/sheet/RobustnessSection.vue';
import { button, field, settled } from '../../helpers/mount-screen.ts';
import { inventedSheet, mountOnSheet } from '../../helpers/sheet-screen.ts';

const view = inventedSheet();

describe('the window sweep', () => {
  it('says where the stated window stands among all', async () => {
    const { screen } = await mountOnSheet(RobustnessSection);
    expect(screen.get('.prose').text()).toMatch(
      /1960–2019 gives 1\.87 K per doubling, above 22\s%.*30 years\. 23\s% of them lie at or below/s,
    );
    expect(screen.get('table').text()).toMatch(/1\.46.*1\.66.*2\.01.*2\.50.*2\.84/s);
    expect(screen.text()).toContain('Most windows share most of their years.');
  });

  it('sends the shortest window', async () => {
    const { screen, host } = await mountOnSheet(RobustnessSection, {
      prepare: (fake) => fake.reply('claim.sweep', () => view),
    });
    await field(screen, 'Shortest window (years)').setValue('31');
    await button(screen, 'Sweep the windows').trigger('click');
    await settled();
    expect(host.inputs('claim.sweep')).toMatchObject([{ claimId: 1, minYears: 31 }]);
  });

  it.each([
    { text: '2', says: 'A whole number of years, 3 or more.' },
    { text: 'ten', says: 'A whole number of years, 3 or more.' },
    { text: '3', says: 'It must be longer than the lag of the errors, 3 years.' },
  ])('does not sweep windows of $text', async ({ text, says }) => {
    const { screen } = await mountOnSheet(RobustnessSection);
    await field(screen, 'Shortest window (years)').setValue(text);
    expect(screen.text()).toContain(says);
    expect(button(screen, 'Sweep the windows').attributes('disabled')).toBeDefined();
  });

  it('has nothing to vary for a ratio', async () => {
    const part = { value: '3', unit: '1' };
    const procedure = { kind: 'ratio' as const, numerator: part, denominator: part };
    const { screen } = await mountOnSheet(RobustnessSection, {
      view: inventedSheet({ claim: { ...view.claim, procedure }, sweep: null }),
    });
    expect(screen.text()).toContain('no window to vary');
    expect(screen.findAll('button')).toEqual([]);
  });
});
