import { alignForLogRegression } from '../climate/procedures/align-for-log-regression.ts';
import { alignWindow } from '../climate/procedures/align-window.ts';
import { recompute } from '../climate/procedures/recompute.ts';
import { seriesOf } from '../climate/procedures/series-of.ts';
import { slopeConversion } from '../climate/procedures/slope-conversion.ts';
import type { ClaimComputation, ClaimSweepRequest, WindowSweepRequest } from '../contract/compute.ts';
import type { ClaimSweep } from '../contract/result.ts';
import { InputError } from '../errors.ts';
import { checkUnit } from '../quantities/check-unit.ts';
import { statedValue } from '../quantities/stated-number.ts';
import { spreadOf, windowSweep } from './window-sweep.ts';

type SweptRows = Omit<WindowSweepRequest, 'minYears'>;

/** Shorter windows say more about single years than about the record; left out unless the reviewer says otherwise. */
export const defaultMinYears = 20;

/**
 * The window sweep of a claim: its own procedure over every start and end year that its series share, whatever window
 * the source chose, and where the number of that window stands among all.
 *
 * Model    number = slope × factor; the anchor is taken anew in each window, as the procedure takes it in its own
 *
 * @param request  the claim's computation, and the fewest years that make a window
 * @returns  as `windowSweep`; further the numbers' quantiles in the claim's unit. `stated.percentile` is the per cent of
 *           windows whose number is at or below that of the stated window; `shareAtOrBelowStated` the share at or below
 *           the number as printed
 * @throws   InputError `no-window` for a procedure without one, or a shortest window longer than the record;
 *           `anchor-too-long`, `lag-too-long` for one that the shortest window cannot hold; as `recompute` and `windowSweep`
 *
 * Checked   test/unit/robustness/claim-sweep.test.ts (C: against the recomputation of single windows)
 */
export function claimSweep(request: ClaimSweepRequest, onProgress?: (shareDone: number) => void): ClaimSweep {
  const { minYears, ...computation } = request;
  const { statement } = computation;
  const { rows, factor } = sweptRecord(computation);
  checkWindows(rows, minYears);
  const recomputed = recompute(computation);
  const window = recomputed.fit?.window ?? { start: NaN, end: NaN };
  const sweep = windowSweep({ ...rows, minYears }, onProgress);
  const numbers = sweep.windows.map(({ slope }) => slope * factor);
  // The sweep's own figure for the stated window, where there is one, so that rounding cannot put it below itself.
  const own = sweep.windows.findIndex(({ start, end }) => start === window.start && end === window.end);
  const value = numbers[own] ?? recomputed.value;
  const stated = statedValue(statement.value);
  return {
    ...sweep,
    factor,
    unit: recomputed.unit,
    minYears,
    stated: { window, value: recomputed.value, percentile: 100 * shareAtOrBelow(numbers, value) },
    valueQuantiles: spreadOf(numbers),
    shareAtOrBelowStated: shareAtOrBelow(numbers, stated),
  };
}

/** What `windowSweep` would refuse in the names of its fields, in the words of a claim. */
function checkWindows({ years, anchor, covariance }: SweptRows, minYears: number): void {
  const refuse = (code: string, where: string, expected: string, received: number, hint: string): never => {
    throw new InputError({ code, where: `window sweep, ${where}`, expected, received: String(received), hint });
  };
  if (minYears > years.length) {
    const expected = `at most the ${years.length} years that all series have`;
    refuse('no-window', 'shortest window', expected, minYears, 'Choose a shorter window.');
  }
  if (anchor.kind === 'mean-of-first' && anchor.years > minYears) {
    const expected = `no more years than the shortest window has, ${minYears}`;
    refuse('anchor-too-long', 'years that the anchor is the mean of', expected, anchor.years, 'Choose longer windows.');
  }
  if (covariance?.kind === 'newey-west' && covariance.lag >= minYears) {
    const expected = `a lag below the years of the shortest window, ${minYears}`;
    refuse('lag-too-long', 'lag of the Newey–West errors', expected, covariance.lag, 'Choose longer windows.');
  }
}

function shareAtOrBelow(numbers: readonly number[], limit: number): number {
  return numbers.filter((number) => number <= limit).length / numbers.length;
}

/** All the years that the procedure could use, and what turns a slope on them into the claim's number. */
function sweptRecord(computation: ClaimComputation): { rows: SweptRows; factor: number } {
  const { procedure, statement } = computation;
  switch (procedure.kind) {
    case 'log-regression': {
      const { years, co2Ppm, temperatureK } = alignForLogRegression(computation, { ...procedure, window: null });
      const { anchor, intercept, covariance, conversion } = procedure;
      return {
        rows: { years, co2Ppm, y: temperatureK, anchor, intercept, covariance },
        factor: slopeConversion(conversion, statement.unit).factor,
      };
    }
    case 'trend': {
      const series = seriesOf(computation, 'seriesId', 'the series whose trend is taken');
      const kPerUnit = checkUnit(series, 'K');
      const { years, columns } = alignWindow([series], procedure.minMonths, null);
      const y = (columns[0] ?? []).map((value) => value * kPerUnit);
      const { covariance } = procedure;
      return {
        rows: { years, x: years, y, anchor: { kind: 'first-year' }, intercept: true, covariance },
        factor: procedure.per === 'decade' ? 10 : 1,
      };
    }
    default:
      throw new InputError({
        code: 'no-window',
        where: 'window sweep',
        expected: 'a procedure that fits a line to a record',
        received: 'one that works from a few figures',
        hint: 'Without a record there is no start and end year to sweep.',
      });
  }
}
