import { deviations } from './deviations.ts';
import { finiteNumber } from './finite-values.ts';
import { randomStream } from './random-stream.ts';
import { mean } from './summation.ts';

export interface PhaseSurrogatesRequest {
  /** [nObs] in order of time. */
  values: ArrayLike<number>;
  draws: number;
  seed: number;
}

/**
 * Every frequency of every surrogate is summed over every row, with nothing saved by a fast transform: exact tables for
 * any length instead of a length that must be a power of two. Beyond this it would take minutes.
 */
const MOST_STEPS = 2e10;

/**
 * Phase-randomised surrogates: series that are made up, yet have the mean, variance and every autocorrelation of the one
 * given (its periodogram, exactly). Whatever likeness they show to another series is what memory alone brings about.
 *
 * Model    v = mean + Σ_k A_k cos(2πkt/n + φ_k), k = 1 … ⌊n/2⌋; A_k stay, φ_k become uniform on 0 … 2π, independent; at
 *          the highest frequency of an even n the term is ±A cos πt, each sign equally likely
 * Assumes  equally spaced values without gaps, stationary: the ends are joined, so that a trend becomes a saw-tooth, which
 *          comes back at a random place. Take a trend off first
 *
 * @param draws  surrogate number d uses the random stream (seed, d) alone: one uniform for each frequency in ascending
 *               order, φ_k = 2πu, and for the highest of an even n a minus where u < ½
 * @returns  draws × [nObs]
 * @throws   InputError too-few-values, not-finite, out-of-range; NumericError constant
 *
 * Differs  the values are not those of the series in another order, and nearly normal: amplitude-adjusted surrogates keep
 *          the values and the periodogram only nearly
 * Source   Theiler, Eubank, Longtin, Galdrikian & Farmer 1992, Physica D 58, 77–94
 * Checked  test/reference/statistics/phase-surrogates.test.ts (B: R's fft, forth and back)
 */
export function phaseSurrogates(
  { values, draws, seed }: PhaseSurrogatesRequest,
  onProgress?: (shareDone: number) => void,
): Float64Array[] {
  const d = deviations('phaseSurrogates', 'values', values, { atLeast: 4 });
  const n = d.length;
  const average = mean(values);
  finiteNumber('phaseSurrogates', 'draws', draws, {
    isWhole: true,
    atLeast: 1,
    atMost: Math.floor(MOST_STEPS / n ** 2),
  });
  const cosines = Float64Array.from({ length: n }, (_, j) => Math.cos((2 * Math.PI * j) / n));
  const sines = Float64Array.from({ length: n }, (_, j) => Math.sin((2 * Math.PI * j) / n));
  const amplitudes = amplitudesOf(d, cosines, sines);
  return Array.from({ length: draws }, (_, draw) => {
    const { uniform } = randomStream(seed, draw);
    const surrogate = new Float64Array(n).fill(average);
    amplitudes.forEach((amplitude, place) => {
      const k = place + 1;
      const u = uniform();
      const isHighest = 2 * k === n;
      const phase = isHighest ? (u < 0.5 ? Math.PI : 0) : 2 * Math.PI * u;
      const [even, odd] = [amplitude * Math.cos(phase), isHighest ? 0 : amplitude * Math.sin(phase)];
      for (let t = 0, j = 0; t < n; t++, j = (j + k) % n) surrogate[t]! += even * cosines[j]! - odd * sines[j]!;
    });
    onProgress?.((draw + 1) / draws);
    return surrogate;
  });
}

/** A_k of frequencies 1 … ⌊n/2⌋. */
function amplitudesOf(d: Float64Array, cosines: Float64Array, sines: Float64Array): Float64Array {
  const n = d.length;
  return Float64Array.from({ length: Math.floor(n / 2) }, (_, place) => {
    const k = place + 1;
    let [even, odd] = [0, 0];
    for (let t = 0, j = 0; t < n; t++, j = (j + k) % n) {
      even += d[t]! * cosines[j]!;
      odd += d[t]! * sines[j]!;
    }
    return (Math.hypot(even, odd) * (2 * k === n ? 1 : 2)) / n;
  });
}
