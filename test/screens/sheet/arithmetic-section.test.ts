import { describe, expect, it } from 'vitest';
import ArithmeticSection from '../../../src-renderer/sheet/ArithmeticSection.vue';
import { button, settled } from '../../helpers/mount-screen.ts';
import { inventedSheet, mountOnSheet } from '../../helpers/sheet-screen.ts';

const derivation = inventedSheet().derivation!;
const [line] = derivation.answer.lines;

describe('the arithmetic', () => {
  it('keeps changed lines, tidied, and then checks them', async () => {
    const { screen, host } = await mountOnSheet(ArithmeticSection, {
      prepare: (fake) => fake.reply('claim.derive', () => inventedSheet()),
    });
    await screen.get('textarea').setValue('  2.7 * ln(2) = 1.9\n\n 1.9 * 1.8 = 3.4 ');
    await button(screen, 'Check the arithmetic').trigger('click');
    await settled();
    expect(host.inputs('claim.update')).toEqual([
      { claimId: 1, change: { derivation: ['2.7 * ln(2) = 1.9', '1.9 * 1.8 = 3.4'] } },
    ]);
    expect(host.inputs('claim.derive')).toEqual([{ claimId: 1 }]);
  });

  it('checks unchanged lines without storing them again', async () => {
    const { screen, host } = await mountOnSheet(ArithmeticSection, {
      prepare: (fake) => fake.reply('claim.derive', () => inventedSheet()),
    });
    await button(screen, 'Check the arithmetic').trigger('click');
    await settled();
    expect(host.inputs('claim.update')).toEqual([]);
    expect(host.inputs('claim.derive')).toHaveLength(1);
  });

  it('says of each line what it comes to and whether that agrees', async () => {
    const lines = [
      line!,
      { ...line!, agrees: false, likelySlip: 'It would agree with log10 in place of ln.' },
      { ...line!, value: null, computedInterval: null, agrees: null, problem: 'an opening bracket has no end' },
    ];
    const { screen } = await mountOnSheet(ArithmeticSection, {
      view: inventedSheet({ derivation: { ...derivation, answer: { lines } } }),
    });
    const [right, wrong, unread] = screen.findAll('tbody tr').map((row) => row.text());
    expect(right).toMatch(/1\.8715.*1\.8368 to 1\.9062.*agrees within rounding/);
    expect(wrong).toContain('does not agree. It would agree with log10 in place of ln.');
    expect(unread).toContain('an opening bracket has no end');
    expect(screen.get('h2').text()).toContain('1 line does not agree');
  });
});
