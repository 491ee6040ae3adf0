import { describe, expect, it } from 'vitest';
import ClaimSheet from '../../../src-renderer/sheet/ClaimSheet.vue';
import { Refusal } from '../../helpers/fake-host.ts';
import { button, field, mountScreen, settled } from '../../helpers/mount-screen.ts';
import { inventedSheet } from '../../helpers/sheet-screen.ts';

const mounted = (reply = () => inventedSheet()) => {
  const margin = document.createElement('aside');
  margin.id = 'margin';
  return mountScreen(ClaimSheet, {
    props: { claimId: 1 },
    stubs: ['FigurePanel'],
    prepare(host) {
      // The margin belongs to the frame around the sheet.
      document.body.append(margin);
      host.reply('claim.view', reply);
      host.reply('note.add', () => inventedSheet());
      host.reply('note.remove', () => inventedSheet({ notes: [] }));
    },
  });
};

describe('the sheet of a claim', () => {
  it('leads with the words of the source and what the number was presented as', async () => {
    const { screen } = await mounted();
    expect(screen.get('h1').text()).toBe('A doubling of CO₂ can warm the planet by 1.9 °C at the most.');
    expect(screen.get('.kicker').text()).toBe(
      'Claim 1 · apparent sensitivity, stated as an upper limit of the equilibrium climate sensitivity',
    );
    expect(screen.findAll('h2').map((heading) => heading.text().split(' ')[0])).toEqual([
      'Statement',
      'Arithmetic',
      'Data',
      'Recomputation',
      'Assumptions',
      'Robustness',
      'Finding',
    ]);
  });

  it('says in the rail, in words too, how far each section has come', async () => {
    const { screen } = await mounted();
    const links = screen.get('[aria-label="Sections of this claim"]').findAll('a');
    expect(links.map((link) => link.text().replaceAll(/\s+/g, ' '))).toEqual([
      'Statement, in progress',
      'Arithmetic ✓, done',
      'Data ✓, done',
      'Recomputation ✓, done',
      'Assumptions, in progress',
      'Robustness ✓, done',
      'Finding, not begun',
    ]);
    expect(links[4]!.attributes('href')).toBe('#/claims/1/assumptions');
  });

  it('says that it is frozen when it is', async () => {
    const { screen } = await mounted(() => inventedSheet({ isFrozen: true }));
    expect(screen.text()).toContain('This sheet is frozen until a new revision is started');
  });

  it('says that there is no such claim, and shows the way back', async () => {
    const { screen } = await mounted(() => {
      throw new Refusal({ where: 'Claim 1', expected: 'a claim of this project' });
    });
    expect(screen.get('h1').text()).toBe('Claim 1');
    expect(screen.get('[role=alert]').text()).toContain('a claim of this project');
    expect(screen.get('a').attributes('href')).toBe('#/claims');
  });

  it('has notes and the trail of the claim in its margin', async () => {
    const { screen, host } = await mounted();
    const margin = document.querySelector('#margin');
    expect(margin?.textContent).toContain('The “roof” leaves the sea out.');
    expect(margin?.textContent).toContain('recompute');
    const inMargin = screen.findComponent({ name: 'MarginNotes' });
    await field(inMargin, 'Write a note').setValue('Ask again.');
    await button(inMargin, 'Add note').trigger('click');
    await settled();
    expect(host.inputs('note.add')).toEqual([{ claimId: 1, text: 'Ask again.' }]);
    await button(inMargin, 'Remove').trigger('click');
    await settled();
    expect(host.inputs('note.remove')).toEqual([{ claimId: 1, noteId: 1 }]);
    expect(margin?.textContent).not.toContain('The “roof”');
  });
});
