import { describe, expect, it } from 'vitest';
import StatementSection from '../../../src-renderer/sheet/StatementSection.vue';
import { button, field, settled } from '../../helpers/mount-screen.ts';
import { inventedSheet, mountOnSheet } from '../../helpers/sheet-screen.ts';

describe('the statement', () => {
  it('says what is stated, where, and how many questions are open', async () => {
    const { screen } = await mountOnSheet(StatementSection);
    expect(screen.get('h2').text()).toBe('Statement 3 questions open');
    for (const said of ['at most 1.9 K per doubling', 'apparent sensitivity', '88 %', '12:27 and slide 14'])
      expect(screen.get('dl').text()).toContain(said);
  });

  it('keeps an answer beside the others', async () => {
    const { screen, host } = await mountOnSheet(StatementSection);
    await screen.get('input[name="question-degrees"][value="°F, as printed"]').setValue();
    await settled();
    expect(host.inputs('claim.update')).toEqual([
      {
        claimId: 1,
        change: {
          answers: {
            'kind-of-sensitivity': 'it does not say',
            'is-bound': 'an upper limit',
            degrees: '°F, as printed',
          },
        },
      },
    ]);
  });

  it('is edited as a whole, and offers only units that the quantity can have', async () => {
    const { screen, host } = await mountOnSheet(StatementSection);
    await button(screen, 'Edit the statement').trigger('click');
    expect(field(screen, 'Unit').text()).not.toContain('W/m²');
    await field(screen, 'Value, as printed').setValue('1.90');
    await field(screen, 'R² stated beside it').setValue('  ');
    await button(screen, 'Keep').trigger('click');
    await settled();
    const [update] = host.inputs('claim.update');
    expect(update?.change.statement).toMatchObject({ value: '1.90', statedRSquared: null, bound: 'at most' });
    expect(screen.text()).toContain('at most 1.90 K per doubling');
  });

  it('stays as it was when the editing is left', async () => {
    const { screen, host } = await mountOnSheet(StatementSection);
    await button(screen, 'Edit the statement').trigger('click');
    await field(screen, 'Value, as printed').setValue('3');
    await button(screen, 'Leave as it was').trigger('click');
    expect(screen.text()).toContain('at most 1.9 K per doubling');
    expect(host.inputs('claim.update')).toEqual([]);
  });

  it('cannot be changed once the finding is signed', async () => {
    const { screen } = await mountOnSheet(StatementSection, { view: inventedSheet({ isFrozen: true }) });
    expect(button(screen, 'Edit the statement').attributes('disabled')).toBeDefined();
    for (const question of screen.findAll('fieldset')) expect(question.attributes('disabled')).toBeDefined();
  });
});
