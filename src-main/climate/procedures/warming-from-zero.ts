import type { SeriesData } from '../../contract/series.ts';
import { InputError } from '../../errors.ts';
import { checkUnit } from '../../quantities/check-unit.ts';

/**
 * The factor that turns a warming into K, for computations in which the zero of the series counts: an absolute
 * temperature will not do there.
 *
 * @throws   InputError as `checkUnit`; `absolute-temperature`
 *
 * Checked   test/unit/climate/procedures/warming-from-zero.test.ts (C: °F by hand; the refusals)
 */
export function warmingFromZero(series: SeriesData): number {
  const kPerUnit = checkUnit(series, 'K');
  if (series.quantity === 'temperature-anomaly') return kPerUnit;
  throw new InputError({
    code: 'absolute-temperature',
    where: `series ${series.name}`,
    expected: 'a warming: the difference from the climate before the change',
    received: 'temperatures',
    hint: 'Subtract the mean of the years before the change, or of the control run, and import the difference.',
  });
}
