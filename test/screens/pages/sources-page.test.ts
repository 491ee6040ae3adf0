import { describe, expect, it } from 'vitest';
import SourcesPage from '../../../src-renderer/pages/SourcesPage.vue';
import { Refusal } from '../../helpers/fake-host.ts';
import { inventedProject } from '../../helpers/invented-project.ts';
import { button, choose, field, mountScreen, settled } from '../../helpers/mount-screen.ts';

describe('the sources', () => {
  it('are listed with the digest of what was received', async () => {
    const { screen } = await mountScreen(SourcesPage);
    const [first, second] = screen.findAll('article');
    expect(first!.text()).toContain('The roof over Marrowick');
    expect(first!.text()).toContain('roof-over-marrowick.txt');
    expect(first!.find('code').text()).toMatch(/^[0-9a-f]{6}…[0-9a-f]{4}$/);
    expect(second!.text()).toContain('No file attached.');
  });

  it('are added with their bytes as received', async () => {
    const { screen, host } = await mountScreen(SourcesPage);
    host.reply('source.save', () => inventedProject);
    await button(screen, 'Add a source').trigger('click');
    await button(screen, 'Add').trigger('click');
    expect(screen.text()).toContain('Give the source a title');
    expect(host.inputs('source.save')).toHaveLength(0);

    await field(screen, 'Title').setValue(' The roof ');
    await choose(screen, [new File(['a roof'], 'roof.txt')]);
    await button(screen, 'Add').trigger('click');
    await settled();
    expect(host.inputs('source.save')).toEqual([
      { title: 'The roof', kind: 'talk', details: '', file: { name: 'roof.txt', bytes: btoa('a roof') } },
    ]);
    expect(screen.find('form').exists()).toBe(false);
  });

  it('keep every change at once', async () => {
    const { screen, host } = await mountScreen(SourcesPage);
    host.reply('source.save', () => inventedProject);
    await button(screen, 'Edit').trigger('click');
    const title = field(screen, 'Title');
    await title.setValue('');
    expect(screen.text()).toContain('A source needs a title.');
    expect(host.inputs('source.save')).toHaveLength(0);
    await title.setValue('The roof, second night');
    await settled();
    expect(host.inputs('source.save')).toEqual([
      { id: 1, title: 'The roof, second night', kind: 'talk', details: inventedProject.sources[0]!.details },
    ]);
  });

  it('are removed with a way back, or with the reason why not', async () => {
    const { screen, host, session } = await mountScreen(SourcesPage);
    host.reply('source.remove', () => {
      throw new Refusal({
        where: 'Source 1',
        expected: 'a source that no claim names',
        hint: 'Remove the claim first.',
      });
    });
    await button(screen, 'Remove').trigger('click');
    await settled();
    expect(screen.find('[role=alert]').text()).toContain('Remove the claim first.');
    expect(session.notice.value).toBeNull();

    host.reply('source.remove', () => ({ ...inventedProject, sources: inventedProject.sources.slice(1) }));
    await button(screen, 'Remove').trigger('click');
    await settled();
    expect(session.notice.value).toEqual({ text: 'Removed “The roof over Marrowick”.', canUndo: true });
    expect(screen.findAll('article')).toHaveLength(1);
  });

  it('say what to do when there are none', async () => {
    const { screen } = await mountScreen(SourcesPage, { session: { project: { ...inventedProject, sources: [] } } });
    expect(screen.text()).toContain('No source yet');
    expect(button(screen, 'Open the worked example').exists()).toBe(true);
  });
});
