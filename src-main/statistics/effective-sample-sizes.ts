import type { Caveat } from '../contract/primitives.ts';
import type { EffectiveSampleSizeInput, EffectiveSampleSizeValue } from '../contract/series-tests.ts';
import { NumericError, errorSentence } from '../errors.ts';
import { autocorrelations } from './autocorrelations.ts';
import {
  effectiveSampleSize,
  effectiveSampleSizeNychka2000,
  effectiveSampleSizeOfMean,
  effectiveSampleSizeToLag,
} from './effective-sample-size.ts';
import { finiteNumber } from './finite-values.ts';
import { varyingValues } from './varying-values.ts';
import { gapsClosedUp } from './year-steps.ts';

/**
 * The effective sample size of a series under each of its named definitions: they answer different questions and can
 * differ by a factor, so that the figure means little without its name.
 *
 * Model    the autocorrelations r_k are demeaned, with the divisor of all values; r = r_1
 * Assumes  values in order of time, equally spaced
 *
 * @param values  [nObs ≥ 3] finite, not all equal: the residuals of a fit, or a series without trend
 * @param lags    1 … nObs − 1: how far back the definition without a model looks
 * @returns  null under a definition that has no answer here, with the caveat no-effective-sample-size; gaps-closed-up
 * @throws   InputError too-few-values, not-finite, out-of-range; NumericError constant
 *
 * Checked  test/reference/statistics/effective-sample-size.test.ts (B: R, through the single definitions)
 */
export function effectiveSampleSizes({ values, lags, years }: EffectiveSampleSizeInput): EffectiveSampleSizeValue {
  const caller = 'effectiveSampleSizes';
  const nObs = varyingValues(caller, 'values', values, { atLeast: 3 }).length;
  const hint = 'Take fewer lags or a longer series.';
  finiteNumber(caller, 'lags', lags, { isWhole: true, atLeast: 1, atMost: nObs - 1, hint });
  const closedUp = gapsClosedUp(caller, years, nObs, 'Effective sample sizes');
  const found = autocorrelations(values, [...values.keys()], lags);
  const [lag1 = NaN] = found;
  const caveats: Caveat[] = [];
  const orNull = (compute: () => number): number | null => {
    try {
      return compute();
    } catch (error) {
      if (!(error instanceof NumericError)) throw error;
      caveats.push({ code: 'no-effective-sample-size', detail: errorSentence(error.fields) });
      return null;
    }
  };
  return {
    nObs,
    lag1,
    santer2000: effectiveSampleSize(nObs, lag1),
    ar1Mean: effectiveSampleSizeOfMean(nObs, lag1),
    bayleyHammersley1946: orNull(() => effectiveSampleSizeToLag(nObs, found)),
    nychka2000: orNull(() => effectiveSampleSizeNychka2000(nObs, lag1)),
    caveats: [...caveats, ...closedUp],
  };
}
