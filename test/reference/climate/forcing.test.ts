import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { ar6Adjustment } from '../../../src-main/climate/forcing/ar6-adjustment.ts';
import { bandOverlap } from '../../../src-main/climate/forcing/band-overlap.ts';
import { doublingForcing } from '../../../src-main/climate/forcing/doubling-forcing.ts';
import { etminan2016 } from '../../../src-main/climate/forcing/etminan2016.ts';
import { forcing } from '../../../src-main/climate/forcing/forcing.ts';
import { forcingFormulas } from '../../../src-main/climate/forcing/forcing-formulas.ts';
import { ipcc1990 } from '../../../src-main/climate/forcing/ipcc1990.ts';
import { meinshausen2020 } from '../../../src-main/climate/forcing/meinshausen2020.ts';
import { myhre1998 } from '../../../src-main/climate/forcing/myhre1998.ts';
import { forcingFormula, type ForcingFormula, type ForcingInput } from '../../../src-main/contract/forcing.ts';
import { expectClose, type Tolerance } from '../../helpers/close.ts';

const sixDecimals: Tolerance = { rel: 0, abs: 0.5000001e-6, why: 'half a unit of the last printed digit' };
const printed = (digits: number): Tolerance => ({
  rel: 0,
  abs: 0.5 * 10 ** -digits,
  why: 'half a unit of the last printed digit',
});
const rounding: Tolerance = { rel: 1e-14, abs: 0, why: 'rounding' };

interface Row {
  input: Record<Exclude<keyof ForcingInput, 'formula' | 'adjustment'>, number> & { formula: ForcingFormula };
  /** CO2, CH4, N2O, sum. */
  expected: readonly [number, number, number, number];
  /** CO2, CH4, N2O; of Meinshausen's formulas only. */
  effective: readonly number[];
}

/** Where it comes from is said at the head of the file. */
const table: Row[] = readFileSync(new URL('./forcing.csv', import.meta.url), 'utf8')
  .trim()
  .split('\n')
  .filter((line) => !line.startsWith('#'))
  .slice(1)
  .map((line) => {
    const [formula, ...cells] = line.split(',');
    const [co2RefPpm, ch4RefPpb, n2oRefPpb, co2Ppm, ch4Ppb, n2oPpb, co2, ch4, n2o, total, ...effective] = cells
      .filter((cell) => cell !== '')
      .map(Number) as [number, number, number, number, number, number, number, number, number, number, ...number[]];
    const concentrations = { co2RefPpm, ch4RefPpb, n2oRefPpb, co2Ppm, ch4Ppb, n2oPpb };
    return {
      input: { formula: forcingFormula.parse(formula), ...concentrations },
      expected: [co2, ch4, n2o, total],
      effective,
    };
  });
const rowsOf = (formula: ForcingFormula): Row[] => table.filter(({ input }) => input.formula === formula);

describe('a table computed elsewhere', () => {
  it('has 30 rows of each formula, with effective forcings for the one that AR6 adjusts', () => {
    expect(forcingFormula.options.map((formula) => rowsOf(formula).length)).toEqual([30, 30, 30, 30]);
    for (const { input, effective } of table)
      expect(effective.length).toBe(input.formula === 'meinshausen2020' ? 3 : 0);
  });

  it.each(forcingFormula.options)('%s gives every row to six decimals', (formula) => {
    for (const { input, expected, effective } of rowsOf(formula)) {
      const place = JSON.stringify(input);
      const { co2Wm2, ch4Wm2, n2oWm2, totalWm2 } = forcing(input);
      expectClose([co2Wm2, ch4Wm2, n2oWm2, totalWm2], expected, sixDecimals, place);
      if (effective.length === 0) continue;
      const adjusted = forcing({ ...input, adjustment: 'ar6' });
      expectClose([adjusted.co2Wm2, adjusted.ch4Wm2, adjusted.n2oWm2], effective, sixDecimals, `effective, ${place}`);
    }
  });

  it('is of series as of single numbers', () => {
    const rows = rowsOf('meinshausen2020');
    const column = (name: Exclude<keyof ForcingInput, 'formula' | 'adjustment'>): number[] =>
      rows.map(({ input }) => input[name]);
    const { co2Wm2, ch4Wm2, n2oWm2, totalWm2 } = forcing({
      formula: 'meinshausen2020',
      co2Ppm: column('co2Ppm'),
      co2RefPpm: column('co2RefPpm'),
      ch4Ppb: column('ch4Ppb'),
      ch4RefPpb: column('ch4RefPpb'),
      n2oPpb: column('n2oPpb'),
      n2oRefPpb: column('n2oRefPpb'),
    });
    const expected = [0, 1, 2, 3].map((place) => rows.map((row) => row.expected[place]!));
    expectClose([co2Wm2, ch4Wm2, n2oWm2, totalWm2], expected, sixDecimals);
  });
});

