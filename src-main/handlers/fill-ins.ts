import type { Claim } from '../contract/claim.ts';
import type { EstimatorComparison } from '../contract/estimator-comparison.ts';
import type { AssumptionsAnswer, ClaimSweep, Recomputation } from '../contract/result.ts';
import { decimalsFor, formatInterval, formatNumber, formatWithUncertainty } from '../quantities/notation.ts';

interface Answers {
  recomputation: Recomputation | null;
  assumptions: AssumptionsAnswer | null;
  sweep: ClaimSweep | null;
  estimators: EstimatorComparison | null;
}

/** Figures that the words of a finding can name in braces. Each carries its unit. */
export function fillIns(
  { statement }: Claim,
  { recomputation, assumptions, sweep, estimators }: Answers,
): Record<string, string> {
  const figures: Record<string, string> = { stated: `${statement.value} ${statement.unit}` };
  // All numbers in the claim's unit show as many digits as the recomputed one can.
  const decimals = recomputation?.standardError ? decimalsFor(recomputation.standardError) : 2;
  if (recomputation) {
    const { value, standardError, interval, unit, fit } = recomputation;
    figures['recomputed'] = formatWithUncertainty(value, standardError, unit);
    if (interval) figures['recomputed-interval'] = formatInterval(interval, unit);
    if (fit) {
      const { diagnostics, window, slopes, intercept } = fit;
      figures['years'] = `${window.start}–${window.end}`;
      figures['r-squared-centred'] = formatNumber(diagnostics.rSquaredCentred, { decimals: 2 });
      figures['r-squared-uncentred'] = formatNumber(diagnostics.rSquaredUncentred, { decimals: 2 });
      figures['durbin-watson'] = formatNumber(diagnostics.durbinWatson, { decimals: 2 });
      figures['effective-years'] = formatNumber(diagnostics.effectiveSampleSize, { decimals: 0 });
      if (slopes[0]) figures['slope'] = formatWithUncertainty(slopes[0].value, slopes[0].standardError, '');
      if (intercept) figures['intercept'] = formatWithUncertainty(intercept.value, intercept.standardError, 'K');
    }
  }
  for (const { id, alternative } of assumptions?.outcomes ?? []) {
    if (!alternative) continue;
    const range = alternative.interval ? ` (${formatInterval(alternative.interval, '')})` : '';
    figures[id] = `${formatNumber(alternative.value, decimals)} ${alternative.unit}${range}`;
  }
  const last = assumptions?.ladder?.rungs.at(-1);
  if (last && assumptions?.ladder) {
    figures['on-this-footing'] =
      `${formatNumber(last.value, decimals)} ${assumptions.ladder.unit} (${formatInterval(last.interval90, '')})`;
  }
  if (sweep) {
    figures['windows-range'] =
      `${formatNumber(sweep.valueQuantiles.min, decimals)} to ${formatNumber(sweep.valueQuantiles.max, decimals)} ${sweep.unit}`;
  }
  if (estimators) {
    const numbers = estimators.estimates.map(({ value }) => value);
    figures['estimators-range'] =
      `${formatNumber(Math.min(...numbers), decimals)} to ${formatNumber(Math.max(...numbers), decimals)} ${estimators.unit}`;
  }
  return figures;
}
