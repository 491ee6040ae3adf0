import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { axisDecimals, axisTicks, paddedDomain } from '../../../src-main/figures/axis.ts';

describe('axisTicks', () => {
  it('puts round positions inside the domain, without the crumbs of adding up', () => {
    expect(axisTicks({ low: 1.03, high: 4.65 }, 4)).toEqual([2, 3, 4]);
    expect(axisTicks({ low: 0, high: 0.55 }, 5)).toEqual([0, 0.1, 0.2, 0.3, 0.4, 0.5]);
    expect(axisTicks({ low: -0.25, high: 0.25 }, 5)).toEqual([-0.2, -0.1, 0, 0.1, 0.2]);
    expect(axisTicks({ low: 1890, high: 2020 }, 6)).toEqual([1900, 1920, 1940, 1960, 1980, 2000, 2020]);
  });

  it('stays inside the domain and near the asked count for any domain', () => {
    const domain = fc.tuple(
      fc.double({ min: -1e6, max: 1e6, noNaN: true }),
      fc.double({ min: 1e-3, max: 1e6, noNaN: true }),
    );
    fc.assert(
      fc.property(domain, fc.integer({ min: 3, max: 10 }), ([low, length], count) => {
        const ticks = axisTicks({ low, high: low + length }, count);
        const slack = length * 1e-6;
        expect(ticks.every((tick) => tick >= low - slack && tick <= low + length + slack)).toBe(true);
        expect(ticks.length).toBeGreaterThanOrEqual(Math.floor(count / 2.5));
        expect(ticks.length).toBeLessThanOrEqual(2 * count + 1);
      }),
    );
  });
});

describe('axisDecimals', () => {
  it('shows two digits more than the leading one of the length', () => {
    expect(axisDecimals({ low: 1, high: 5 })).toBe(2);
    expect(axisDecimals({ low: 0, high: 0.4 })).toBe(3);
    expect(axisDecimals({ low: 0, high: 400 })).toBe(0);
    expect(axisDecimals({ low: 0, high: 40 })).toBe(1);
  });
});

describe('paddedDomain', () => {
  it('leaves room at both ends and is never empty', () => {
    expect(paddedDomain([1, 3], 0.1)).toEqual({ low: 0.8, high: 3.2 });
    expect(paddedDomain([0], 0.1)).toEqual({ low: -0.5, high: 0.5 });
    expect(paddedDomain([200], 0)).toEqual({ low: 180, high: 220 });
  });

  it('takes more values than an argument list can hold', () => {
    expect(
      paddedDomain(
        Array.from({ length: 300_000 }, (_, at) => at),
        0,
      ),
    ).toEqual({ low: 0, high: 299_999 });
  });
});
