import { describe, expect, it } from 'vitest';
import type { PublishedLibrary } from '../../../src-main/contract/published.ts';
import { citationText } from '../../../src-renderer/components/published-words.ts';
import { filterPublished } from '../../../src-renderer/pages/published/filter-published.ts';
import PublishedPage from '../../../src-renderer/pages/PublishedPage.vue';
import type { FakeHost } from '../../helpers/fake-host.ts';
import { Refusal } from '../../helpers/fake-host.ts';
import { inventedProject } from '../../helpers/invented-project.ts';
import { button, field, mountScreen, settled } from '../../helpers/mount-screen.ts';
import { inventedSheet } from '../../helpers/sheet-screen.ts';

const invented = { limits: [], subject: '', edition: 'Aldwick report 2030', provenance: 'seen' as const, remark: null };
/** Invented values. */
const library: PublishedLibrary = {
  values: [
    {
      ...invented,
      id: 'aldwick-ecs',
      quantity: 'equilibrium-climate-sensitivity',
      label: 'Aldwick ECS',
      best: 3.3,
      ranges: [{ interval: { low: 2.75, high: 4, levelPercent: 66 }, words: 'likely (66 %)' }],
      limits: [{ term: 'very unlikely', side: 'above', value: 6 }],
      unit: 'K per doubling',
      source: 'Chapter 4',
    },
    {
      ...invented,
      id: 'brock-ecs',
      quantity: 'equilibrium-climate-sensitivity',
      label: 'Brock ECS',
      best: null,
      ranges: [{ interval: { low: 1.5, high: null, levelPercent: null }, words: 'range, no level given' }],
      unit: 'K per doubling',
      edition: 'Brock 2028',
      source: 'Table 2',
      provenance: 'memory',
      remark: 'Superseded.',
    },
    {
      ...invented,
      id: 'aldwick-co2',
      quantity: 'effective-radiative-forcing',
      subject: 'CO₂, 1750–2029',
      label: 'Aldwick forcing, CO₂',
      best: -0.25,
      ranges: [],
      unit: 'W/m²',
      source: 'Chapter 7',
      provenance: 'second-hand',
    },
  ],
  conflicts: [
    {
      id: 'aldwick-two',
      title: 'What Aldwick says of 3.3',
      valueIds: ['aldwick-ecs'],
      readings: [
        { words: 'a mean', source: '§4.1', value: 3.3, unit: 'K per doubling' },
        { words: 'a median', source: '§4.2', value: 3.1, unit: 'K per doubling' },
      ],
      reason: 'Only one can be.',
      taken: 'The mean.',
    },
  ],
  definitions: [
    {
      quantity: 'equilibrium-climate-sensitivity',
      edition: 'Aldwick report 2030',
      text: 'Warming in the end.',
      source: 'Glossary',
      provenance: 'memory',
    },
  ],
  likelihoods: [
    { term: 'likely', lowPercent: 66, highPercent: 100 },
    { term: 'more likely than not', lowPercent: 50, highPercent: 100 },
  ],
  studies: [
    {
      id: 'aldwick',
      label: 'Aldwick budget',
      periods: '1800–1830 to 2000–2029',
      warmingK: { best: 1.125, range: null },
      forcingWm2: { best: 2.5, range: { low: 2, high: 3, levelPercent: 90 } },
      uptakeWm2: { best: 0.5, range: null },
      doublingWm2: { best: 4, range: null },
      effcsId: 'aldwick-ecs',
      tcrId: null,
      provenance: 'seen',
      remark: null,
    },
  ],
};

const open = (claimId: number | null = null, prepare: (host: FakeHost) => void = () => undefined) =>
  mountScreen(PublishedPage, {
    props: { claimId },
    prepare(host) {
      host.reply('published.list', () => library);
      host.reply('claim.view', () => inventedSheet());
      host.reply('finding.save', () => inventedSheet());
      prepare(host);
    },
  });

const plainSpaces = (text: string): string => text.replaceAll('\u202f', ' ');

