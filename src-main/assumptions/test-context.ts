import { recompute } from '../climate/procedures/recompute.ts';
import type { ClaimComputation } from '../contract/compute.ts';
import type { Recomputation, Weight } from '../contract/result.ts';
import { formatNumber, withUnit } from '../quantities/notation.ts';
import { decimalsPrinted } from '../quantities/stated-number.ts';
import { jointDraws, type JointDraws } from '../robustness/ladder.ts';
import { weighAlternative, weighShift } from './weigh.ts';

/** What every test starts from: the claim, its number as recomputed, and how this review weighs and sets numbers. */
export interface TestContext {
  computation: ClaimComputation;
  recomputation: Recomputation;
  /** Behind the ladder and every interval that is drawn: the same draws for all. */
  draws: JointDraws;
  /** Weight of the number becoming this one. */
  weigh: (alternative: number) => Weight;
  /** Weight of a shift of this size, whatever its sign. */
  weighShift: (shift: number) => Weight;
  /** A number in the claim's unit, to one digit more than is stated. */
  show: (value: number) => string;
  showWithUnit: (value: number) => string;
  /** With its sign always. */
  showShift: (shift: number) => string;
}

/** Ends of the central 90 % are then known to about 1.5 % of a standard deviation. */
const nDraws = 20_000;

/** @throws InputError, NumericError as `recompute` */
export function testContext(computation: ClaimComputation): TestContext {
  const recomputation = recompute(computation);
  const { statement } = computation;
  const decimals = Math.min(Math.max(decimalsPrinted(statement.value) + 1, 2), 6);
  const show = (value: number) => formatNumber(value, { decimals });
  return {
    computation,
    recomputation,
    draws: jointDraws(computation.seed, nDraws),
    weigh: (alternative) => weighAlternative(computation, recomputation.value, alternative),
    weighShift: (shift) => weighShift(computation, shift),
    show,
    showWithUnit: (value) => withUnit(show(value), recomputation.unit),
    showShift: (shift) => formatNumber(shift, { decimals, withSign: true }),
  };
}
