import tQuantile from '@stdlib/stats-base-dists-t-quantile';
import { usualSplit, type GregoryInput, type GregoryLine, type GregoryValue } from '../contract/climate-response.ts';
import type { RegressionRequest } from '../contract/compute.ts';
import { InputError } from '../errors.ts';
import { deming } from '../statistics/deming.ts';
import { fieller } from '../statistics/fieller.ts';
import { finiteNumber, finiteValues } from '../statistics/finite-values.ts';
import { regression } from '../statistics/regression.ts';
import { mean } from '../statistics/summation.ts';
import { gregoryCaveats } from './gregory-caveats.ts';

const FEWEST_POINTS = 3;

/** Points of a Gregory plot in some span of years. */
interface Points {
  years: Float64Array;
  imbalance: Float64Array;
  warming: Float64Array;
}

type Covariance = RegressionRequest['covariance'];

/**
 * Gregory regression: forcing, feedback and equilibrium warming of an abrupt change, from the line along which the
 * planet's imbalance falls as it warms.
 *
 * Model    N = F − λΔT. F the line's N at ΔT = 0, λ its negative slope, F/λ its ΔT at N = 0; for a doubling F and F/λ over
 *          `doublingDivisor`: 2 for 4×CO2 by common practice; 2.1 is in use too, as forcing grows a little faster than the
 *          logarithm
 * Assumes  one feedback at all times. Where the points bend, years 1–20 and 21–150 give different lines, and neither is an
 *          equilibrium: the result is the effective sensitivity of its years. Scatter in ΔT flattens the line; the bracket
 *          lays it to N, to ΔT (line turned round), and to both (total least squares, major axis at `delta`)
 *
 * @param imbalanceWm2, warmingK  [nYears ≥ 3] annual means, finite, in order of time; warmingK not constant
 * @param years       [nYears] increasing; for the split only
 * @param split       both ends of a span belong to it
 * @param covariance  of F and λ; newey-west for scatter that carries over from year to year
 * @returns  standard error of F/λ by the delta method, and Fieller's interval. Where λ is not above 0 at 95 % (t with n − 2
 *           degrees of freedom, two-sided) F/λ is unbounded: null. Caveats feedback-not-distinct, curved, few-years, part-too-short,
 *           from regression high-leverage, exact-fit, few-degrees-of-freedom, short-series-for-lag
 * @throws   InputError and NumericError as `regression` and `deming`; InputError out-of-range, unordered-years
 *
 * Differs  150 years are usual; some leave the first year out. Published standard errors are mostly classical
 * Source   Gregory et al. 2004, Geophys. Res. Lett. 31, L03205; both directions of regression: Forster & Gregory 2006,
 *          J. Climate 19, 39–52 (from memory)
 * Checked  test/reference/climate/gregory.test.ts (B: R's lm, prcomp and dense sums; C: tabulated regressions of the
 *          two-layer model)
 */
export function gregory(input: GregoryInput): GregoryValue {
  const points = checkedPoints(input);
  const { split = usualSplit, covariance = { kind: 'classical' }, doublingDivisor, delta = 1 } = input;
  if (doublingDivisor !== undefined) {
    finiteNumber('gregory', 'doublingDivisor', doublingDivisor, { above: 0, atMost: 100 });
  }
  const { line, caveats } = fitted(points, covariance);
  const early = part(points, split.early, covariance);
  const late = part(points, split.late, covariance);
  return {
    ...line,
    perDoubling:
      doublingDivisor === undefined
        ? null
        : {
            forcingWm2: line.forcingWm2 / doublingDivisor,
            equilibriumK: line.equilibriumK === null ? null : line.equilibriumK / doublingDivisor,
            divisor: doublingDivisor,
          },
    early,
    late,
    bracket: bracketOf(points, line, delta),
    convention: conventionWords(covariance, line.nYears, delta),
    caveats: [...gregoryCaveats({ line, early, late, split }), ...caveats],
  };
}

function checkedPoints({ imbalanceWm2, warmingK, years }: GregoryInput): Points {
  const imbalance = finiteValues('gregory', 'imbalanceWm2', imbalanceWm2, { atLeast: FEWEST_POINTS });
  const warming = finiteValues('gregory', 'warmingK', warmingK, { length: imbalance.length });
  const times = finiteValues('gregory', 'years', years ?? Array.from(imbalance, (_, i) => i + 1), {
    length: imbalance.length,
  });
  const place = times.findIndex((year, i) => i > 0 && year <= times[i - 1]!);
  if (place > 0) {
    throw new InputError({
      code: 'unordered-years',
      where: `gregory, years[${place}]`,
      expected: `a year after ${times[place - 1]!}`,
      received: String(times[place]!),
      hint: 'Rows must be in order of time.',
    });
  }
  return { years: times, imbalance, warming };
}

