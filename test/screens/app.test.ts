import { beforeEach, describe, expect, it } from 'vitest';
import App from '../../src-renderer/App.vue';
import { inventedProject, inventedTrail } from '../helpers/invented-project.ts';
import { button, field, mountScreen, settled } from '../helpers/mount-screen.ts';

const press = async (key: string, options: KeyboardEventInit = {}, target: EventTarget = document.body) => {
  target.dispatchEvent(new KeyboardEvent('keydown', { key, ctrlKey: true, bubbles: true, ...options }));
  await settled();
};

const prepare: NonNullable<Parameters<typeof mountScreen>[1]>['prepare'] = (host) => {
  host.reply('projects.list', () => ({ directory: '/reviews', parent: null, folders: [], projects: [] }));
  host.reply('trail.list', () => ({ lines: inventedTrail, hasMore: false }));
};

beforeEach(() => {
  location.hash = '';
  localStorage.clear();
});

describe('the first start', () => {
  it('asks who is reviewing before anything else', async () => {
    const { screen, host } = await mountScreen(App, { session: { project: null, reviewer: null }, prepare });
    expect(screen.find('nav').exists()).toBe(false);
    expect(screen.findAll('h2').map((title) => title.text())).toContain('Who is reviewing?');
    expect(screen.text()).not.toContain('Create the project');
    expect(screen.text()).toContain('No network');

    host.reply('reviewer.set', (input) => ({ ...input, publicKey: null, fingerprint: null }));
    await button(screen, 'Begin').trigger('click');
    expect(screen.text()).toContain('Write the name under which you review.');
    await field(screen, 'Your name').setValue('  I. Okonedo ');
    await button(screen, 'Begin').trigger('click');
    await settled();
    expect(host.inputs('reviewer.set')).toEqual([{ name: 'I. Okonedo', role: '' }]);
    expect(screen.text()).toContain('Create the project');
    expect(screen.text()).toContain('never about a person');
  });

  it('says what is wrong when nobody answers', async () => {
    const { screen } = await mountScreen(App, {
      prepare: (host) =>
        host.reply('session.get', () => {
          throw new Error('gone');
        }),
    });
    expect(screen.find('[role=alert]').text()).toContain('Start Footing again');
  });
});

describe('an open project', () => {
  it('has an index of its shelves and claims', async () => {
    const { screen } = await mountScreen(App, { prepare });
    await settled();
    expect(location.hash).toBe('#/claims');
    expect(document.title).toBe('Claims · Marrowick harbour review · Footing');
    const index = screen.find('nav[aria-label=Project]');
    expect(index.text()).toContain('Invented data');
    expect(index.text()).toContain('218 entries');
    const claims = index.findAll('li');
    expect(claims).toHaveLength(4);
    expect(claims[0]!.text()).toContain('supported, signed');
    expect(claims[1]!.find('a').attributes('href')).toBe('#/claims/2');
    expect(claims[1]!.find('svg').exists()).toBe(true);
    expect(index.find('[aria-current=page]').text()).toContain('Claims');
  });

  it('follows the address', async () => {
    const { screen } = await mountScreen(App, { prepare });
    location.hash = '#/sources';
    await settled();
    expect(screen.find('h1').text()).toBe('Sources');
    location.hash = '#/trail';
    await settled();
    expect(screen.find('h1').text()).toBe('Trail');
    expect(document.title).toContain('Trail');
  });

  it('shows what is running, and cancels it', async () => {
    const { screen, host } = await mountScreen(App, { prepare });
    host.reply('job.cancel', () => ({ wasRunning: true }));
    host.tell({ jobId: 'j', label: 'Sweeping windows', shareDone: 0.432, secondsLeft: 11.2, isFinished: false });
    await settled();
    expect(screen.find('.work').text()).toContain('43 % · about 12 s left');
    expect(screen.find('progress').attributes('value')).toBe('0.432');
    expect(screen.find('.work [role=status]').text()).toBe('Sweeping windows, 25 percent done');
    await button(screen, 'Cancel').trigger('click');
    expect(host.inputs('job.cancel')).toEqual([{ jobId: 'j' }]);
    host.tell({ jobId: 'j', label: 'Sweeping windows', shareDone: 1, secondsLeft: 0, isFinished: true });
    await settled();
    expect(screen.find('progress').exists()).toBe(false);
  });

  it('takes back by keys, but not while somebody is typing', async () => {
    location.hash = '#/claims/new';
    const { screen, host } = await mountScreen(App, { prepare });
    host.reply('trail.undo', () => ({ ...inventedProject, undo: null, redo: 'mark assumption' }));
    host.reply('trail.redo', () => inventedProject);
    await press('z', {}, field(screen, 'The words of the source').element);
    expect(host.inputs('trail.undo')).toHaveLength(0);
    await press('z');
    expect(host.inputs('trail.undo')).toHaveLength(1);
    expect(screen.text()).toContain('Taken back: mark assumption');
    await press('Z', { shiftKey: true });
    expect(host.inputs('trail.redo')).toHaveLength(1);
  });

  it('can be renamed at its title', async () => {
    const { screen, host } = await mountScreen(App, { prepare });
    host.reply('project.rename', ({ title }) => ({
      ...inventedProject,
      project: { ...inventedProject.project, title },
    }));
    await button(screen, 'Marrowick harbour review').trigger('click');
    await settled();
    expect(screen.text()).toContain(inventedProject.path);
    await field(screen, 'Title').setValue('Marrowick, second night');
    await settled();
    expect(host.inputs('project.rename')).toEqual([{ title: 'Marrowick, second night' }]);
    expect(document.title).toBe('Claims · Marrowick, second night · Footing');
  });

  it('goes back to the start when it is closed', async () => {
    const { screen, host } = await mountScreen(App, { prepare });
    host.reply('project.close', () => ({}));
    await press('k');
    await screen.find('[role=combobox]').setValue('close');
    await screen.find('[role=combobox]').trigger('keydown', { key: 'Enter' });
    await settled();
    expect(host.inputs('project.close')).toHaveLength(1);
    expect(screen.text()).toContain('Begin a review');
    expect(document.title).toBe('Footing');
  });
});