describe('the published values', () => {
  it('stand under their quantity, each with ranges and level, edition, place and mark in words', async () => {
    const { screen } = await open();
    expect(screen.findAll('section > h2').map((title) => plainSpaces(title.text()))).toEqual([
      'equilibrium climate sensitivity ECS, in K per doubling',
      'effective radiative forcing ERF, in W/m²',
    ]);
    const [first, second, third] = screen.findAll('section tbody > tr').map((row) => row.text());
    expect(first).toContain('3.302.75 – 4.00 likely (66 %)above 6.00 very unlikely');
    expect(first).toContain('read in the publication');
    expect(second).toContain('1.5 – unbounded range, no level given');
    expect(second).toContain('from memory: look it up before it decides');
    expect(second).toContain('Superseded.');
    expect(third).toContain('−0.25none given');
    expect(screen.get('[role=status]').text()).toBe('3 values');
    expect(screen.text()).toContain('Only values of one quantity can be held against each other');
  });

  it('show both readings of a publication that says two things, with the reason and the one that is followed', async () => {
    const { screen } = await open();
    const readings = screen.get('article[aria-label="What Aldwick says of 3.3"]');
    expect(readings.findAll('li').map((reading) => reading.text())).toEqual(['a mean §4.1', 'a median §4.2']);
    expect(readings.text()).toContain('Only one can be.');
    expect(readings.text()).toContain('Followed here: The mean.');
    await button(screen, 'Two readings of it').trigger('click');
    expect(document.activeElement).toBe(readings.element);
  });

  it('are found by words, quantity and edition, and all of them again', async () => {
    const { screen } = await open();
    const labels = () =>
      screen.findAll('section tbody th').map((label) => label.text().replace(' Two readings of it', ''));
    await field(screen, 'Words').setValue('co2 forcing');
    expect(labels()).toEqual(['Aldwick forcing, CO₂']);
    expect(screen.get('[role=status]').text()).toBe('1 of 3 values');
    expect(screen.find('article[aria-label]').exists()).toBe(false);
    await field(screen, 'Words').setValue('');
    await field(screen, 'Edition').findAll('option')[2]!.setValue();
    expect(labels()).toEqual(['Brock ECS']);
    await field(screen, 'Quantity').findAll('option')[2]!.setValue();
    expect(labels()).toEqual([]);
    expect(screen.text()).toContain('Nothing published is found by this');
    await button(screen, 'Show all values').trigger('click');
    expect(labels()).toHaveLength(3);
  });

  it('come with what likelihood words mean, definitions, and what went into the budgets', async () => {
    const { screen } = await open();
    const details = screen.findAll('details').map((one) => plainSpaces(one.text()));
    expect(details[0]).toContain('Warming in the end.');
    expect(details[1]).toContain('more likely than notabove 50–100 %');
    expect(details[2]).toContain('1.125');
    expect(details[2]).toContain('2.00 – 3.00 90 %');
  });

  it('copies a citation that names number, level, edition, place and mark', async () => {
    let copied = '';
    Object.defineProperty(navigator, 'clipboard', {
      value: { writeText: async (text: string) => void (copied = text) },
      configurable: true,
    });
    const { screen } = await open();
    await screen
      .findAll('button')
      .find((one) => one.text().startsWith('Copy'))!
      .trigger('click');
    await settled();
    expect(plainSpaces(copied)).toBe(
      'Aldwick ECS: 3.30 K per doubling; likely (66 %) 2.75 – 4.00; very unlikely above 6.00. Aldwick report 2030, Chapter 4 (read in the publication).',
    );
    expect(plainSpaces(citationText(library.values[1]!))).toBe(
      'Brock ECS: range, no level given 1.5 – unbounded K per doubling. Brock 2028, Table 2 (from memory: look it up before it decides).',
    );
  });
});

describe('quoting', () => {
  const box = '[aria-label="Quote Aldwick ECS"]';

  it('is offered once a claim is chosen, and keeps what the finding says', async () => {
    const { screen, host } = await open();
    expect(screen.find(box).exists()).toBe(false);
    await field(screen, 'Quote in the finding of').findAll('option')[1]!.setValue();
    await settled();
    await screen.get(box).setValue(true);
    await settled();
    const [finding] = inventedSheet().findings;
    expect(host.inputs('finding.save')).toEqual([
      {
        claimId: 1,
        conclusion: finding!.conclusion,
        text: finding!.text,
        conditions: finding!.conditions,
        publishedValueIds: [...finding!.publishedValueIds, 'aldwick-ecs'],
      },
    ]);
  });

  it('knows the claim that it was opened for, and what is quoted already', async () => {
    const [finding] = inventedSheet().findings;
    const quoted = { findings: [{ ...finding!, publishedValueIds: ['aldwick-ecs', 'ar6-tcr'] }] };
    const { screen, host } = await open(1, (one) => one.reply('claim.view', () => inventedSheet(quoted)));
    expect(screen.get('a[href="#/claims/1/finding"]').text()).toBe('Finding of claim 1');
    expect((screen.get(box).element as HTMLInputElement).checked).toBe(true);
    await screen.get(box).setValue(false);
    await settled();
    expect(host.inputs('finding.save').at(-1)?.publishedValueIds).toEqual(['ar6-tcr']);
  });

  it('is closed with a signed finding or a project that is read only', async () => {
    const signed = await open(1, (host) => host.reply('claim.view', () => inventedSheet({ isFrozen: true })));
    expect(signed.screen.find(box).exists()).toBe(false);
    expect(signed.screen.text()).toContain('can no longer change');
    const { screen } = await mountScreen(PublishedPage, {
      props: { claimId: 1 },
      session: { project: { ...inventedProject, isReadOnly: true } },
      prepare(host) {
        host.reply('published.list', () => library);
        host.reply('claim.view', () => inventedSheet());
      },
    });
    expect(screen.find(box).exists()).toBe(false);
  });

  it('says why a quotation was refused', async () => {
    const { screen } = await open(1, (host) =>
      host.reply('finding.save', () => {
        throw new Refusal({ code: 'signed', where: 'claim 1', hint: 'Start a revision.' });
      }),
    );
    await screen.get(box).setValue(true);
    await settled();
    expect(screen.get('[role=alert]').text()).toContain('Start a revision.');
  });
});

describe('filterPublished', () => {
  const ids = (words: string): string[] =>
    filterPublished(library, { words, quantity: null, edition: null }).flatMap(({ values }) =>
      values.map(({ id }) => id),
    );

  it.each([
    ['', ['aldwick-ecs', 'brock-ecs', 'aldwick-co2']],
    ['  ALDWICK  ', ['aldwick-ecs', 'aldwick-co2']],
    ['co2', ['aldwick-co2']],
    ['-0.25', ['aldwick-co2']],
    ['1750-2029', ['aldwick-co2']],
    ['memory', ['brock-ecs']],
    ['superseded brock', ['brock-ecs']],
    ['equilibrium aldwick', ['aldwick-ecs']],
    ['brock aldwick', []],
  ])('“%s” finds %j', (words, expected) => {
    expect(ids(words)).toEqual(expected);
  });
});
