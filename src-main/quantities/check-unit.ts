import type { SeriesData, SeriesQuantity } from '../contract/series.ts';
import { InputError } from '../errors.ts';

/** Fahrenheit degrees in one kelvin: exact, for differences. */
export const fahrenheitPerK = 1.8;

/** The unit in which each kind of number is computed. */
export type ComputingUnit = 'K' | 'ppm' | 'W/m²' | 'W/m² of imbalance';

interface UnitRule {
  quantities: readonly SeriesQuantity[];
  described: string;
  /** Accepted spellings, normalised, with what turns a difference in that unit into the computing unit. */
  factors: Readonly<Record<string, number>>;
}

const fluxes = { 'w/m2': 1, wm2: 1, 'w/m^2': 1, 'wm^-2': 1, 'mw/m2': 0.001, mwm2: 0.001 };

const rules: Record<ComputingUnit, UnitRule> = {
  K: {
    quantities: ['temperature-anomaly', 'temperature'],
    described: 'a temperature series in K, °C or °F',
    factors: {
      k: 1,
      kelvin: 1,
      '°c': 1,
      c: 1,
      degc: 1,
      degreesc: 1,
      celsius: 1,
      degcelsius: 1,
      degreescelsius: 1,
      '0.01°c': 0.01,
      '0.01k': 0.01,
      mk: 0.001,
      '°f': 1 / fahrenheitPerK,
      f: 1 / fahrenheitPerK,
      degf: 1 / fahrenheitPerK,
      degreesf: 1 / fahrenheitPerK,
      fahrenheit: 1 / fahrenheitPerK,
      degfahrenheit: 1 / fahrenheitPerK,
      degreesfahrenheit: 1 / fahrenheitPerK,
    },
  },
  ppm: {
    quantities: ['co2'],
    described: 'a CO2 series in ppm',
    factors: {
      ppm: 1,
      ppmv: 1,
      'µmol/mol': 1,
      'umol/mol': 1,
      µmolmol1: 1,
      umolmol1: 1,
      'micromol/mol': 1,
      micromolmol1: 1,
      ppb: 0.001,
      ppbv: 0.001,
    },
  },
  'W/m²': {
    quantities: ['forcing'],
    described: 'a forcing series in W/m²',
    factors: fluxes,
  },
  // Readers know no kind of their own for it.
  'W/m² of imbalance': {
    quantities: ['forcing', 'other'],
    described: 'a series of the energy imbalance in W/m²',
    factors: fluxes,
  },
};

/**
 * Checks that a series is of the quantity and unit that a computation needs, and returns the factor that turns its
 * values, as differences, into that unit. Offsets between temperature scales (0 °C, 32 °F) do not matter here: every
 * computation on temperatures uses differences.
 *
 * @throws InputError `wrong-quantity` or `unknown-unit`, naming the series
 */
export function checkUnit(series: Pick<SeriesData, 'name' | 'quantity' | 'unit'>, wanted: ComputingUnit): number {
  const { quantities, described, factors } = rules[wanted];
  const where = `series ${series.name}`;
  if (!quantities.includes(series.quantity)) {
    throw new InputError({
      code: 'wrong-quantity',
      where,
      expected: described,
      received: `a series of quantity “${series.quantity}”`,
      hint: 'Choose another series, or correct the quantity of this one.',
    });
  }
  const factor = Object.hasOwn(factors, normalised(series.unit)) ? factors[normalised(series.unit)] : undefined;
  if (factor === undefined) {
    throw new InputError({
      code: 'unknown-unit',
      where,
      expected: described,
      received: series.unit.trim() === '' ? 'a series without a unit' : `the unit “${series.unit}”`,
      hint: 'State the unit of the series.',
    });
  }
  return factor;
}

/** One spelling for "W m⁻²", "W m-2", "W/m²", "deg C": lower case, no blanks, no superscripts, no signs of powers. */
function normalised(unit: string): string {
  return unit
    .normalize('NFC')
    .replaceAll('\u03bc', 'µ')
    .replaceAll('²', '2')
    .replaceAll('⁻', '-')
    .replaceAll('¹', '1')
    .replaceAll('−', '-')
    .replaceAll('º', '°')
    .toLowerCase()
    .replaceAll(/(?<=[a-z])-(?=\d)/g, '')
    .replaceAll(/[\s_·*().]+(?!\d)/g, '');
}