function fitted({ imbalance, warming }: Points, covariance: Covariance) {
  const fit = regression({ x: [...warming], y: [...imbalance], intercept: true, covariance });
  const [forcing, slope] = [fit.coefficients[0]!, fit.coefficients[1]!];
  const [forcingVariance, shared, slopeVariance] = [
    fit.covarianceMatrix[0]![0]!,
    fit.covarianceMatrix[0]![1]!,
    fit.covarianceMatrix[1]![1]!,
  ];
  const t = tQuantile(0.975, fit.degreesOfFreedom);
  const feedback = -slope;
  const isDistinct = feedback > t * Math.sqrt(slopeVariance);
  const equilibrium = forcing / feedback;
  // Var(F/λ) ≈ [Var F − 2(F/λ) Cov(F, λ) + (F/λ)² Var λ]/λ², Cov(F, λ) = −Cov(F, slope).
  const variance = forcingVariance + 2 * equilibrium * shared + equilibrium ** 2 * slopeVariance;
  const line: GregoryLine = {
    nYears: imbalance.length,
    forcingWm2: forcing,
    feedbackWm2PerK: feedback,
    equilibriumK: isDistinct ? equilibrium : null,
    forcingStandardErrorWm2: Math.sqrt(forcingVariance),
    feedbackStandardErrorWm2PerK: Math.sqrt(slopeVariance),
    equilibriumStandardErrorK: isDistinct ? Math.sqrt(Math.max(0, variance)) / feedback : null,
    equilibriumFieller95: isDistinct
      ? {
          ...fieller({
            numerator: forcing,
            denominator: feedback,
            numeratorVariance: forcingVariance,
            covariance: -shared,
            denominatorVariance: slopeVariance,
            multiple: t,
          }),
          levelPercent: 95,
        }
      : null,
  };
  // F, to which that caveat belongs, is not part of this answer.
  return { line, caveats: fit.caveats.filter(({ code }) => code !== 'classical-f') };
}

function part(
  { years, imbalance, warming }: Points,
  { from, to }: { from: number; to: number },
  covariance: Covariance,
): GregoryLine | null {
  const isInside = (_: number, row: number) => years[row]! >= from && years[row]! <= to;
  const inside = { imbalance: imbalance.filter(isInside), warming: warming.filter(isInside), years };
  const nYears = inside.imbalance.length;
  if (nYears < FEWEST_POINTS || inside.warming.every((value) => value === inside.warming[0])) return null;
  const fits = covariance.kind !== 'newey-west' || Number(covariance.lag) < nYears;
  return fits ? fitted(inside, covariance).line : null;
}

function bracketOf({ imbalance, warming }: Points, line: GregoryLine, delta: number): GregoryValue['bracket'] {
  if (line.equilibriumK === null) return null;
  const [meanN, meanT] = [mean(imbalance), mean(warming)];
  const turned = regression({ x: [...imbalance], y: [...warming], intercept: true, covariance: { kind: 'classical' } });
  const through = (feedbackWm2PerK: number) => {
    const forcingWm2 = meanN + feedbackWm2PerK * meanT;
    return { forcingWm2, feedbackWm2PerK, equilibriumK: forcingWm2 / feedbackWm2PerK };
  };
  return {
    imbalanceOnWarming: through(line.feedbackWm2PerK),
    warmingOnImbalance: through(-1 / turned.coefficients[1]!),
    totalLeastSquares: through(-deming({ x: warming, y: imbalance, delta }).slope),
  };
}

function conventionWords(covariance: Covariance, nYears: number, delta: number): string {
  const errors =
    covariance.kind === 'newey-west'
      ? `Newey–West, lag ${covariance.lag}, ${covariance.smallSample ? 'with' : 'without'} the factor n/(n − 2)`
      : 'classical standard errors';
  return `Least squares of N on ΔT over ${nYears} years; ${errors}; error of the equilibrium by the delta method, its interval Fieller’s at 95 % (t, ${nYears - 2} degrees of freedom); total least squares at a ratio of variances of ${delta} (W m⁻² K⁻¹)².`;
}
