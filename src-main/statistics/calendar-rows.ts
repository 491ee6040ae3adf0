import { yearSteps } from './year-steps.ts';

/**
 * Rows put in their years, with zero in the years that have none: what is lagged by j rows is then j years away, and a
 * missing year adds nothing to any product. This is how an amplitude-modulated series counts a gap.
 *
 * @param columns  nColumns × [nObs]
 * @param years    [nObs] whole, increasing; undefined when the caller knows the rows to be consecutive
 * @returns  nColumns × [last year − first year + 1]; the given columns where no year is missing
 * @throws   as `yearSteps`
 *
 * Source   Parzen 1963, Sankhyā A 25, 383–392 (amplitude modulation; from memory)
 * Checked  test/unit/statistics/calendar-rows.test.ts (C: by hand)
 */
export function calendarRows(
  caller: string,
  columns: readonly Float64Array[],
  years: ArrayLike<number> | undefined,
): readonly Float64Array[] {
  const nObs = columns[0]?.length ?? 0;
  const steps = yearSteps(caller, years, nObs);
  const nYears = steps.reduce((total, step) => total + step, 0);
  if (nYears === nObs) return columns;
  return columns.map((column) => {
    const onCalendar = new Float64Array(nYears);
    let at = -1;
    column.forEach((value, row) => {
      at += steps[row]!;
      onCalendar[at] = value;
    });
    return onCalendar;
  });
}
