import { InputError } from '../../errors.ts';
import { finiteValues } from '../../statistics/finite-values.ts';
import type { GasConcentrations } from './gas-forcing.ts';

export type Gas = keyof GasConcentrations;

interface GasUnit {
  name: string;
  unit: string;
  /** Beyond these the number is hardly in this unit: no record of the last half billion years and no scenario has it. */
  low: number;
  high: number;
  whenLow: string;
  whenHigh: string;
}

/** How a gas is named in sentences, and between which values a number can be in its unit. */
export const gasUnits: Readonly<Record<Gas, GasUnit>> = {
  co2Ppm: {
    name: 'CO2',
    unit: 'ppm',
    low: 50,
    high: 5000,
    whenLow: 'It looks like a share, per cent or a pressure: multiply a share by 1 000 000, per cent by 10 000.',
    whenHigh: 'It looks like ppb: divide by 1000.',
  },
  ch4Ppb: {
    name: 'CH4',
    unit: 'ppb',
    low: 50,
    high: 50_000,
    whenLow: 'It looks like ppm: multiply by 1000.',
    whenHigh: 'It looks like ppt: divide by 1000.',
  },
  n2oPpb: {
    name: 'N2O',
    unit: 'ppb',
    low: 50,
    high: 5000,
    whenLow: 'It looks like ppm: multiply by 1000.',
    whenHigh: 'It looks like ppt: divide by 1000.',
  },
};

/**
 * The door for concentrations of one gas: finite, positive, as many as asked, and of a size that its unit can have.
 *
 * @param nRows  length of the answer; a single number stands for every row
 * @throws  InputError wrong-length, not-finite, too-large, not-positive, suspected-unit
 */
export function gasValues(name: string, gas: Gas, given: number | readonly number[], nRows: number): Float64Array {
  const isOne = typeof given === 'number';
  const values = finiteValues('forcing', name, isOne ? [given] : given, {
    length: isOne ? 1 : nRows,
    sign: 'positive',
  });
  const { name: gasName, unit, low, high, whenLow, whenHigh } = gasUnits[gas];
  const at = values.findIndex((value) => value < low || value > high);
  const offending = values[at];
  if (offending !== undefined) {
    throw new InputError({
      code: 'suspected-unit',
      where: `forcing, ${name}${isOne ? '' : `[${at}]`}`,
      expected: `${gasName} in ${unit}, between ${low} and ${high}`,
      received: String(offending),
      hint: offending < low ? whenLow : whenHigh,
    });
  }
  return isOne ? new Float64Array(nRows).fill(given) : values;
}
