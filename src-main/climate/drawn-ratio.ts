import { randomStream } from '../statistics/random-stream.ts';
import { splitNormalAt, type SplitNormal } from '../statistics/split-normal.ts';
import { quantilesWithUnbounded } from './quantiles-with-unbounded.ts';

/** Draws per random stream. Part of the numbers: changing it changes the digits of every stored result. */
const drawsPerBlock = 65_536;

export interface DrawnRatioRequest {
  numerator: SplitNormal;
  denominator: SplitNormal;
  /** Between the two. */
  correlation: number;
  nDraws: number;
  seed: number;
}

/** null where a quantile falls among the draws that count as unbounded above. */
export interface DrawnRatio {
  q05: number | null;
  q50: number | null;
  q95: number | null;
  shareUndefined: number;
}

/**
 * Distribution of a ratio whose denominator is positive by its nature, by Monte Carlo.
 *
 * Model    n/d of two split normals. Draws with d ≤ 0 count as unbounded above, never as negative
 *
 * @param onProgress  called after each block with the share done; may throw to stop
 *
 * Source    Monte Carlo propagation of distributions: JCGM 101:2008, §7
 * Checked   test/unit/climate/drawn-ratio.test.ts (C: known denominators, reciprocal of a normal, perfect correlation)
 */
export function drawnRatio(request: DrawnRatioRequest, onProgress?: (shareDone: number) => void): DrawnRatio {
  const { numerator, denominator, correlation, nDraws, seed } = request;
  const independentShare = Math.sqrt(1 - correlation * correlation);
  const ratios = new Float64Array(nDraws);
  let nRatios = 0;
  let nDone = 0;
  for (let block = 0; nDone < nDraws; block++) {
    const stream = randomStream(seed, block);
    const blockEnd = Math.min(nDone + drawsPerBlock, nDraws);
    for (; nDone < blockEnd; nDone++) {
      const z = stream.normal();
      const below = splitNormalAt(denominator, z);
      const above = splitNormalAt(numerator, correlation * z + independentShare * stream.normal());
      if (below > 0) ratios[nRatios++] = above / below;
    }
    onProgress?.(nDone / nDraws);
  }
  const [q05, q50, q95] = quantilesWithUnbounded(ratios.subarray(0, nRatios), nDraws, [0.05, 0.5, 0.95]);
  return { q05, q50, q95, shareUndefined: (nDraws - nRatios) / nDraws };
}