describe('printed forcings', () => {
  // Concentrations of 1750 and 2019: AR6, Annex III, from memory. Forcings: AR6 WG1 §7.3.2, read there.
  const year1750 = { co2Ppm: 278.3, ch4Ppb: 729.2, n2oPpb: 270.1 };
  const year2019 = { co2Ppm: 409.9, ch4Ppb: 1866.3, n2oPpb: 332.1 };

  it('AR6, 1750–2019, effective: CO2 2.16, CH4 0.54, N2O 0.21', () => {
    const { co2Wm2, ch4Wm2, n2oWm2 } = ar6Adjustment(meinshausen2020(year2019, year1750));
    expectClose([co2Wm2, ch4Wm2, n2oWm2], [2.16, 0.54, 0.21], printed(2));
  });

  it('AR6, a doubling from 278 ppm: 3.75 adjusted, 3.93 effective', () => {
    const reference = { co2Ppm: 278, ch4Ppb: 722, n2oPpb: 270 };
    expectClose(doublingForcing('meinshausen2020', 'none', reference), 3.75, printed(2));
    expectClose(doublingForcing('meinshausen2020', 'ar6', reference), 3.93, printed(2));
  });

  it('IPCC TAR, 1750–1998, with the formulas of Myhre et al. 1998: CO2 1.46, CH4 0.48, N2O 0.15', () => {
    // Concentrations and forcings: TAR, chapter 6, from memory.
    const from = { co2Ppm: 278, ch4Ppb: 700, n2oPpb: 270 };
    const { co2Wm2, ch4Wm2, n2oWm2 } = myhre1998({ co2Ppm: 365, ch4Ppb: 1745, n2oPpb: 314 }, from);
    expectClose([co2Wm2, ch4Wm2, n2oWm2], [1.46, 0.48, 0.15], printed(2));
  });

  it('Etminan et al. 2016, methane 1750–2011: 0.61 W/m²', () => {
    // The forcing: second-hand. Concentrations: AR5, from memory.
    const from = { co2Ppm: 278, ch4Ppb: 722, n2oPpb: 270 };
    const { ch4Wm2 } = etminan2016({ co2Ppm: 391, ch4Ppb: 1803, n2oPpb: 324 }, from);
    expectClose(ch4Wm2, 0.61, {
      rel: 0,
      abs: 0.01,
      why: 'one unit of the last digit: which N2O was used is not on record',
    });
  });

  it('Myhre et al. 1998, abstract: 15 % below the earlier IPCC value for CO2', () => {
    const share = myhre1998(year2019, year1750).co2Wm2 / ipcc1990(year2019, year1750).co2Wm2;
    expectClose(100 * (1 - share), 15, printed(0));
  });
});

describe('closed forms', () => {
  it.each([
    ['ipcc1990', 2, 6.3 * Math.LN2, 4.366827],
    ['myhre1998', 2, 5.35 * Math.LN2, 3.708337],
    ['myhre1998', 4, 5.35 * Math.log(4), 7.416675],
    ['myhre1998', 0.5, -5.35 * Math.LN2, -3.708337],
  ] as const)('%s, CO2 × %d', (formula, ratio, closed, inDigits) => {
    const { co2Wm2 } = forcing({ formula, co2Ppm: 280 * ratio, co2RefPpm: 280 });
    expectClose(co2Wm2, closed, rounding);
    expectClose(co2Wm2, inDigits, sixDecimals);
  });

  it('doublingForcing is the forcing of 2 C0 under each formula, and of C0 nothing', () => {
    for (const formula of forcingFormula.options) {
      const reference = { co2Ppm: 300, ch4Ppb: 900, n2oPpb: 290 };
      const expected = forcingFormulas[formula]({ ...reference, co2Ppm: 600 }, reference).co2Wm2;
      expect(doublingForcing(formula, 'none', reference)).toBe(expected);
    }
    const each = forcingFormula.options.map((formula) => doublingForcing(formula));
    expectClose(each, [4.366827, 3.708337, 3.800942, 3.746161], sixDecimals);
    expectClose(doublingForcing('meinshausen2020', 'ar6'), 3.933469, sixDecimals);
  });

  it('the overlap with 5.32e-15 in place of 5.31e-15 differs by less than 3e-6 W/m² in 2019', () => {
    const other = (m: number, n: number): number =>
      0.47 * Math.log(1 + 2.01e-5 * (m * n) ** 0.75 + 5.32e-15 * m * (m * n) ** 1.52);
    const [m, m0, n0] = [1866.3, 731.41, 273.87];
    const difference = Math.abs(other(m, n0) - other(m0, n0) - (bandOverlap(m, n0) - bandOverlap(m0, n0)));
    expect(difference).toBeGreaterThan(1e-7);
    expect(difference).toBeLessThan(3e-6);
  });
});
