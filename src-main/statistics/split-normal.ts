import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import { InputError } from '../errors.ts';
import { finiteNumber } from './finite-values.ts';

/** Two half normals that meet at the centre. Equal spreads: a normal. */
export interface SplitNormal {
  centre: number;
  sdBelow: number;
  sdAbove: number;
}

/** A best value with the ends of its central range. */
export interface RangedValue {
  best: number;
  low: number;
  high: number;
  /** Probability of the central range: 90 for 5–95 %. */
  levelPercent: number;
}

/**
 * The split normal whose median and whose central range are the published ones, so that a range which is wider on one side
 * stays so.
 *
 * Model    centre + sdBelow·z for z < 0, centre + sdAbove·z for z ≥ 0, z standard normal;
 *          sd = distance of the centre from the end of the range, over the normal quantile of that end
 *
 * @param range  low ≤ best ≤ high, any unit; all equal for a value taken as exact
 * @returns  in the unit of the range
 * @throws   InputError out-of-range, range-order
 *
 * Differs   the two-piece normal density (Fechner 1897) has its mode, not its median, at the joint and other quantiles.
 *           AR6 WG1 chapter 7 divides 5–95 % half-widths by the rounded 1.645
 * Source    piecewise linear in z: common practice for published ranges that are not symmetric
 * Checked   test/unit/statistics/split-normal.test.ts (C: the quantiles that went in)
 */
export function splitNormal({ best, low, high, levelPercent }: RangedValue): SplitNormal {
  for (const [name, value] of Object.entries({ best, low, high })) finiteNumber('splitNormal', name, value);
  finiteNumber('splitNormal', 'levelPercent', levelPercent, { above: 0, below: 100 });
  if (!(low <= best && best <= high)) {
    throw new InputError({
      code: 'range-order',
      where: 'splitNormal',
      expected: 'a best value within its range',
      received: `${best} beside ${low} to ${high}`,
      hint: 'Give the lower end first; both ends equal to the best value stand for an exact one.',
    });
  }
  const z = normalQuantile(0.5 + levelPercent / 200, 0, 1);
  return { centre: best, sdBelow: (best - low) / z, sdAbove: (high - best) / z };
}

/** The value that a standard-normal draw stands for. */
export function splitNormalAt({ centre, sdBelow, sdAbove }: SplitNormal, z: number): number {
  return centre + (z < 0 ? sdBelow : sdAbove) * z;
}
