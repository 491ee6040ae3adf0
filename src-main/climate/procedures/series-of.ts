import type { ClaimComputation } from '../../contract/compute.ts';
import type { SeriesData } from '../../contract/series.ts';
import { InputError } from '../../errors.ts';

/**
 * A series that a procedure cannot do without.
 *
 * @throws InputError `series-missing`
 */
export function seriesOf(
  computation: ClaimComputation,
  role: keyof ClaimComputation['series'],
  described: string,
): SeriesData {
  const series = computation.series[role];
  if (series) return series;
  throw new InputError({
    code: 'series-missing',
    where: `procedure ${computation.procedure.kind}`,
    expected: described,
    received: 'none',
    hint: 'Choose a series for it in the procedure.',
  });
}
