import { expect, it } from 'vitest';
import { recordedCo2Changes } from '../../../src-main/quantities/recorded-co2-changes.ts';

it('names each change, with warming and rise of one sign, and says where it comes from', () => {
  expect(new Set(recordedCo2Changes.map(({ label }) => label)).size).toBe(recordedCo2Changes.length);
  for (const { label, fromPpm, toPpm, warmingK, source } of recordedCo2Changes) {
    expect(Math.sign(toPpm - fromPpm)).toBe(Math.sign(warmingK));
    expect(label).toContain(`${fromPpm} to ${toPpm} ppm, ${warmingK} K`);
    expect(source).not.toBe('');
  }
});
