import type { BlockBootstrapInput, BlockBootstrapValue } from '../contract/resampling.ts';
import type { Caveat } from '../contract/primitives.ts';
import { NumericError } from '../errors.ts';
import { designColumns } from './design-columns.ts';
import { refuseExactFit } from './exact-fit.ts';
import { finiteNumber, finiteValues } from './finite-values.ts';
import { leastSquares, type LeastSquaresFit } from './least-squares.ts';
import { quantileOfSorted } from './quantile.ts';
import { generatorId, randomStream } from './random-stream.ts';
import { mean, sum, sumOfProducts } from './summation.ts';
import { gapsClosedUp } from './year-steps.ts';

/** Draws per random stream. Part of the numbers: changing it changes the digits of every stored result. */
const DRAWS_PER_STREAM = 1000;

/** A spread about a new record's own mean that is this small against that about the record's mean is rounding. */
const ROUNDING_OF_SPREAD = 1e-10;

/**
 * Moving-block bootstrap of a least-squares slope: how the slope scatters when the record is put together anew from blocks
 * of neighbouring rows, which keep the likeness of neighbours that single rows would lose.
 *
 * Model    blocks of blockLength rows, each start 1 … n − blockLength + 1 equally likely, ⌈n/blockLength⌉ of them, the
 *          last cut so that n rows come out.
 *          pairs      rows (x, y) as they are; the slope of each new record
 *          residuals  x stays; y* = fitted + e*, e* blocks of residuals less their mean over all starts at that place of
 *                     the block (so that e* averages to zero); the slope of y* on x
 *          Slopes are formed as b + (slope of e* on x*), which loses no digits to the level of y
 * Assumes  rows in order of time, equally spaced, without gaps; blocks long against the memory of the errors, and many
 *
 * @param draws  new records; each thousand has its own random stream, so the digits do not depend on how the work is
 *               shared out. A start is ⌊u·(n − blockLength + 1)⌋, u the stream's next uniform
 * @param years  [nObs]: with a gap among them, a caveat
 * @returns  quantiles (type 7) and standard deviation (n − 1) of the slopes, not centred on the slope; caveats few-blocks,
 *           few-draws, draws-without-spread, gaps-closed-up
 * @throws   InputError and NumericError as `leastSquares`; InputError out-of-range, unordered-years; NumericError
 *           exact-fit, no-spread
 *
 * Source   Künsch 1989, Ann. Stat. 17, 1217–1241; of regressions: Fitzenberger 1998, J. Econometrics 82, 235–287 (pairs);
 *          centring of blocks: Lahiri 2003, Resampling Methods for Dependent Data, §2.5 (number from memory)
 * Checked  test/reference/statistics/moving-block-bootstrap.test.ts (B: R's lm on each new record; C: closed form)
 */
export function movingBlockBootstrap(
  request: BlockBootstrapInput,
  onProgress?: (shareDone: number) => void,
): BlockBootstrapValue {
  const { intercept, blockLength, draws, seed, resample = 'pairs', years } = request;
  const caller = 'movingBlockBootstrap';
  const y = finiteValues(caller, 'y', request.y, { atLeast: 3 });
  const columns = designColumns(caller, request.x, y.length, intercept);
  finiteNumber(caller, 'blockLength', blockLength, {
    isWhole: true,
    atLeast: 1,
    atMost: y.length - 1,
    hint: 'Take shorter blocks or a longer series.',
  });
  finiteNumber(caller, 'draws', draws, { isWhole: true, atLeast: 2 });
  const fit = leastSquares({ columns, y, caller });
  refuseExactFit(caller, fit.residualSumOfSquares, sumOfProducts(y, y));

  const shiftOf = resample === 'pairs' ? shiftOfPairs(fit, blockLength) : shiftOfResiduals(fit, blockLength);
  const starts = new Int32Array(Math.ceil(y.length / blockLength));
  const nStarts = y.length - blockLength + 1;
  const shifts = new Float64Array(draws);
  let nKept = 0;
  for (let stream = 0; stream * DRAWS_PER_STREAM < draws; stream++) {
    const { uniform } = randomStream(seed, stream);
    const nDone = Math.min((stream + 1) * DRAWS_PER_STREAM, draws);
    for (let draw = stream * DRAWS_PER_STREAM; draw < nDone; draw++) {
      for (let place = 0; place < starts.length; place++) starts[place] = Math.floor(uniform() * nStarts);
      const shift = shiftOf(starts);
      if (Number.isFinite(shift)) shifts[nKept++] = shift;
    }
    onProgress?.(nDone / draws);
  }
  if (nKept < 2) throw noSpread(draws);

  const slope = fit.coefficients.at(-1)!;
  const sorted = shifts.subarray(0, nKept).sort();
  const at = (probability: number) => slope + quantileOfSorted(sorted, probability);
  const centre = mean(sorted);
  return {
    slope,
    quantiles: { q025: at(0.025), q05: at(0.05), q50: at(0.5), q95: at(0.95), q975: at(0.975) },
    standardError: Math.sqrt(sum(sorted.map((shift) => (shift - centre) ** 2)) / (nKept - 1)),
    resample,
    random: { generator: generatorId, seed, nDraws: draws },
    caveats: [
      ...caveatsOf(y.length, blockLength, draws, draws - nKept),
      ...gapsClosedUp(caller, years, y.length, 'Blocks'),
    ],
  };
}

