import { describe, expect, it } from 'vitest';
import {
  checkParameter,
  checkParameters,
  parameterCaveats,
  parameterNames,
} from '../../../../src-main/climate/two-layer/check-parameters.ts';
import { InputError } from '../../../../src-main/errors.ts';

const sets = { heatCapacity: [8, 7], deepHeatCapacity: [100], exchange: [0.7], feedback: [1.2], efficacy: [1.3] };
const codes = (changes: Partial<typeof sets>): string[] =>
  parameterCaveats({ ...sets, ...changes }).map(({ code }) => code);

describe('checkParameter', () => {
  it.each([
    ['heatCapacity', 0, 'out-of-range'],
    ['heatCapacity', 2.5e9, 'out-of-range'],
    ['deepHeatCapacity', -1, 'out-of-range'],
    ['exchange', -0.1, 'out-of-range'],
    ['exchange', NaN, 'out-of-range'],
    ['feedback', 0, 'no-restoring-feedback'],
    ['feedback', -1.16, 'no-restoring-feedback'],
    ['feedback', NaN, 'no-restoring-feedback'],
    ['feedback', Infinity, 'out-of-range'],
    ['efficacy', -0.5, 'out-of-range'],
    ['efficacy', 1001, 'out-of-range'],
  ] as const)('refuses %s of %d', (name, value, code) => {
    const refusal = () => checkParameter('twoLayer', name, value, 3);
    expect(refusal).toThrow(InputError);
    expect(refusal).toThrow(`twoLayer, ${name}[3]`);
    try {
      refusal();
    } catch (error) {
      expect(error).toMatchObject({ fields: { code, received: String(value) } });
    }
  });

  it('names the way out: the sign of the feedback, the unit of the heat capacity', () => {
    expect(() => checkParameter('twoLayer', 'feedback', -1.16)).toThrow('with its sign turned');
    expect(() => checkParameter('twoLayer', 'heatCapacity', 3e9)).toThrow('divide J m⁻² K⁻¹ by 3.156e7');
  });

  it('passes every name at plain values, and the limits without exchange and without efficacy', () => {
    expect(parameterNames.map((name) => checkParameter('twoLayer', name, 1))).toEqual([1, 1, 1, 1, 1]);
    expect(checkParameter('twoLayer', 'exchange', 0)).toBe(0);
    expect(checkParameter('twoLayer', 'efficacy', 0)).toBe(0);
  });
});

describe('checkParameters', () => {
  it('names the first of many that is refused, NaN included', () => {
    expect(() => checkParameters('test', 'exchange', Float64Array.of(0, 1, -1, -2))).toThrow('test, exchange[2]');
    expect(() => checkParameters('test', 'efficacy', Float64Array.of(1, NaN))).toThrow('test, efficacy[1]');
    checkParameters('test', 'feedback', Float64Array.of(1e-9, 1, 1e6));
  });
});

describe('parameterCaveats', () => {
  it('are silent within the published sets, ends included', () => {
    expect(codes({})).toEqual([]);
    // Lowest and highest C of the tables: GISS-E2-R and MIROC-ES2L.
    expect(codes({ heatCapacity: [4.7, 10.58828] })).toEqual([]);
  });

  it('name what lies outside, whichever member it is', () => {
    expect(codes({ heatCapacity: [8, 4.6] })).toEqual(['outside-published']);
    const caveats = parameterCaveats({ ...sets, feedback: [0.3] });
    expect(caveats[0]?.detail).toContain('67 published sets');
    expect(caveats[0]?.detail).toContain('feedback 0.581514 to 2.03');
  });

  it('say when there is no exchange, or no efficacy', () => {
    expect(codes({ exchange: [0] })).toEqual(['outside-published', 'no-exchange']);
    expect(codes({ efficacy: [0] })).toEqual(['outside-published', 'no-efficacy']);
  });
});
