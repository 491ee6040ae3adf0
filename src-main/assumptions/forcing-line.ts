import { anchorRows } from '../climate/procedures/anchor-rows.ts';
import type { UncertainInput } from '../contract/uncertain-input.ts';
import type { ClaimComputation } from '../contract/compute.ts';
import type { AlignedRows, RegressionAnswer } from '../contract/result.ts';
import type { SeriesData } from '../contract/series.ts';
import { InputError } from '../errors.ts';
import { annualMeans } from '../quantities/annual-means.ts';
import { checkUnit } from '../quantities/check-unit.ts';
import { regression } from '../statistics/regression.ts';
import { mean } from '../statistics/summation.ts';
import { logClaimLine } from './claim-line.ts';
import type { TestContext } from './test-context.ts';

/** The claim's temperatures against total forcing, in the years that have one. */
export interface ForcingLine {
  /** The claim's rows in those years, anchored anew on the first of them. */
  rows: AlignedRows;
  /** Years of the claim's rows without a forcing. */
  yearsWithout: number[];
  /** From the anchor, W/m². */
  forcingWm2: number[];
  /** The same of CO2 alone, where the reviewer has given it for all these years. */
  co2ForcingWm2: number[] | null;
  /** b_F, K per W/m². */
  slope: number;
  slopeStandardError: number;
  regression: RegressionAnswer;
  /** F2x. */
  doublingWm2: UncertainInput;
}

/** What keeps a claim from being put on total forcing; null when nothing does. */
export function forcingMissing({ series, evidence }: ClaimComputation): { reason: string; wouldNeed: string } | null {
  if (!series.totalForcingSeriesId) {
    return {
      reason: 'No series of total forcing is given.',
      wouldNeed:
        'Import annual effective radiative forcing of all agents together (W/m²) and choose it as total forcing under Assumptions.',
    };
  }
  if (!evidence.doublingWm2 && !evidence.energyBudget) {
    return {
      reason: 'The forcing of a CO₂ doubling is not given, so a slope on forcing cannot be turned into K per doubling.',
      wouldNeed: 'Give it (W/m², with its range) under Assumptions, or within the energy budget.',
    };
  }
  return null;
}

/**
 * Line of warming on total effective forcing, over the rows and with the intercept rule of the claim.
 *
 * Model    y = [a +] b_F ΔF, y and ΔF from the claim's anchor rows; b_F in K per W/m²
 *
 * @throws  InputError `no-forcing`, `too-few-forcing-years`, and as `annualMeans`, `checkUnit`, `regression`
 */
export function forcingLine(context: TestContext, intercept: boolean): ForcingLine {
  const { computation } = context;
  const { evidence, series } = computation;
  const doublingWm2 = evidence.doublingWm2 ?? evidence.energyBudget?.doublingWm2;
  const missing = forcingMissing(computation);
  if (missing || !series.totalForcingSeriesId || !doublingWm2) {
    const { reason = '', wouldNeed = '' } = missing ?? {};
    throw new InputError({
      code: 'no-forcing',
      where: 'total forcing',
      expected: 'a forcing series and the forcing of a doubling',
      received: reason,
      hint: wouldNeed,
    });
  }
  const { rows: claimRows, procedure, serialCovariance } = logClaimLine(context);
  const total = annualForcing(series.totalForcingSeriesId, procedure.minMonths);
  const kept = claimRows.years.flatMap((year, row) => (total.has(year) ? [row] : []));
  const pick = (column: readonly number[]) => kept.map((row) => column[row] ?? NaN);
  const nAnchor = procedure.anchor.kind === 'first-year' ? 1 : procedure.anchor.years;
  if (kept.length < Math.max(nAnchor, 5)) {
    throw new InputError({
      code: 'too-few-forcing-years',
      where: `series ${series.totalForcingSeriesId.name}`,
      expected: `a forcing in at least ${Math.max(nAnchor, 5)} years of the record`,
      received: `${kept.length}`,
      hint: 'Choose a forcing series that covers the window.',
    });
  }
  const years = pick(claimRows.years);
  const { rows } = anchorRows(
    { years, co2Ppm: pick(claimRows.co2Ppm), temperatureK: pick(claimRows.temperatureK) },
    procedure.anchor,
  );
  const forcingWm2 = fromAnchor(total, years, nAnchor);
  const co2 = series.co2ForcingSeriesId && annualForcing(series.co2ForcingSeriesId, procedure.minMonths);
  const answer = regression({ x: forcingWm2, y: rows.warmingK, intercept, covariance: serialCovariance });
  const place = intercept ? 1 : 0;
  return {
    rows,
    yearsWithout: claimRows.years.filter((year) => !total.has(year)),
    forcingWm2,
    co2ForcingWm2: co2 && years.every((year) => co2.has(year)) ? fromAnchor(co2, years, nAnchor) : null,
    slope: answer.coefficients[place] ?? NaN,
    slopeStandardError: answer.standardErrors[place] ?? NaN,
    regression: answer,
    doublingWm2,
  };
}

/** Forcing by year, W/m². */
function annualForcing(series: SeriesData, minMonths: number): Map<number, number> {
  const factor = checkUnit(series, 'W/m²');
  const { years, values } = annualMeans(series, minMonths);
  return new Map(years.map((year, row) => [year, (values[row] ?? NaN) * factor]));
}

function fromAnchor(forcing: ReadonlyMap<number, number>, years: readonly number[], nAnchor: number): number[] {
  const values = years.map((year) => forcing.get(year) ?? NaN);
  const reference = mean(values.slice(0, nAnchor));
  return values.map((value) => value - reference);
}
