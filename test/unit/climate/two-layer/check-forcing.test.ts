import { expect, it } from 'vitest';
import { checkForcing } from '../../../../src-main/climate/two-layer/check-forcing.ts';

it.each([
  ['forcing.wm2', { kind: 'step', wm2: NaN }],
  ['forcing.wm2', { kind: 'step', wm2: -2e6 }],
  ['forcing.wm2PerYr', { kind: 'ramp', wm2PerYr: Infinity }],
  ['forcing.wm2[1]', { kind: 'annual', wm2: [1, NaN] }],
  ['forcing.wm2[2]', { kind: 'annual', wm2: [1, 2, 1e7] }],
  ['forcing.wm2', { kind: 'annual', wm2: [] }],
] as const)('checkForcing names %s', (place, forcing) => {
  const given = forcing.kind === 'annual' ? { kind: forcing.kind, wm2: [...forcing.wm2] } : forcing;
  expect(() => checkForcing('twoLayer', given)).toThrow(`twoLayer, ${place}: expected`);
});

it('checkForcing passes each kind', () => {
  checkForcing('twoLayer', { kind: 'step', wm2: -2 });
  checkForcing('twoLayer', { kind: 'ramp', wm2PerYr: 0.05 });
  checkForcing('twoLayer', { kind: 'annual', wm2: [0, 1, -2] });
});
