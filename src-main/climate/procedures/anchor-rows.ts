import type { Anchor } from '../../contract/procedure.ts';
import type { YearSpan } from '../../contract/primitives.ts';
import type { AlignedRows } from '../../contract/result.ts';
import { InputError } from '../../errors.ts';
import { mean } from '../../statistics/summation.ts';

/** Annual CO2 and temperature, row by row. */
export interface AnnualRows {
  years: readonly number[];
  co2Ppm: readonly number[];
  temperatureK: readonly number[];
}

/** C0 and T0, and the years that they are taken from. */
export interface AnchorValues {
  co2Ppm: number;
  temperatureK: number;
  years: YearSpan;
}

/**
 * Counts CO2 and temperature from an anchor: x = ln(C/C0), y = T − T0. The anchor is the first row, or the plain means
 * of C and T over the first rows (as many rows as the anchor says, whether or not years are missing between them).
 *
 * @throws InputError `anchor-too-long` when there are fewer rows than the anchor averages
 */
export function anchorRows(
  { years, co2Ppm, temperatureK }: AnnualRows,
  anchor: Anchor,
): { rows: AlignedRows; anchorValues: AnchorValues } {
  const nAnchor = anchor.kind === 'first-year' ? 1 : anchor.years;
  const start = years[0];
  const end = years[nAnchor - 1];
  if (start === undefined || end === undefined) {
    throw new InputError({
      code: 'anchor-too-long',
      where: 'anchor',
      expected: `at least ${nAnchor} years to take the anchor from`,
      received: `${years.length}`,
      hint: 'Choose a shorter anchor or a longer window.',
    });
  }
  const anchorValues = {
    co2Ppm: mean(Float64Array.from(co2Ppm.slice(0, nAnchor))),
    temperatureK: mean(Float64Array.from(temperatureK.slice(0, nAnchor))),
    years: { start, end },
  };
  const rows = {
    years: [...years],
    co2Ppm: [...co2Ppm],
    temperatureK: [...temperatureK],
    logRatio: co2Ppm.map((value) => Math.log(value / anchorValues.co2Ppm)),
    warmingK: temperatureK.map((value) => value - anchorValues.temperatureK),
  };
  return { rows, anchorValues };
}
