import { beforeEach, describe, expect, it } from 'vitest';
import ClaimsPage from '../../../src-renderer/pages/ClaimsPage.vue';
import OneSeriesPage from '../../../src-renderer/pages/OneSeriesPage.vue';
import SeriesPage from '../../../src-renderer/pages/SeriesPage.vue';
import StartPage from '../../../src-renderer/pages/StartPage.vue';
import { Refusal } from '../../helpers/fake-host.ts';
import { digest, inventedFigure, inventedProject, inventedValues } from '../../helpers/invented-project.ts';
import { button, choose, field, mountScreen, settled } from '../../helpers/mount-screen.ts';

beforeEach(() => (location.hash = ''));

describe('the start', () => {
  const listing = {
    directory: '/reviews',
    parent: '/',
    folders: ['/reviews/older'],
    projects: [
      { path: '/reviews/a.footing', fileName: 'a.footing', title: 'Harbour', modifiedAt: '2031-03-03T14:06:00.000Z' },
    ],
  };
  const start = () =>
    mountScreen(StartPage, {
      session: { project: null },
      prepare: (host) =>
        host.reply('projects.list', ({ directory }) => ({ ...listing, directory: directory ?? '/reviews' })),
    });

  it('begins a review in the folder that is shown', async () => {
    const { screen, host, session } = await start();
    host.reply('project.create', () => inventedProject);
    await button(screen, 'older').trigger('click');
    await settled();
    await button(screen, 'Create the project').trigger('click');
    expect(screen.text()).toContain('Give the review a title');
    await field(screen, 'Title').setValue('Roofs');
    await button(screen, 'Create the project').trigger('click');
    await settled();
    expect(host.inputs('project.create')).toEqual([{ title: 'Roofs', directory: '/reviews/older' }]);
    expect(session.project.value?.project.title).toBe('Marrowick harbour review');
  });

  it('opens one from the list, or from a path, also only to read', async () => {
    const { screen, host } = await start();
    host.reply('project.open', () => {
      throw new Refusal({
        kind: 'ProjectError',
        where: 'a.footing',
        received: 'I. Okonedo writing in it',
        hint: 'Open it only to read.',
      });
    });
    await button(screen, 'Harbour').trigger('click');
    await settled();
    expect(screen.find('[role=alert]').text()).toContain('Open it only to read.');
    await field(screen, 'Only to read').setValue(true);
    await field(screen, 'Or the path of a project file').setValue('/elsewhere/b.footing');
    await button(screen, 'Open').trigger('click');
    await settled();
    expect(host.inputs('project.open')).toEqual([
      { path: '/reviews/a.footing', readOnly: false },
      { path: '/elsewhere/b.footing', readOnly: true },
    ]);
  });

  it('opens the worked example', async () => {
    const { screen, host, session } = await start();
    host.reply('project.openDemo', () => inventedProject);
    await button(screen, 'Open the worked example').trigger('click');
    await settled();
    expect(session.project.value?.project.isInvented).toBe(true);
  });
});

describe('the claims', () => {
  it('are listed as they were printed, beside what came out', async () => {
    const { screen } = await mountScreen(ClaimsPage);
    const rows = screen.findAll('tbody tr').map((row) => row.text().replaceAll(/\s+/g, ' '));
    expect(rows[1]).toContain('at most 1.9');
    expect(rows[1]).toContain('1.87 1.74 – 2.00');
    expect(rows[3]).toContain('not yet');
  });
});

describe('the series', () => {
  it('stand under their files, with what they lack', async () => {
    const { screen } = await mountScreen(SeriesPage);
    const groups = screen.findAll('tbody');
    expect(groups).toHaveLength(3);
    expect(groups[1]!.text()).toContain('gas-at-the-light.txt');
    expect(groups[1]!.text()).toContain('11 marked missing, 1 part year');
    expect(groups[0]!.text()).toContain('1961–1990');
    expect(groups[2]!.findAll('tr')).toHaveLength(3);
  });

  it('are imported from files that were chosen or dropped', async () => {
    const { screen } = await mountScreen(SeriesPage);
    await choose(screen, [new File(['a'], 'a.csv')]);
    expect(location.hash).toBe('#/series/import');
    expect(screen.text()).toContain('Go on with a.csv');
    await screen.find('.drop').trigger('drop', { dataTransfer: { files: [new File(['b'], 'b.csv')] } });
    expect(screen.text()).toContain('2 waiting');
  });
});

describe('one series', () => {
  const open = (isReadOnly = false) =>
    mountScreen(OneSeriesPage, {
      props: { seriesId: 1 },
      stubs: ['FigurePanel'],
      session: { project: { ...inventedProject, isReadOnly } },
      prepare: (host) =>
        host.reply('series.get', () => ({
          series: inventedProject.series[0]!,
          values: inventedValues,
          figure: inventedFigure,
        })),
    });

  it('says where it comes from', async () => {
    const { screen } = await open();
    const facts = screen.find('dl').text();
    expect(facts.replaceAll(' ', '')).toContain(digest(1));
    expect(facts).toContain('harbour-air.csv');
    expect(facts).toContain('delimited, version 1');
    expect(screen.findComponent({ name: 'FigurePanel' }).props('figure')).toEqual(inventedFigure);
  });

  it('keeps every change at once, and none that is half said', async () => {
    const { screen, host } = await open();
    host.reply('series.update', () => inventedProject);
    const unit = field(screen, 'Unit');
    await unit.setValue('°C');
    const start = screen.find('[aria-label="Baseline, first year"]');
    await start.setValue('1995');
    await settled();
    expect(host.inputs('series.update')).toEqual([{ seriesId: 1, unit: '°C' }]);
  });

  it('is removed with its file', async () => {
    const { screen, host, session } = await open();
    host.reply('dataset.remove', () => inventedProject);
    await button(screen, 'Remove this file and its series').trigger('click');
    await settled();
    expect(host.inputs('dataset.remove')).toEqual([{ datasetId: 1 }]);
    expect(session.notice.value?.text).toBe('Removed harbour-air.csv and its series.');
    expect(location.hash).toBe('#/series');
  });

  it('cannot be changed in a project that is only read', async () => {
    const { screen } = await open(true);
    expect(field(screen, 'Unit').attributes('disabled')).toBeDefined();
    expect(screen.text()).not.toContain('Remove this file');
  });

  it('that is gone says so', async () => {
    const { screen } = await mountScreen(OneSeriesPage, { props: { seriesId: 99 } });
    expect(screen.text()).toContain('There is no such series');
  });
});