/** Sums over each block that can start, so that a draw adds a few numbers for each block instead of every row. */
function shiftOfPairs({ columns, residuals: e, nCoefficients }: LeastSquaresFit, blockLength: number) {
  const given = columns.at(-1)!;
  const n = e.length;
  const hasIntercept = nCoefficients === 2;
  const centre = hasIntercept ? mean(given) : 0;
  const x = given.map((value) => value - centre);
  const nWhole = Math.ceil(n / blockLength) - 1;
  const tables = [blockLength, n - nWhole * blockLength].map((length) => {
    const running = (a: Float64Array, b: Float64Array | null) =>
      Float64Array.from({ length: n - blockLength + 1 }, (_, start) => {
        let total = 0;
        for (let i = start; i < start + length; i++) total += a[i]! * (b ? b[i]! : 1);
        return total;
      });
    return { x: running(x, null), e: running(e, null), xx: running(x, x), xe: running(x, e) };
  });
  const [whole, last] = [tables[0]!, tables[1]!];
  return (starts: Int32Array): number => {
    const end = starts[nWhole]!;
    let [xSum, eSum, xx, xe] = [last.x[end]!, last.e[end]!, last.xx[end]!, last.xe[end]!];
    for (let place = 0; place < nWhole; place++) {
      const start = starts[place]!;
      xSum += whole.x[start]!;
      eSum += whole.e[start]!;
      xx += whole.xx[start]!;
      xe += whole.xe[start]!;
    }
    if (!hasIntercept) return xx > 0 ? xe / xx : NaN;
    const spread = xx - (xSum * xSum) / n;
    return spread > ROUNDING_OF_SPREAD * xx ? (xe - (xSum * eSum) / n) / spread : NaN;
  };
}

function shiftOfResiduals({ residuals: e, observationInfluence }: LeastSquaresFit, blockLength: number) {
  const influence = observationInfluence.at(-1)!;
  const nStarts = e.length - blockLength + 1;
  const placeMeans = Float64Array.from({ length: blockLength }, (_, i) => mean(e.subarray(i, i + nStarts)));
  const centre = sum(influence.map((weight, t) => weight * placeMeans[t % blockLength]!));
  return (starts: Int32Array): number => {
    let total = -centre;
    let t = 0;
    for (let place = 0; place < starts.length; place++) {
      const end = Math.min(t + blockLength, e.length);
      const offset = starts[place]! - t;
      for (; t < end; t++) total += influence[t]! * e[t + offset]!;
    }
    return total;
  };
}

function noSpread(nDraws: number): NumericError {
  return new NumericError({
    code: 'no-spread',
    where: 'movingBlockBootstrap, x',
    expected: 'a predictor that varies within the new records',
    received: `one value in nearly all of ${nDraws}`,
    hint: 'Take shorter blocks, or blocks of residuals.',
  });
}

function caveatsOf(n: number, blockLength: number, draws: number, nWithoutSpread: number): Caveat[] {
  const caveats: Caveat[] = [];
  // Common practice: with fewer, the spread of the new records is mostly the choice of a few blocks.
  if (n / blockLength < 5) {
    const detail = `${n} rows hold only ${(n / blockLength).toFixed(1)} blocks of ${blockLength}: the scatter is then too small.`;
    caveats.push({ code: 'few-blocks', detail });
  }
  if (draws < 1000) {
    caveats.push({ code: 'few-draws', detail: `With ${draws} draws the outer quantiles are known only roughly.` });
  }
  if (nWithoutSpread > 0) {
    const detail = `${nWithoutSpread} of ${draws} new records are left out: the predictor does not vary in them.`;
    caveats.push({ code: 'draws-without-spread', detail });
  }
  return caveats;
}
