import { quantityId } from '../../../src-main/contract/primitives.ts';
import { beforeEach, describe, expect, it } from 'vitest';
import NewClaimPage from '../../../src-renderer/pages/NewClaimPage.vue';
import { button, field, mountScreen, settled } from '../../helpers/mount-screen.ts';

beforeEach(() => (location.hash = '#/claims/new'));

describe('a new claim', () => {
  it('is taken up with its words, place, number and kind', async () => {
    const { screen, host } = await mountScreen(NewClaimPage);
    host.reply('claim.create', () => ({ claim: { id: 5 } }) as never);
    await field(screen, 'The words of the source').setValue('The roof is at one point nine.');
    await field(screen, 'Where in it').setValue('12:27');
    await field(screen, 'Value, as printed').setValue('1.9');
    await screen.find('input[type=radio][value="at most"]').setValue();
    expect((field(screen, 'Short title').element as HTMLInputElement).value).toBe('At most 1.9 K per doubling');
    await button(screen, 'Take it up').trigger('click');
    await settled();
    expect(host.inputs('claim.create')).toEqual([
      {
        title: 'At most 1.9 K per doubling',
        statement: {
          words: 'The roof is at one point nine.',
          sourceId: 1,
          locator: '12:27',
          quantity: 'apparent-sensitivity',
          value: '1.9',
          unit: 'K per doubling',
          bound: 'at most',
        },
      },
    ]);
    expect(location.hash).toBe('#/claims/5');
  });

  it('offers the units of its quantity, and no other', async () => {
    const { screen, host } = await mountScreen(NewClaimPage);
    const units = () =>
      field(screen, 'Unit')
        .findAll('option')
        .map((option) => option.text());
    expect(units()).toContain('K per e-folding');
    await screen.find('input[value="trend"]').setValue();
    expect(units()).toEqual(['K per decade', 'K per year']);
    host.reply('claim.create', () => ({ claim: { id: 5 } }) as never);
    await field(screen, 'The words of the source').setValue('Half a degree.');
    await field(screen, 'Value, as printed').setValue('0.5');
    await button(screen, 'Take it up').trigger('click');
    await settled();
    expect(host.inputs('claim.create')[0]!.statement).toMatchObject({ quantity: 'trend', unit: 'K per decade' });
  });

  it('explains every quantity in a line', async () => {
    const { screen } = await mountScreen(NewClaimPage);
    const group = screen.findAll('[role=radiogroup]')[0]!;
    expect(group.findAll('label')).toHaveLength(quantityId.options.length);
    for (const option of group.findAll('label')) expect(option.find('.quiet-text').text().length).toBeGreaterThan(20);
  });

  it('asks for what is missing, and sends nothing until then', async () => {
    const { screen, host } = await mountScreen(NewClaimPage);
    await field(screen, 'Value, as printed').setValue('about two');
    await button(screen, 'Take it up').trigger('click');
    expect(screen.text()).toContain('Write the words of the source');
    expect(screen.text()).toContain('A plain decimal number is expected');
    expect(host.inputs('claim.create')).toHaveLength(0);
    await field(screen, 'Value, as printed').setValue('1.90');
    expect(screen.text()).not.toContain('A plain decimal number is expected');
  });

  it('leaves a title alone that the reviewer wrote', async () => {
    const { screen } = await mountScreen(NewClaimPage);
    await field(screen, 'Short title').setValue('The roof');
    await field(screen, 'Value, as printed').setValue('1.9');
    expect((field(screen, 'Short title').element as HTMLInputElement).value).toBe('The roof');
  });
});
