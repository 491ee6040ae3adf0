import { mount } from '@vue/test-utils';
import { describe, expect, it } from 'vitest';
import SelectField from '../../../src-renderer/components/SelectField.vue';
import TextField from '../../../src-renderer/components/TextField.vue';
import { field } from '../../helpers/mount-screen.ts';

describe('a field', () => {
  it('is named by its label and described by its hint and its problem', async () => {
    const screen = mount(TextField, { props: { label: 'Unit', hint: 'Not in the file.', modelValue: '' } });
    const input = field(screen, 'Unit');
    const description = () =>
      (input.attributes('aria-describedby') ?? '')
        .split(' ')
        .map((id) => screen.find(`[id="${id}"]`).text())
        .join(' ');
    expect(description()).toBe('Not in the file.');
    expect(input.attributes('aria-invalid')).toBeUndefined();

    await screen.setProps({ problem: 'State the unit.' });
    expect(description()).toBe('Not in the file. State the unit.');
    expect(input.attributes('aria-invalid')).toBe('true');
  });

  it('explains its term on demand', async () => {
    const screen = mount(TextField, {
      props: { label: 'Value', help: 'The digits decide.', modelValue: '' },
      attachTo: document.body,
    });
    const ask = screen.find('button');
    const explanation = screen.find(`[id="${ask.attributes('aria-controls')}"]`);
    expect(explanation.isVisible()).toBe(false);
    await ask.trigger('click');
    expect(ask.attributes('aria-expanded')).toBe('true');
    expect(explanation.text()).toBe('The digits decide.');
    await ask.trigger('keydown.esc');
    expect(ask.attributes('aria-expanded')).toBe('false');
  });

  it('keeps null apart from words in a choice', async () => {
    const options = [
      { value: null, label: 'none' },
      { value: 2, label: 'claim 2' },
    ];
    const screen = mount(SelectField<number | null>, { props: { label: 'Show', options, modelValue: null } });
    const [none, second] = screen.findAll('option');
    await second!.setValue();
    await none!.setValue();
    expect(screen.emitted('update:modelValue')).toEqual([[2], [null]]);
  });
});
