import { mount } from '@vue/test-utils';
import { describe, expect, it } from 'vitest';
import StemMiniature from '../../../src-renderer/charts/StemMiniature.vue';

describe('StemMiniature', () => {
  it('is decoration: the row that it stands in says the same in words', () => {
    const miniature = mount(StemMiniature, {
      props: {
        miniature: { statedValue: 1.9, recomputed: { value: 2.4, low: 2, high: null } },
        domain: { low: 1, high: 4 },
      },
    });
    expect(miniature.attributes('aria-hidden')).toBe('true');
    expect(miniature.attributes('width')).toBe('180');
    expect(miniature.find('circle').exists()).toBe(true);
  });
});
