import { describe, expect, it } from 'vitest';
import AssumptionsSection from '../../../src-renderer/sheet/AssumptionsSection.vue';
import { button, field, settled } from '../../helpers/mount-screen.ts';
import { inventedSheet, mountOnSheet } from '../../helpers/sheet-screen.ts';

const mounted = (change = {}) =>
  mountOnSheet(AssumptionsSection, {
    view: inventedSheet(change),
    prepare: (host) => host.reply('claim.mark', () => inventedSheet(change)),
  });

/** Typing that is not finished: nothing has left the field yet. */
async function write(area: ReturnType<typeof field>, text: string): Promise<void> {
  (area.element as HTMLTextAreaElement).value = text;
  await area.trigger('input');
}

describe('the ledger', () => {
  it('shows test, number, range, weight and mark of each assumption', async () => {
    const { screen } = await mounted();
    expect(screen.get('h2').text()).toBe('Assumptions 3 apply · 2 tested · 1 need data');
    const heat = screen.findAll('tbody').find((row) => row.find('.opener').exists());
    expect(heat!.text()).toMatch(/Energy budget, N = 0\.79.*2\.71.*1\.90 – 4\.41.*decisive/s);
    expect(heat!.get('select').element.value).toBe('not met');
    expect(screen.text()).toContain('no series of total forcing is in the project.');
    expect(screen.text()).toMatch(/The ladder.*20000.*seed.*20261/s);
  });

  it('stores a mark with the note that stands beside it', async () => {
    const { screen, host } = await mounted();
    await screen.findAll('.opener')[1]!.trigger('click');
    await write(field(screen, 'Your note on this mark'), 'A cold first year.');
    await screen.findAll('select[aria-label^="Your mark"]')[1]!.setValue('met');
    await settled();
    expect(host.inputs('claim.mark')).toEqual([
      { claimId: 1, assumptionId: 'zero-intercept', mark: 'met', note: 'A cold first year.' },
    ]);
  });

  it('keeps a note that is being written while a mark is being stored', async () => {
    const { screen } = await mounted();
    await screen.findAll('.opener')[1]!.trigger('click');
    await screen.findAll('select[aria-label^="Your mark"]')[1]!.setValue('met');
    const note = field(screen, 'Your note on this mark');
    await write(note, 'Half a sen');
    await settled();
    expect((note.element as HTMLTextAreaElement).value).toBe('Half a sen');
  });

  it('opens to the reading, the statistic with its convention, the proposal and the figures', async () => {
    const { screen } = await mounted();
    for (const opener of screen.findAll('.opener').slice(0, 2)) await opener.trigger('click');
    for (const said of [
      'intercept t = −4.200',
      'Newey–West, lag 3',
      'Proposed: not met.',
      'Sixty years are few for lag 3.',
      'warming, K',
    ])
      expect(screen.text()).toContain(said);
    expect(screen.findAll('.opener')[0]!.attributes('aria-expanded')).toBe('true');
  });

  it('is closed to changes once the finding is signed', async () => {
    const { screen } = await mounted({ isFrozen: true });
    expect(button(screen, 'Test the assumptions').attributes('disabled')).toBeDefined();
    for (const select of screen.findAll('select')) expect(select.attributes('disabled')).toBeDefined();
  });
});

describe('the energy budget', () => {
  const central = '[aria-label="Heat-uptake change, ΔN, best value"]';
  const low = '[aria-label="Heat-uptake change, ΔN, lower end"]';
  const high = '[aria-label="Heat-uptake change, ΔN, upper end"]';

  it('is filled in from the published one, and stored when the reviewer says so', async () => {
    const { screen, host } = await mounted();
    await button(screen, 'Fill in the values of AR6 §7.5.2.1').trigger('click');
    expect(screen.get<HTMLInputElement>(central).element.value).toBe('0.33');
    expect(host.inputs('claim.update')).toEqual([]);
    await button(screen, 'Keep these values').trigger('click');
    await settled();
    expect(host.inputs('claim.update')[0]?.change.evidence).toMatchObject({
      energyBudget: {
        uptakeWm2: { best: 0.33, low: 0.3, high: 0.36, levelPercent: 90, source: 'an invented edition' },
      },
      doublingWm2: { best: 4.04, low: 3.6, high: 4.48, levelPercent: 90 },
    });
  });

  it('reads a decimal comma and a minus sign', async () => {
    const { screen, host } = await mounted();
    await screen.get(central).setValue('−0,2');
    await screen.get(low).setValue('-0.5');
    await button(screen, 'Keep these values').trigger('click');
    await settled();
    expect(host.inputs('claim.update')[0]?.change.evidence?.energyBudget?.uptakeWm2).toMatchObject({
      best: -0.2,
      low: -0.5,
    });
  });

  it.each([
    { at: central, text: 'some', says: 'Expected a number, but found “some”.' },
    {
      at: low,
      text: '',
      says: 'Expected both ends of its range, or none for a value taken as exact, but found nothing to',
    },
    { at: high, text: '-1', says: 'Expected a best value within its range, but found 0.79 beside 0.63 to -1.' },
  ])('stores nothing with “$text” in it', async ({ at, text, says }) => {
    const { screen, host } = await mounted();
    await screen.get(at).setValue(text);
    await button(screen, 'Keep these values').trigger('click');
    await settled();
    expect(screen.get('[role=alert]').text()).toContain('Energy budget: Heat-uptake change, ΔN');
    expect(screen.get('[role=alert]').text()).toContain(says);
    expect(host.inputs('claim.update')).toEqual([]);
  });

  it('takes a value without a range as exact', async () => {
    const { screen, host } = await mounted();
    await screen.get(low).setValue('');
    await screen.get(high).setValue('');
    await button(screen, 'Keep these values').trigger('click');
    await settled();
    expect(host.inputs('claim.update')[0]?.change.evidence?.energyBudget?.uptakeWm2).toMatchObject({
      low: 0.79,
      high: 0.79,
    });
  });

  it('asks for what is missing', async () => {
    const { screen, host } = await mounted();
    await screen.get(central).setValue('');
    await screen.get(low).setValue('');
    await screen.get(high).setValue('');
    await button(screen, 'Keep these values').trigger('click');
    await settled();
    expect(screen.get('[role=alert]').text()).toContain('nothing for Heat-uptake change, ΔN.');
    expect(host.inputs('claim.update')).toEqual([]);
  });
});
