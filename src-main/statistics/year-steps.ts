import type { Caveat } from '../contract/primitives.ts';
import { InputError } from '../errors.ts';
import { finiteNumber, finiteValues } from './finite-values.ts';

/**
 * Calendar distance of each row from the one before, so that a gap is not taken for one step.
 *
 * @param years  [nObs] whole, strictly increasing; undefined when the caller knows the rows to be consecutive
 * @returns  [nObs] 1 for the first row and for consecutive years
 * @throws   InputError wrong-length, not-finite, out-of-range, unordered-years
 *
 * Checked  test/unit/statistics/year-steps.test.ts (C: by hand)
 */
export function yearSteps(caller: string, years: ArrayLike<number> | undefined, nObs: number): Float64Array {
  const steps = new Float64Array(nObs).fill(1);
  if (!years) return steps;
  const checked = finiteValues(caller, 'years', years, { length: nObs });
  checked.forEach((year, t) => {
    finiteNumber(caller, `years[${t}]`, year, { isWhole: true });
    if (t === 0) return;
    const step = year - checked[t - 1]!;
    steps[t] = step;
    if (step > 0) return;
    throw new InputError({
      code: 'unordered-years',
      where: `${caller}, years[${t}]`,
      expected: `a year after ${checked[t - 1]!}`,
      received: String(year),
      hint: 'Rows must be in order of time, one for each year.',
    });
  });
  return steps;
}

/**
 * What must stand beside a figure that takes the rows on either side of a gap for neighbours.
 *
 * @param figures  whose figures do so, in words: the subject of a sentence
 * @returns  caveat gaps-closed-up, or none
 * @throws   as `yearSteps`
 */
export function gapsClosedUp(
  caller: string,
  years: ArrayLike<number> | undefined,
  nObs: number,
  figures: string,
): Caveat[] {
  const missing = missingYears(caller, years, nObs);
  if (missing === null) return [];
  return [
    { code: 'gaps-closed-up', detail: `${missing} ${figures} take the years on either side of a gap for neighbours.` },
  ];
}

/**
 * How many years are missing between the first row and the last, as a sentence; null for none.
 *
 * @throws   as `yearSteps`
 */
export function missingYears(caller: string, years: ArrayLike<number> | undefined, nObs: number): string | null {
  const steps = yearSteps(caller, years, nObs);
  const nGaps = steps.filter((step) => step > 1).length;
  if (nGaps === 0) return null;
  const nMissing = steps.reduce((total, step) => total + step - 1, 0);
  return `${nMissing} ${nMissing === 1 ? 'year is' : 'years are'} missing in ${nGaps} ${nGaps === 1 ? 'gap' : 'gaps'}.`;
}
