import tQuantile from '@stdlib/stats-base-dists-t-quantile';
import type { ClaimComputation } from '../../contract/compute.ts';
import type { EstimatorEstimate, EstimatorId } from '../../contract/estimator-comparison.ts';
import type { Caveat } from '../../contract/primitives.ts';
import type { FittedLine } from '../procedures/fitted-line.ts';

/** The line that is estimated anew, with the series that it comes from. */
export interface ComparedLine extends FittedLine {
  computation: ClaimComputation;
}

/** A slope in its own unit: K per e-folding, K per year. */
export interface SlopeEstimate {
  slope: number;
  standardError: number | null;
  interval95: { low: number; high: number } | null;
  convention: string;
  parameters?: EstimatorEstimate['parameters'];
  /** Where random numbers were drawn. */
  random?: EstimatorEstimate['random'];
  caveats?: Caveat[];
}

/** One way to estimate the slope of a line. */
export interface Estimator {
  id: EstimatorId;
  label: string;
  /** What it takes for a step of time: nothing, the next row whatever its year, or a year of the calendar. */
  order: EstimatorEstimate['order'];
  /** Does the comparison with this line need it? Always, unless given. */
  applies?: (line: ComparedLine) => boolean;
  /** @throws InputError and NumericError of the estimator */
  estimate: (line: ComparedLine) => SlopeEstimate;
}

/** 95 % from the t distribution. */
export function tInterval(slope: number, standardError: number, degreesOfFreedom: number): SlopeEstimate['interval95'] {
  const halfWidth = tQuantile(0.975, degreesOfFreedom) * standardError;
  return { low: slope - halfWidth, high: slope + halfWidth };
}

export function tWords(degreesOfFreedom: number): string {
  return `t with ${degreesOfFreedom} degrees of freedom`;
}

/** Theil–Sen and York fit no line through a given point. */
export function freeInterceptCaveats({ intercept }: FittedLine): Caveat[] {
  if (intercept) return [];
  return [
    {
      code: 'free-intercept',
      detail:
        'This estimator always fits an intercept, which the procedure has not: hold it against least squares with a free intercept.',
    },
  ];
}
