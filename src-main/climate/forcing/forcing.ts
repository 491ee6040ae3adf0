import type { ForcingFormula, ForcingInput, ForcingValue } from '../../contract/forcing.ts';
import type { Caveat } from '../../contract/primitives.ts';
import { InputError } from '../../errors.ts';
import { ar6Adjustment } from './ar6-adjustment.ts';
import { forcingFormulas } from './forcing-formulas.ts';
import { gasUnits, gasValues, type Gas } from './gas-values.ts';
import { meinshausenBase } from './meinshausen2020.ts';
import { rangeCaveats } from './range-caveats.ts';

interface GasColumns {
  isGiven: boolean;
  now: Float64Array;
  reference: Float64Array;
}

/**
 * Radiative forcing of CO2, CH4 and N2O from their concentrations, with the overlap of their absorption bands, by one of
 * four published sets of formulas.
 *
 * Model    as in `ipcc1990`, `myhre1998`, `etminan2016`, `meinshausen2020`; total = sum over the gases that were given
 * Assumes  concentrations of the whole atmosphere (annual global means), not of one station in one month
 *
 * @param input  CO2 in ppm, CH4 and N2O in ppb, each with its reference; numbers, or arrays of one length. A gas that is not
 *               given is held at 731.41 ppb CH4 or 273.87 ppb N2O where another gas overlaps with it
 * @returns  W/m², downward positive: numbers when all concentrations are numbers, else one value for each row. Exactly 0
 *           where a gas is at its reference. Stratospherically adjusted; effective forcing with `adjustment: 'ar6'`.
 *           Caveats: outside-formula-range, background-assumed, adjustment-of-other-formula
 * @throws   InputError `unpaired-gas`, `wrong-length`, `not-finite`, `not-positive`, `suspected-unit`
 *
 * Differs   programs that scale to a chosen forcing of a doubling (3.71, say) give other digits than the formulas do
 * Source    see the formulas
 * Checked   test/reference/climate/forcing.test.ts (A: AR6's printed forcings; B: a table computed elsewhere)
 */
export function forcing(input: ForcingInput): ForcingValue {
  const { formula, adjustment = 'none' } = input;
  const columns = gasColumns(input);
  const { co2Ppm, ch4Ppb, n2oPpb } = columns;
  const nRows = co2Ppm.now.length;
  const co2Wm2 = new Array<number>(nRows);
  const ch4Wm2 = new Array<number>(nRows);
  const n2oWm2 = new Array<number>(nRows);
  const totalWm2 = new Array<number>(nRows);
  const at = (which: 'now' | 'reference', row: number) => ({
    co2Ppm: co2Ppm[which][row]!,
    ch4Ppb: ch4Ppb[which][row]!,
    n2oPpb: n2oPpb[which][row]!,
  });
  for (let row = 0; row < nRows; row++) {
    const adjusted = forcingFormulas[formula](at('now', row), at('reference', row));
    const gases = adjustment === 'ar6' ? ar6Adjustment(adjusted) : adjusted;
    co2Wm2[row] = gases.co2Wm2;
    ch4Wm2[row] = gases.ch4Wm2;
    n2oWm2[row] = gases.n2oWm2;
    // A gas that is not given stands at its reference and adds exactly 0.
    totalWm2[row] = gases.co2Wm2 + gases.ch4Wm2 + gases.n2oWm2;
  }
  const isSeries = Object.values(input).some(Array.isArray);
  const shaped = (values: number[]): number | number[] => (isSeries ? values : values[0]!);
  return {
    co2Wm2: shaped(co2Wm2),
    ...(ch4Ppb.isGiven ? { ch4Wm2: shaped(ch4Wm2) } : {}),
    ...(n2oPpb.isGiven ? { n2oWm2: shaped(n2oWm2) } : {}),
    totalWm2: shaped(totalWm2),
    caveats: [...givenRangeCaveats(formula, columns), ...assumptionCaveats(input)],
  };
}

function gasColumns(input: ForcingInput): Record<Gas, GasColumns> {
  const series = Object.values(input).find(Array.isArray);
  const nRows = series?.length ?? 1;
  const columns = (gas: Gas, referenceName: 'co2RefPpm' | 'ch4RefPpb' | 'n2oRefPpb'): GasColumns => {
    const now = input[gas];
    const reference = input[referenceName];
    if (now === undefined && reference === undefined) {
      const held = new Float64Array(nRows).fill(meinshausenBase[gas]);
      return { isGiven: false, now: held, reference: held };
    }
    if (now === undefined) throw unpaired(gas, referenceName);
    if (reference === undefined) throw unpaired(referenceName, gas);
    return {
      isGiven: true,
      now: gasValues(gas, gas, now, nRows),
      reference: gasValues(referenceName, gas, reference, nRows),
    };
  };
  return {
    co2Ppm: columns('co2Ppm', 'co2RefPpm'),
    ch4Ppb: columns('ch4Ppb', 'ch4RefPpb'),
    n2oPpb: columns('n2oPpb', 'n2oRefPpb'),
  };
}

function unpaired(missing: string, given: string): InputError {
  return new InputError({
    code: 'unpaired-gas',
    where: `forcing, ${missing}`,
    expected: `a concentration, since ${given} is given`,
    received: 'nothing',
    hint: 'Give both, equal to each other for a gas that does not change, or leave both out.',
  });
}

function givenRangeCaveats(formula: ForcingFormula, columns: Record<Gas, GasColumns>): Caveat[] {
  const given = Object.entries(columns).flatMap(([gas, { isGiven, now, reference }]) =>
    isGiven ? [[gas, [now, reference]] as const] : [],
  );
  return rangeCaveats(formula, Object.fromEntries(given));
}

function assumptionCaveats({ formula, adjustment, ch4Ppb, n2oPpb }: ForcingInput): Caveat[] {
  const caveats: Caveat[] = [];
  const hasCo2Overlap = formula === 'etminan2016' || formula === 'meinshausen2020';
  const held = (gas: 'ch4Ppb' | 'n2oPpb', where: string): Caveat => ({
    code: 'background-assumed',
    detail: `${gasUnits[gas].name} is not given; it is held at ${meinshausenBase[gas]} ppb, its level of about 1750 in Meinshausen et al. 2020, where it overlaps with ${where}.`,
  });
  if (n2oPpb === undefined && (hasCo2Overlap || ch4Ppb !== undefined)) {
    const overlapped = [hasCo2Overlap ? 'CO2' : '', ch4Ppb === undefined ? '' : 'CH4'].filter(Boolean).join(' and ');
    caveats.push(held('n2oPpb', overlapped));
  }
  if (ch4Ppb === undefined && n2oPpb !== undefined) caveats.push(held('ch4Ppb', 'N2O'));
  if (adjustment === 'ar6' && formula !== 'meinshausen2020') {
    caveats.push({
      code: 'adjustment-of-other-formula',
      detail: `AR6 assessed its adjustments for the formulas of Meinshausen et al. 2020; with ${formula} the product is no published forcing.`,
    });
  }
  return caveats;
}
