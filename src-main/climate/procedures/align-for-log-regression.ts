import type { LogRegressionProcedure } from '../../contract/procedure.ts';
import type { ClaimComputation } from '../../contract/compute.ts';
import type { Caveat, YearSpan } from '../../contract/primitives.ts';
import { InputError } from '../../errors.ts';
import type { LeftOutYear } from '../../quantities/annual-means.ts';
import { checkUnit } from '../../quantities/check-unit.ts';
import { formatYear } from '../../quantities/notation.ts';
import { alignWindow } from './align-window.ts';
import { seriesOf } from './series-of.ts';

/** Annual CO2 and temperature in the years that the regression uses, before anchoring. */
export interface LogRegressionSeries {
  window: YearSpan;
  years: number[];
  co2Ppm: number[];
  /** As an anomaly against the series' own baseline, in K. */
  temperatureK: number[];
  leftOut: LeftOutYear[];
  caveats: Caveat[];
}

/**
 * The two series of a log-regression as annual values on common years, in ppm and K.
 *
 * @throws InputError as {@link alignWindow} and `checkUnit`; `not-positive` for a CO2 value that has no
 *         logarithm; `constant-co2`
 */
export function alignForLogRegression(
  computation: ClaimComputation,
  procedure: LogRegressionProcedure,
): LogRegressionSeries {
  const co2 = seriesOf(computation, 'co2SeriesId', 'the CO2 series');
  const temperature = seriesOf(computation, 'temperatureSeriesId', 'the temperature series');
  const ppmPerUnit = checkUnit(co2, 'ppm');
  const kPerUnit = checkUnit(temperature, 'K');
  const { window, years, columns, leftOut, caveats } = alignWindow(
    [co2, temperature],
    procedure.minMonths,
    procedure.window,
  );
  const [co2Values = [], temperatureValues = []] = columns;
  const co2Ppm = co2Values.map((value) => value * ppmPerUnit);
  const row = co2Ppm.findIndex((value) => !(value > 0));
  if (row >= 0) {
    throw new InputError({
      code: 'not-positive',
      where: `series ${co2.name}, ${formatYear(years[row] ?? NaN)}`,
      expected: 'a CO2 concentration above 0 ppm',
      received: String(co2Ppm[row]),
      hint: 'A mark for missing values may have been read as a value: import the file again with that mark.',
    });
  }
  if (co2Ppm.length > 1 && co2Ppm.every((value) => value === co2Ppm[0])) {
    throw new InputError({
      code: 'constant-co2',
      where: `series ${co2.name}`,
      expected: 'CO2 that changes over the window',
      received: `${co2Ppm[0]} ppm in every year`,
      hint: 'Choose another CO2 series, or a longer window.',
    });
  }
  return { window, years, co2Ppm, temperatureK: temperatureValues.map((value) => value * kPerUnit), leftOut, caveats };
}
