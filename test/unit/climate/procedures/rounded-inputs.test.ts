import { describe, expect, it } from 'vitest';
import { withRoundedInputs } from '../../../../src-main/climate/procedures/rounded-inputs.ts';
import { expectClose } from '../../../helpers/close.ts';

const hand = { rel: 1e-12, abs: 0, why: 'by hand' };

describe('withRoundedInputs', () => {
  it('takes each input half a unit of its last digit to either side', () => {
    const { low, high } = withRoundedInputs([3.7, 1.9], (n = NaN, d = NaN) => n / d) ?? {};
    expectClose(low, 3.65 / 1.95, hand);
    expectClose(high, 3.75 / 1.85, hand);
  });

  it('knows no interval where an end has no number', () => {
    expect(withRoundedInputs([1, 0.5], (n = NaN, d = NaN) => n / (d - 0.55))).toBeUndefined();
  });
});
