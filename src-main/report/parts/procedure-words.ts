import type { Claim, SlopeCovariance } from '../../contract/claim.ts';
import type { Series } from '../../contract/series.ts';
import { formatYears } from '../../quantities/notation.ts';

/** A procedure in one paragraph: enough to run it again by hand. */
export function procedureWords({ procedure }: Claim, series: readonly Series[]): string {
  if (procedure === null) return 'No procedure has been set.';
  const name = (id: number) => series.find((one) => one.id === id)?.name ?? `series ${id}`;
  if (procedure.kind === 'ratio') {
    const { numerator, denominator } = procedure;
    return `${numerator.value} ${numerator.unit} divided by ${denominator.value} ${denominator.unit}, both as stated.`;
  }
  const years = procedure.window === null ? 'all years that can be used' : formatYears(procedure.window);
  const common = `${years}; annual means of monthly series need at least ${procedure.minMonths} of 12 months. ${covarianceWords(procedure.covariance)}`;
  if (procedure.kind === 'trend') {
    return `Least-squares line with intercept of ${name(procedure.seriesId)} on time, given per ${procedure.per}; ${common}`;
  }
  const anchor =
    procedure.anchor.kind === 'first-year'
      ? 'the values of the first year'
      : `the means over the first ${procedure.anchor.years} years`;
  const line = procedure.intercept ? 'with a free intercept' : 'through zero';
  const conversion =
    procedure.conversion === 'per-doubling' ? 'the slope times ln 2' : 'the slope itself, per e-folding';
  return `Least-squares line ${line} of T − T₀ (${name(procedure.temperatureSeriesId)}) on ln(C/C₀) (${name(procedure.co2SeriesId)}), C₀ and T₀ being ${anchor}; the number is ${conversion}; ${common}`;
}

function covarianceWords(covariance: SlopeCovariance): string {
  if (covariance.kind === 'classical') return 'Standard errors: classical, for independent errors of equal variance.';
  const sample = covariance.smallSample ? 'with' : 'without';
  return `Standard errors: Newey–West, lag ${covariance.lag}, Bartlett weights, ${sample} the small-sample factor.`;
}
