import { describe, expect, it } from 'vitest';
import { forcing } from '../../../../src-main/climate/forcing/forcing.ts';
import { gasValues } from '../../../../src-main/climate/forcing/gas-values.ts';
import { rangeCaveats } from '../../../../src-main/climate/forcing/range-caveats.ts';
import type { ForcingInput } from '../../../../src-main/contract/forcing.ts';
import { InputError } from '../../../../src-main/errors.ts';

const co2: ForcingInput = { formula: 'myhre1998', co2Ppm: 420, co2RefPpm: 280 };
const all: ForcingInput = {
  ...co2,
  formula: 'meinshausen2020',
  ch4Ppb: 1900,
  ch4RefPpb: 730,
  n2oPpb: 336,
  n2oRefPpb: 270,
};
const codes = (input: ForcingInput): string[] => forcing(input).caveats.map(({ code }) => code);

function refusal(work: () => unknown): object {
  try {
    work();
  } catch (error) {
    if (error instanceof InputError) return error.fields;
    throw error;
  }
  throw new Error('nothing was refused');
}

describe('forcing', () => {
  it('gives numbers for numbers, and a value a row as soon as one concentration is a list', () => {
    expect(forcing(co2)).toEqual({
      co2Wm2: 5.35 * Math.log(1.5),
      totalWm2: 5.35 * Math.log(1.5),
      caveats: [],
    });
    const series = forcing({ ...all, co2Ppm: [280, 420], co2RefPpm: 280 });
    const single = forcing(all);
    expect(series.co2Wm2).toEqual([0, single.co2Wm2]);
    expect(series.ch4Wm2).toEqual([single.ch4Wm2, single.ch4Wm2]);
    expect(forcing({ ...co2, co2Ppm: [420] }).co2Wm2).toHaveLength(1);
    expect(forcing({ ...co2, co2RefPpm: [280, 420] }).totalWm2).toEqual([forcing(co2).co2Wm2, 0]);
  });

  it('adds up the gases that are given', () => {
    const { co2Wm2, ch4Wm2, n2oWm2, totalWm2 } = forcing(all);
    expect(totalWm2).toBe(Number(co2Wm2) + Number(ch4Wm2) + Number(n2oWm2));
    expect(Object.keys(forcing(co2))).toEqual(['co2Wm2', 'totalWm2', 'caveats']);
  });

  it('makes effective forcing of it only when asked', () => {
    const [adjusted, none, effective] = ([undefined, 'none', 'ar6'] as const).map((adjustment) =>
      forcing({ ...all, adjustment }),
    );
    expect(none).toEqual(adjusted);
    expect(effective?.co2Wm2).toBe(1.05 * Number(adjusted?.co2Wm2));
    expect(effective?.ch4Wm2).toBe(0.86 * Number(adjusted?.ch4Wm2));
    expect(effective?.n2oWm2).toBe(1.07 * Number(adjusted?.n2oWm2));
    expect(effective?.caveats).toEqual([]);
    expect(codes({ ...co2, adjustment: 'ar6' })).toEqual(['adjustment-of-other-formula']);
  });

  it('says where it holds a gas that overlaps and is not given', () => {
    expect(codes(co2)).toEqual([]);
    const { caveats } = forcing({ ...co2, formula: 'etminan2016' });
    expect(caveats).toEqual([
      { code: 'background-assumed', detail: expect.stringMatching(/N2O.*273\.87 ppb.*CO2\.$/) as string },
    ]);
    expect(forcing({ ...co2, ch4Ppb: 1900, ch4RefPpb: 730 }).caveats[0]?.detail).toMatch(/N2O.*with CH4\.$/);
    const withoutMethane = { ...co2, n2oPpb: 336, n2oRefPpb: 270 };
    expect(forcing(withoutMethane).caveats[0]?.detail).toMatch(/CH4.*731\.41 ppb.*with N2O\.$/);
    expect(codes(all)).toEqual([]);
  });

  it.each<[string, ForcingInput, object]>([
    ['no CO2', { ...co2, co2Ppm: 0 }, { code: 'not-positive', where: 'forcing, co2Ppm[0]' }],
    ['negative CO2', { ...co2, co2Ppm: [420, -1] }, { code: 'not-positive', where: 'forcing, co2Ppm[1]' }],
    ['a negative reference', { ...co2, co2RefPpm: -280 }, { code: 'not-positive', where: 'forcing, co2RefPpm[0]' }],
    ['NaN', { ...co2, co2Ppm: [420, NaN] }, { code: 'not-finite', where: 'forcing, co2Ppm[1]' }],
    ['lists of different lengths', { ...all, co2Ppm: [420, 421], ch4Ppb: [1900] }, { code: 'wrong-length' }],
    ['an empty list', { ...co2, co2Ppm: [] }, { code: 'too-few-values' }],
    ['methane without its reference', { ...co2, ch4Ppb: 1900 }, { code: 'unpaired-gas', where: 'forcing, ch4RefPpb' }],
    ['a reference without its gas', { ...co2, n2oRefPpb: 270 }, { code: 'unpaired-gas', where: 'forcing, n2oPpb' }],
    [
      'CO2 in ppb',
      { ...co2, co2Ppm: [420, 420_000] },
      {
        code: 'suspected-unit',
        where: 'forcing, co2Ppm[1]',
        received: '420000',
        hint: 'It looks like ppb: divide by 1000.',
      },
    ],
    ['CO2 as a share', { ...co2, co2RefPpm: 0.00028 }, { code: 'suspected-unit', where: 'forcing, co2RefPpm' }],
    [
      'methane in ppm',
      { ...all, ch4Ppb: 1.9 },
      { code: 'suspected-unit', where: 'forcing, ch4Ppb', hint: 'It looks like ppm: multiply by 1000.' },
    ],
    [
      'methane in ppt',
      { ...all, ch4Ppb: 1.9e6 },
      { code: 'suspected-unit', hint: 'It looks like ppt: divide by 1000.' },
    ],
    ['nitrous oxide in ppm', { ...all, n2oRefPpb: 0.27 }, { code: 'suspected-unit', where: 'forcing, n2oRefPpb' }],
  ])('refuses %s', (_, input, expected) => {
    expect(refusal(() => forcing(input))).toMatchObject(expected);
  });

  it('takes what is just inside the size that a unit can have', () => {
    expect(forcing({ ...co2, co2Ppm: 5000, co2RefPpm: 50 }).co2Wm2).toBeCloseTo(5.35 * Math.log(100), 12);
    expect(refusal(() => forcing({ ...co2, co2Ppm: 5000.1 }))).toMatchObject({ code: 'suspected-unit' });
    expect(refusal(() => forcing({ ...co2, co2Ppm: 49.9 }))).toMatchObject({ code: 'suspected-unit' });
  });
});

