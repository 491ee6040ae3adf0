import { describe, expect, it } from 'vitest';
import RecomputationSection from '../../../src-renderer/sheet/RecomputationSection.vue';
import { Refusal } from '../../helpers/fake-host.ts';
import { button, field, settled } from '../../helpers/mount-screen.ts';
import { inventedSheet, mountOnSheet } from '../../helpers/sheet-screen.ts';

const view = inventedSheet();
const mounted = (change = {}, reply = () => view) =>
  mountOnSheet(RecomputationSection, {
    view: inventedSheet(change),
    prepare: (host) => host.reply('claim.recompute', reply),
  });

describe('the recomputation', () => {
  it('says whether the number is reproduced, and shows both kinds of R²', async () => {
    const { screen } = await mounted();
    expect(screen.get('h2').text()).toBe('Recomputation reproduced within rounding');
    const facts = screen.get('dl.facts').text();
    for (const said of ['1.87 ± 0.07', '1.85 – 1.95', '2.70 K × ln 2 = 1.87', '0.87', '0.96', '21.6 of 60'])
      expect(facts).toContain(said);
  });

  it('is kept back while something is missing, and says what', async () => {
    const { screen } = await mounted({ obstacles: ['The series “harbour-air” has no unit.'] });
    expect(screen.text()).toContain('The series “harbour-air” has no unit.');
    expect(button(screen, 'Recompute').attributes('disabled')).toBeDefined();
  });

  it('is asked for with a number of its own, and says when nothing new came out', async () => {
    const { screen, host, session } = await mounted();
    await button(screen, 'Recompute').trigger('click');
    await settled();
    expect(host.inputs('claim.recompute')[0]).toEqual({ claimId: 1, jobId: expect.stringMatching(/^[0-9a-f-]{36}$/) });
    expect(session.notice.value).toEqual({ text: 'Computed again: the same to the last digit.', canUndo: false });
  });

  it('says that it was cancelled', async () => {
    const { screen, session } = await mounted({}, () => {
      throw new Refusal({ kind: 'Cancelled', code: 'cancelled' });
    });
    await button(screen, 'Recompute').trigger('click');
    await settled();
    expect(screen.get('[role=alert]').text()).toBe('Cancelled. Nothing was changed.');
    expect(session.notice.value).toBeNull();
  });

  it('says that it is older than the claim', async () => {
    const { screen } = await mounted({ recomputation: { ...view.recomputation!, isStale: true } });
    expect(screen.text()).toContain('The claim has changed since this was computed.');
  });
});

describe('the choices of a regression', () => {
  async function write(label: string, text: string) {
    const mountedPart = await mounted();
    await field(mountedPart.screen, label).setValue(text);
    await settled();
    return { ...mountedPart, changes: mountedPart.host.inputs('claim.update').map(({ change }) => change.procedure) };
  }

  it('keeps a whole window, and no half of one', async () => {
    const { screen, changes, host } = await write('First year', '1975');
    expect(changes).toMatchObject([{ window: { start: 1975, end: 2019 } }]);
    await field(screen, 'Last year').setValue('');
    await settled();
    expect(host.inputs('claim.update')).toHaveLength(1);
  });

  it.each([
    { label: 'First year', text: '2019', says: 'The first year comes before the last.' },
    { label: 'First year', text: 'the war', says: 'A year is a whole number, such as 1959.' },
    { label: 'Anchor years', text: '0', says: 'A whole number of years, 1 or more.' },
    { label: 'Lag (years)', text: '2.5', says: 'A whole number of years, 0 or more.' },
  ])('stores no $text as $label', async ({ label, text, says }) => {
    const { screen, changes } = await write(label, text);
    expect(screen.text()).toContain(says);
    expect(changes).toEqual([]);
  });

  it('keeps anchor and lag', async () => {
    expect((await write('Anchor years', '10')).changes).toMatchObject([
      { anchor: { kind: 'mean-of-first', years: 10 } },
    ]);
    expect((await write('Lag (years)', '6')).changes).toMatchObject([{ covariance: { kind: 'newey-west', lag: 6 } }]);
  });
});
