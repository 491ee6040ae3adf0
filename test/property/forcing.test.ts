import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { forcingFormulas } from '../../src-main/climate/forcing/forcing-formulas.ts';
import { forcing } from '../../src-main/climate/forcing/forcing.ts';
import { forcingFormula } from '../../src-main/contract/forcing.ts';
import { expectClose } from '../helpers/close.ts';

// Level D, inside the range of the line-by-line results.

const options = { seed: 20_260_102, numRuns: 200 };
const rounding = { rel: 1e-12, abs: 1e-12, why: 'rounding of a difference of square roots' };
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const gases = fc.record({ co2Ppm: between(180, 2000), ch4Ppb: between(340, 3500), n2oPpb: between(200, 525) });
const gas = fc.constantFrom('co2', 'ch4', 'n2o');
const keyOf = { co2: 'co2Ppm', ch4: 'ch4Ppb', n2o: 'n2oPpb' } as const;

describe.each(forcingFormula.options)('%s', (name) => {
  const formula = forcingFormulas[name];

  it('is zero where a gas is at its reference, whatever the others do', () => {
    fc.assert(
      fc.property(gases, gases, gas, (now, reference, one) => {
        const key = keyOf[one];
        expect(Math.abs(formula({ ...now, [key]: reference[key] }, reference)[`${one}Wm2`])).toBe(0);
      }),
      options,
    );
  });

  it('rises with a gas', () => {
    fc.assert(
      fc.property(gases, gases, gas, between(1.0001, 1.5), (now, reference, one, ratio) => {
        const more = formula({ ...now, [keyOf[one]]: now[keyOf[one]] * ratio }, reference);
        expect(more[`${one}Wm2`]).toBeGreaterThan(formula(now, reference)[`${one}Wm2`]);
      }),
      options,
    );
  });

  it('falls with what overlaps: more N2O leaves less to CO2 and CH4, or the same', () => {
    fc.assert(
      fc.property(gases, gases, between(1.001, 1.5), (now, reference, ratio) => {
        // The overlap counts for a gas that has risen.
        const risen = { ...now, co2Ppm: 1.5 * reference.co2Ppm, ch4Ppb: 1.5 * reference.ch4Ppb };
        const [less, more] = [risen, { ...risen, n2oPpb: risen.n2oPpb * ratio }].map((one) => formula(one, reference));
        expect(more!.co2Wm2).toBeLessThanOrEqual(less!.co2Wm2);
        expect(more!.ch4Wm2).toBeLessThanOrEqual(less!.ch4Wm2);
      }),
      options,
    );
  });

  it('adds up, row by row as in a series', () => {
    fc.assert(
      fc.property(fc.array(gases, { minLength: 1, maxLength: 8 }), gases, (rows, reference) => {
        const column = (key: keyof (typeof rows)[number]) => rows.map((row) => row[key]);
        const { totalWm2 } = forcing({
          formula: name,
          co2Ppm: column('co2Ppm'),
          co2RefPpm: reference.co2Ppm,
          ch4Ppb: column('ch4Ppb'),
          ch4RefPpb: reference.ch4Ppb,
          n2oPpb: column('n2oPpb'),
          n2oRefPpb: reference.n2oPpb,
        });
        const sums = rows.map((row) => {
          const { co2Wm2, ch4Wm2, n2oWm2 } = formula(row, reference);
          return co2Wm2 + ch4Wm2 + n2oWm2;
        });
        expect(totalWm2).toEqual(sums);
      }),
      options,
    );
  });
});

it('etminan2016 changes only its sign when now and reference are exchanged', () => {
  fc.assert(
    fc.property(gases, gases, (now, reference) => {
      const [there, back] = [forcingFormulas.etminan2016(now, reference), forcingFormulas.etminan2016(reference, now)];
      expectClose({ ...back }, { co2Wm2: -there.co2Wm2, ch4Wm2: -there.ch4Wm2, n2oWm2: -there.n2oWm2 }, rounding);
    }),
    options,
  );
});

it.each(['ipcc1990', 'myhre1998'] as const)('%s forces CO2 by ratios: steps add up to the whole', (name) => {
  fc.assert(
    fc.property(gases, between(180, 2000), between(180, 2000), (from, half, end) => {
      const step = (a: number, b: number) =>
        forcingFormulas[name]({ ...from, co2Ppm: b }, { ...from, co2Ppm: a }).co2Wm2;
      expectClose(step(from.co2Ppm, half) + step(half, end), step(from.co2Ppm, end), rounding);
    }),
    options,
  );
});
