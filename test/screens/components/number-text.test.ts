import { flushPromises, mount } from '@vue/test-utils';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import DigestText from '../../../src-renderer/components/DigestText.vue';
import ErrorNote from '../../../src-renderer/components/ErrorNote.vue';
import NumberText from '../../../src-renderer/components/NumberText.vue';
import { digest } from '../../helpers/invented-project.ts';

const writeText = vi.fn(async (_text: string) => undefined);

beforeEach(() => {
  writeText.mockClear();
  Object.defineProperty(navigator, 'clipboard', { value: { writeText }, configurable: true });
});

describe('a number', () => {
  it('is set to the digits that its uncertainty leaves, and copied with all of them', async () => {
    const number = mount(NumberText, { props: { value: 1.87234567, uncertainty: 0.2123, unit: 'K per doubling' } });
    expect(number.text().replaceAll(/\s+/g, ' ')).toMatch(/^1\.9 ± 0\.2 K per doubling/);
    await number.trigger('click');
    await flushPromises();
    expect(writeText).toHaveBeenCalledExactlyOnceWith('1.87234567 ± 0.2123 K per doubling');
    expect(number.text()).toContain('Copied');
  });

  it('says that an interval has no end', () => {
    const number = mount(NumberText, { props: { value: 2.71, interval: { low: 1.9, high: null } } });
    expect(number.text()).toContain('unbounded');
    expect(number.attributes('aria-label')).toContain('in full 2.71 (1.9 – unbounded)');
  });
});

describe('a digest', () => {
  it('is shortened for the eye and copied whole', async () => {
    const whole = digest(3);
    const short = mount(DigestText, { props: { digest: whole, name: 'SHA-256' } });
    expect(short.find('code').text()).toBe(`${whole.slice(0, 6)}…${whole.slice(-4)}`);
    await short.trigger('click');
    expect(writeText).toHaveBeenCalledExactlyOnceWith(whole);
  });

  it('can stand in full', () => {
    const full = mount(DigestText, { props: { digest: digest(3), isFull: true } });
    expect(full.find('code').text().replaceAll(' ', '')).toBe(digest(3));
  });
});

describe('an error', () => {
  const error = {
    kind: 'InputError',
    code: 'bad-rows',
    where: 'harbour-air.csv, line 23',
    expected: 'a number',
    received: '“o.17”',
    hint: 'Mend the line.',
  } as const;

  it('says where, what was expected, what was found and what to do', () => {
    const note = mount(ErrorNote, { props: { error } });
    expect(note.attributes('role')).toBe('alert');
    expect(note.findAll('p').map((line) => line.text())).toEqual([
      'harbour-air.csv, line 23',
      'Expected a number, but found “o.17”.',
      'Mend the line.',
    ]);
  });

  it('is no fault when the reviewer cancelled', () => {
    const note = mount(ErrorNote, { props: { error: { ...error, kind: 'Cancelled' } } });
    expect(note.text()).toBe('Cancelled. Nothing was changed.');
  });
});