describe('the command list', () => {
  it('finds claims, pages and actions, and is worked by keys', async () => {
    const { screen } = await mountScreen(App, { prepare });
    await press('k');
    const query = screen.find('[role=combobox]');
    const options = () => screen.findAll('[role=option]').map((option) => option.text());
    expect(options()).toEqual(
      expect.arrayContaining(['Claim 2: At most 1.9 °C per doubling', 'Go to the Trail', 'New claim', 'Paper: dark']),
    );
    await query.setValue('go to s');
    expect(options().slice(0, 2)).toEqual(['Go to Sources', 'Go to Series']);
    await query.trigger('keydown.down');
    const selected = screen.find('[aria-selected=true]');
    expect(selected.text()).toBe('Go to Series');
    expect(query.attributes('aria-activedescendant')).toBe(selected.attributes('id'));
    await query.trigger('keydown.enter');
    await settled();
    expect(location.hash).toBe('#/series');
    expect(screen.find('h1').text()).toBe('Series');
  });

  it('says so when nothing is found', async () => {
    const { screen } = await mountScreen(App, { prepare });
    await press('k');
    await screen.find('[role=combobox]').setValue('xyzzy');
    expect(screen.find('dialog[aria-label=Commands] [role=status]').text()).toContain('“xyzzy”');
  });

  it('does not offer changes to a project that is only read', async () => {
    await mountScreen(App, { prepare, session: { project: { ...inventedProject, isReadOnly: true } } });
    await press('k');
    const labels = [...document.querySelectorAll('[role=option]')].map((option) => option.textContent);
    expect(labels.join()).toContain('Go to Claims');
    expect(labels.join()).not.toContain('New claim');
  });
});

describe('the paper', () => {
  it('is light or dark by choice, which this machine keeps', async () => {
    await mountScreen(App, { prepare });
    const choose = async (query: string) => {
      await press('k');
      const input = document.querySelector<HTMLInputElement>('[role=combobox]')!;
      input.value = query;
      input.dispatchEvent(new Event('input'));
      await settled();
      await press('Enter', { ctrlKey: false }, input);
    };
    await choose('paper: dark');
    expect(document.documentElement.dataset.theme).toBe('dark');
    expect(localStorage.getItem('footing.theme')).toBe('dark');
    await choose('paper: as the system');
    expect(localStorage.getItem('footing.theme')).toBeNull();
  });
});
