import { expect, it } from 'vitest';
import { integrate } from '../../helpers/integrate.ts';

it('integrate solves equations whose solution is known, to rounding', () => {
  const [swing = NaN] = integrate((_, [y = 0, v = 0]) => [v, -y], [0, 1], { from: 0, to: 3, steps: 6 });
  expect(Math.abs(swing - Math.sin(3))).toBeLessThan(1e-13);
  const [growth = NaN] = integrate((t, [y = 0]) => [2 * t * y], [1], { from: 0, to: 1.5, steps: 6 });
  expect(Math.abs(growth / Math.exp(2.25) - 1)).toBeLessThan(1e-13);
  // One long step is not good to rounding: the check can fail.
  const [coarse = NaN] = integrate((_, [y = 0, v = 0]) => [v, -y], [0, 1], { from: 0, to: 30, steps: 1 });
  expect(Math.abs(coarse - Math.sin(30))).toBeGreaterThan(1e-6);
});
