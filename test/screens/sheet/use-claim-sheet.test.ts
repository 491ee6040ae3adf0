import { flushPromises } from '@vue/test-utils';
import { describe, expect, it } from 'vitest';
import { defineComponent, h, nextTick, ref, type Ref } from 'vue';
import { useClaimSheet, useOwnCopy } from '../../../src-renderer/sheet/use-claim-sheet.ts';
import { inventedProject } from '../../helpers/invented-project.ts';
import { settled } from '../../helpers/mount-screen.ts';
import { inventedSheet, mountOnSheet } from '../../helpers/sheet-screen.ts';

const Title = defineComponent({
  setup() {
    const { view, change } = useClaimSheet();
    return () => h('button', { onClick: () => change({ title: 'A new title' }) }, view.value?.claim.title);
  },
});

describe('a sheet', () => {
  it('is read once, and a change brings the new one with it', async () => {
    const { screen, host } = await mountOnSheet(Title);
    expect(host.inputs('claim.view')).toEqual([{ claimId: 1 }]);
    await screen.get('button').trigger('click');
    await settled();
    expect(screen.text()).toBe('A new title');
    expect(host.inputs('claim.update')).toEqual([{ claimId: 1, change: { title: 'A new title' } }]);
    expect(host.inputs('claim.view')).toHaveLength(1);
  });

  it('is read again when the project was changed from elsewhere', async () => {
    let view = inventedSheet();
    const { screen, host, session } = await mountOnSheet(Title, {
      prepare(fake) {
        fake.reply('claim.view', () => view);
        fake.reply('trail.undo', () => ({ ...inventedProject, head: { sequence: 219, hash: 'f'.repeat(64) } }));
      },
    });
    view = inventedSheet({ claim: { ...view.claim, title: 'As it was before' } });
    await session.ask('trail.undo', {});
    await settled();
    expect(host.inputs('claim.view')).toHaveLength(2);
    expect(screen.text()).toBe('As it was before');
  });
});

describe('a form’s own copy', () => {
  async function copyOf(stored: Ref<string>): Promise<Ref<string>> {
    let own: Ref<string> = ref('');
    const Field = defineComponent({
      setup() {
        own = useOwnCopy(() => stored.value);
        return () => h('p', own.value);
      },
    });
    await mountOnSheet(Field);
    await flushPromises();
    return own;
  }

  it('follows what is stored while nobody writes', async () => {
    const stored = ref('one');
    const own = await copyOf(stored);
    stored.value = 'two';
    await nextTick();
    expect(own.value).toBe('two');
  });

  it('keeps what is being written when what was written before is stored', async () => {
    const stored = ref('');
    const own = await copyOf(stored);
    own.value = 'The sea';
    own.value = 'The sea is left out';
    stored.value = 'The sea';
    await nextTick();
    expect(own.value).toBe('The sea is left out');
    stored.value = 'The sea is left out';
    await nextTick();
    stored.value = '';
    await nextTick();
    expect(own.value, 'after an undo').toBe('');
  });
});
