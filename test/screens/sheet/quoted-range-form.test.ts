import { describe, expect, it } from 'vitest';
import type { Evidence } from '../../../src-main/contract/claim.ts';
import EvidenceForm from '../../../src-renderer/sheet/EvidenceForm.vue';
import { button, field, settled } from '../../helpers/mount-screen.ts';
import { inventedSheet, mountOnSheet } from '../../helpers/sheet-screen.ts';

function mounted(evidence: Partial<Evidence> = {}, change = {}) {
  const sheet = inventedSheet(change);
  const { claim } = sheet;
  return mountOnSheet(EvidenceForm, {
    view: { ...sheet, claim: { ...claim, evidence: { ...claim.evidence, ...evidence } } },
  });
}
const ecs = { comparedWith: 'ar6-ecs' };
const likely = { low: '2.5', high: '4.0', levelPercent: 66 };

describe('the published range that a number is compared with', () => {
  it('is chosen among those the claim may be held against, and asks for no range before', async () => {
    const { screen, host } = await mounted();
    const choice = field(screen, 'Compared with');
    const [none, first, second] = choice.findAll('option').map((option) => option.text());
    expect([none, first]).toEqual(['none named', 'AR6 assessed ECS · IPCC AR6 WG1 (2021)']);
    expect(second).toMatch(/^AR6 assessed TCR · /);
    expect(screen.text()).not.toContain('Quoted lower end');
    await choice.setValue('ar6-ecs');
    await settled();
    expect(host.inputs('claim.update')[0]?.change.evidence).toMatchObject({
      comparedWith: 'ar6-ecs',
      quotedRange: null,
    });
  });

  it('keeps a chosen value that is not among them', async () => {
    const { screen } = await mounted({ comparedWith: 'ar6-erf-co2' });
    expect((field(screen, 'Compared with').element as HTMLSelectElement).value).toBe('ar6-erf-co2');
  });

  it('takes the quoted range along when the source turns out to name none', async () => {
    const { screen, host } = await mounted({ ...ecs, quotedRange: likely });
    const choice = field(screen, 'Compared with');
    (choice.element as HTMLSelectElement).selectedIndex = 0;
    await choice.trigger('change');
    await settled();
    expect(host.inputs('claim.update').at(-1)?.change.evidence).toMatchObject({
      comparedWith: null,
      quotedRange: null,
    });
  });
});

describe('the range as the source quotes it', () => {
  it('shows what is stored, in the unit of the published value', async () => {
    const { screen } = await mounted({ ...ecs, quotedRange: likely });
    expect(screen.get('legend').text()).toBe('The range as the source quotes it, in K per doubling');
    const values = ['Quoted lower end', 'Quoted upper end', 'Level said, %'].map(
      (label) => (field(screen, label).element as HTMLInputElement).value,
    );
    expect(values).toEqual(['2.5', '4.0', '66']);
  });

  it('stores the digits as printed when the reviewer says so, not before', async () => {
    const { screen, host } = await mounted(ecs);
    await field(screen, 'Quoted lower end').setValue(' 2,50 ');
    await field(screen, 'Quoted upper end').setValue('4');
    await field(screen, 'Level said, %').setValue('90 %');
    expect(host.inputs('claim.update')).toEqual([]);
    await button(screen, 'Keep this range').trigger('click');
    await settled();
    expect(host.inputs('claim.update')[0]?.change.evidence).toMatchObject({
      comparedWith: 'ar6-ecs',
      quotedRange: { low: '2,50', high: '4', levelPercent: 90 },
    });
  });

  it('stores one end alone, and nothing for empty fields', async () => {
    const { screen, host } = await mounted({ ...ecs, quotedRange: likely });
    await field(screen, 'Quoted lower end').setValue('');
    await field(screen, 'Level said, %').setValue('');
    await button(screen, 'Keep this range').trigger('click');
    await settled();
    await field(screen, 'Quoted upper end').setValue('');
    await field(screen, 'Quoted lower end').setValue('');
    await field(screen, 'Level said, %').setValue('');
    await button(screen, 'Keep this range').trigger('click');
    await settled();
    expect(host.inputs('claim.update').map(({ change }) => change.evidence?.quotedRange)).toEqual([
      { low: null, high: '4.0', levelPercent: null },
      null,
    ]);
  });

  it.each([
    { label: 'Quoted lower end', text: 'about 2', says: 'Quoted range: lower end' },
    { label: 'Quoted upper end', text: '4 K', says: 'found “4 K”' },
    { label: 'Level said, %', text: 'likely', says: 'Quoted range: level' },
    { label: 'Level said, %', text: '120', says: 'found “120”' },
    { label: 'Level said, %', text: '0', says: 'found “0”' },
  ])('stores nothing with “$text” as $label', async ({ label, text, says }) => {
    const { screen, host } = await mounted({ ...ecs, quotedRange: likely });
    await field(screen, label).setValue(text);
    await button(screen, 'Keep this range').trigger('click');
    await settled();
    expect(screen.get('[role=alert]').text()).toContain(says);
    expect(host.inputs('claim.update')).toEqual([]);
  });

  it('is closed to changes once the finding is signed', async () => {
    const { screen } = await mounted({ ...ecs, quotedRange: likely }, { isFrozen: true });
    expect(field(screen, 'Compared with').attributes('disabled')).toBeDefined();
    expect(screen.get('fieldset').attributes('disabled')).toBeDefined();
    expect(button(screen, 'Keep this range').attributes('disabled')).toBeDefined();
  });
});
