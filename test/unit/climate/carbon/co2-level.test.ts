import { expect, it } from 'vitest';
import { co2Level } from '../../../../src-main/climate/carbon/co2-level.ts';

it.each([50, 280, 5000])('takes %s ppm', (ppm) => {
  expect(co2Level('test', 'co2Ppm', ppm)).toBe(ppm);
});

it.each([
  [-280, 'out-of-range', undefined],
  [0, 'out-of-range', undefined],
  [NaN, 'out-of-range', undefined],
  [0.042, 'suspected-unit', 'per cent'],
  [42.6, 'suspected-unit', 'pressure in Pa'],
  [420_000, 'suspected-unit', 'ppb'],
])('refuses %s', (ppm, code, hint) => {
  expect(() => co2Level('test', 'co2Ppm', ppm)).toThrow(
    expect.objectContaining({
      fields: expect.objectContaining({
        code,
        where: 'test, co2Ppm',
        ...(hint ? { hint: expect.stringContaining(hint) as string } : {}),
      }) as object,
    }),
  );
});
