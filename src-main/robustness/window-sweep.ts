import type { Anchor } from '../contract/procedure.ts';
import type { WindowSweepRequest } from '../contract/compute.ts';
import type { Caveat } from '../contract/primitives.ts';
import type { WindowSweep } from '../contract/result.ts';
import { InputError, NumericError } from '../errors.ts';
import { finiteNumber, finiteValues } from '../statistics/finite-values.ts';
import { growingSlope } from '../statistics/growing-slope.ts';
import { quantileOfSorted } from '../statistics/quantile.ts';
import { gapsClosedUp } from '../statistics/year-steps.ts';

type SweepWindow = WindowSweep['windows'][number];

/**
 * Window sweep: the slope of y on x, with its standard error, over every window of consecutive rows that holds at least
 * `minYears` years. It shows how far a number depends on where the record is made to start and end.
 *
 * Model    y − y0 = b (x − x0), through zero, or with a free intercept; (x0, y0) is the anchor of each window itself:
 *          its first year, or the mean of its first k years. With `co2Ppm` the predictor is x = ln(C/C0) with C0 the
 *          anchor's concentration (the mean is taken over ppm, before the logarithm). With `x` the predictor is what is
 *          given (a logarithm, a forcing, a year), and x0 is the mean of x itself. With an intercept the anchor does
 *          not change the slope
 * Assumes  rows in order of time; a year without data is skipped and does not end a window, so a window's `n` can be
 *          smaller than end − start + 1
 *
 * @param years     [nYears] strictly increasing
 * @param co2Ppm    [nYears] ppm, above 0; or x [nYears] in any unit
 * @param y         [nYears]
 * @param minYears  3 … nYears, at least the anchor's years, above the Newey–West lag
 * @returns  windows by start year, then end year; quantiles (type 7) of their slopes, in y per x.
 *           Caveat `windows-without-spread` counts windows in which x does not vary; `gaps-closed-up` says
 *           that Newey–West errors do not count the calendar
 * @throws   InputError wrong-length, not-finite, not-positive, unordered-years, out-of-range, no-window;
 *           NumericError no-spread when x varies in no window
 *
 * Source   least squares in closed form, from running sums (`growingSlope`); covariance as in statistics/newey-west.ts
 *          (Newey & West 1987), Bartlett weights, no prewhitening, factor n/(n − k) when `smallSample`
 * Checked  test/unit/robustness/window-sweep.test.ts (C: closed forms); test/reference/robustness (B: R's lm, each window)
 */
export function windowSweep(request: WindowSweepRequest, onProgress?: (shareDone: number) => void): WindowSweep {
  const { years, minYears, anchor, intercept, covariance = { kind: 'classical' } } = request;
  const record = checkedRecord(request);
  const nYears = years.length;
  const nWindows = ((nYears - minYears + 1) * (nYears - minYears + 2)) / 2;
  const windows: SweepWindow[] = [];
  const slopeFrom = growingSlope(record.x, record.y, { intercept, covariance });
  const anchorOf = anchorFinder(record, anchor);
  let nDone = 0;
  for (let first = 0; first + minYears <= nYears; first++) {
    const slopeTo = slopeFrom(first, anchorOf(first));
    for (let last = first + minYears - 1; last < nYears; last++) {
      const fit = slopeTo(last);
      if (fit) {
        const { slope, standardError } = fit;
        windows.push({ start: years[first]!, end: years[last]!, n: last - first + 1, slope, standardError });
      }
      nDone++;
    }
    onProgress?.(nDone / nWindows);
  }
  if (windows.length === 0) {
    throw new NumericError({
      code: 'no-spread',
      where: 'windowSweep, x',
      expected: 'a predictor that varies within the windows',
      received: `one value in each of ${nWindows} windows`,
      hint: 'A slope needs a predictor that varies: check that the right series was chosen.',
    });
  }
  const nLeftOut = nWindows - windows.length;
  return {
    windows,
    quantiles: spreadOf(windows.map(({ slope }) => slope)),
    caveats: [
      ...(nLeftOut === 0 ? [] : [withoutSpread(nLeftOut, nWindows)]),
      ...(covariance.kind === 'newey-west' ? gapsClosedUp('windowSweep', years, nYears, 'Newey–West errors') : []),
    ],
  };
}

function withoutSpread(nLeftOut: number, nWindows: number): Caveat {
  return {
    code: 'windows-without-spread',
    detail: `${nLeftOut} of ${nWindows} windows are left out: the predictor does not vary in them.`,
  };
}

/** Minimum, 5 %, median, 95 % and maximum (quantiles of type 7). */
export function spreadOf(values: readonly number[]): WindowSweep['quantiles'] {
  const sorted = new Float64Array(values).sort();
  const at = (probability: number) => quantileOfSorted(sorted, probability);
  return { min: at(0), q05: at(0.05), q50: at(0.5), q95: at(0.95), max: at(1) };
}

interface SweepRecord {
  /** The predictor; ln C when concentrations are given. */
  x: Float64Array;
  y: Float64Array;
  /** What the anchor of x is averaged over, and how that mean becomes x0. */
  anchored: { values: Float64Array; toX: (mean: number) => number };
}

function checkedRecord({ years, x, co2Ppm, y, minYears, anchor, covariance }: WindowSweepRequest): SweepRecord {
  const caller = 'windowSweep';
  const nYears = years.length;
  years.forEach((year, row) => {
    const before = years[row - 1];
    if (before === undefined || year > before) return;
    throw new InputError({
      code: 'unordered-years',
      where: `${caller}, years[${row}]`,
      expected: `a year after ${before}`,
      received: String(year),
      hint: 'Put the rows in order of time, each year once.',
    });
  });
  finiteNumber(caller, 'minYears', minYears, { isWhole: true, atLeast: 3 });
  if (minYears > nYears) {
    throw new InputError({
      code: 'no-window',
      where: `${caller}, minYears`,
      expected: `at most the ${nYears} years that have data`,
      received: String(minYears),
      hint: 'Choose a shorter window, or a longer record.',
    });
  }
  if (anchor.kind === 'mean-of-first') {
    finiteNumber(caller, 'anchor.years', anchor.years, { isWhole: true, atLeast: 1, atMost: minYears });
  }
  if (covariance?.kind === 'newey-west') {
    finiteNumber(caller, 'covariance.lag', covariance.lag, {
      isWhole: true,
      atLeast: 0,
      atMost: minYears - 1,
      hint: 'Choose a smaller lag or longer windows.',
    });
  }
  const checkedY = finiteValues(caller, 'y', y, { length: nYears });
  const given = co2Ppm
    ? finiteValues(caller, 'co2Ppm', co2Ppm, { length: nYears, sign: 'positive' })
    : finiteValues(caller, 'x', x ?? [], { length: nYears });
  const predictor = co2Ppm ? given.map(Math.log) : given;
  return {
    x: predictor,
    y: checkedY,
    anchored: { values: given, toX: co2Ppm ? Math.log : (mean) => mean },
  };
}

function anchorFinder({ y, anchored }: SweepRecord, anchor: Anchor): (first: number) => { x0: number; y0: number } {
  const nAnchor = anchor.kind === 'first-year' ? 1 : anchor.years;
  return (first) => {
    let xSum = 0;
    let ySum = 0;
    for (let row = first; row < first + nAnchor; row++) {
      xSum += anchored.values[row]!;
      ySum += y[row]!;
    }
    return { x0: anchored.toX(xSum / nAnchor), y0: ySum / nAnchor };
  };
}