describe('gasValues', () => {
  it('lets one number stand for every row', () => {
    expect([...gasValues('co2RefPpm', 'co2Ppm', 280, 3)]).toEqual([280, 280, 280]);
  });
});

describe('rangeCaveats', () => {
  const of = (...values: number[]) => [Float64Array.from(values)];

  it('names the range, the value furthest outside, and how many there are', () => {
    const [caveat, ...rest] = rangeCaveats('etminan2016', { co2Ppm: of(280, 2100, 2300, 170) });
    expect(rest).toEqual([]);
    expect(caveat?.code).toBe('outside-formula-range');
    expect(caveat?.detail).toMatch(/^CO2 of 2300 ppm, the furthest of 3 such values, is outside 180–2000 ppm/);
  });

  it.each([
    ['etminan2016', { co2Ppm: of(180, 2000), ch4Ppb: of(340, 3500), n2oPpb: of(200, 525) }, 0],
    ['etminan2016', { co2Ppm: of(179), ch4Ppb: of(339), n2oPpb: of(199) }, 3],
    ['meinshausen2020', { co2Ppm: of(2001), ch4Ppb: of(3501), n2oPpb: of(526) }, 3],
    ['ipcc1990', { co2Ppm: of(1000), ch4Ppb: of(5000), n2oPpb: of(5000) }, 0],
    ['ipcc1990', { co2Ppm: of(1001) }, 1],
    ['myhre1998', { co2Ppm: of(1001), ch4Ppb: of(20_000) }, 1],
  ] as const)('%s, %o: %d', (formula, values, nCaveats) => {
    expect(rangeCaveats(formula, values)).toHaveLength(nCaveats);
  });

  it('counts references too, and no gas that is only assumed', () => {
    expect(codes({ ...all, ch4RefPpb: 300 })).toEqual(['outside-formula-range']);
    expect(codes({ ...co2, formula: 'etminan2016', co2Ppm: 2100 })).toEqual([
      'outside-formula-range',
      'background-assumed',
    ]);
  });
});
