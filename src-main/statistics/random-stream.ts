import normalQuantile from '@stdlib/stats-base-dists-normal-quantile';
import { finiteNumber } from './finite-values.ts';

/** Recorded with every result that used random numbers. Changes whenever a digit of any stream would. */
export const generatorId = 'mt19937 by array [seed, block]; 53-bit; normal by inversion; 1';

export interface RandomStream {
  /** Uniform on the multiples of 2⁻⁵³ strictly between 0 and 1. */
  uniform(): number;
  /** Normal with mean 0 and standard deviation 1. */
  normal(): number;
}

const LARGEST_KEY = 2 ** 32 - 1;

/**
 * Stream of pseudo-random numbers that belongs to one block of one computation. Long work is cut into blocks of a fixed
 * size, each with its own stream, so the digits depend on the seed alone and not on the number of workers.
 *
 * Model    Mersenne Twister MT19937, initialised by the array [seed, block]; a uniform from 27 + 26 bits of two
 *          outputs, zero drawn again; a normal as the standard normal quantile of one uniform
 *
 * @param seed, block  whole numbers from 0 to 2³² − 1
 * @throws   InputError out-of-range
 *
 * Source   Matsumoto & Nishimura 1998, ACM Trans. Model. Comput. Simul. 8, 3–30; initialisation and 53-bit resolution
 *          as in their mt19937ar.c of 2002 (init_by_array, genrand_res53)
 * Checked  test/reference/statistics/random-stream.test.ts (A: published outputs; B: Python's random, R's qnorm)
 */
export function randomStream(seed: number, block: number): RandomStream {
  finiteNumber('randomStream', 'seed', seed, { isWhole: true, atLeast: 0, atMost: LARGEST_KEY });
  finiteNumber('randomStream', 'block', block, { isWhole: true, atLeast: 0, atMost: LARGEST_KEY });
  const generator = mersenneTwister([seed, block]);
  const uniform = (): number => {
    let value = 0;
    while (value === 0) {
      const high = generator.next() >>> 5;
      const low = generator.next() >>> 6;
      value = (high * 2 ** 26 + low) / 2 ** 53;
    }
    return value;
  };
  return { uniform, normal: () => normalQuantile(uniform(), 0, 1) };
}

const STATE_LENGTH = 624;
/** How far behind a word the word lies that it is mixed with. */
const MIDDLE = 397;

/** MT19937 initialised by an array of 32-bit words: init_by_array and genrand_int32 of mt19937ar.c. */
export function mersenneTwister(key: readonly number[]): { next(): number } {
  const state = initialState(key);
  let place = STATE_LENGTH;
  return {
    next: () => {
      if (place === STATE_LENGTH) {
        twist(state);
        place = 0;
      }
      let word = state[place++]!;
      word ^= word >>> 11;
      word ^= (word << 7) & 0x9d2c5680;
      word ^= (word << 15) & 0xefc60000;
      return (word ^ (word >>> 18)) >>> 0;
    },
  };
}

function initialState(key: readonly number[]): Int32Array {
  const state = new Int32Array(STATE_LENGTH);
  state[0] = 19_650_218;
  for (let i = 1; i < STATE_LENGTH; i++) state[i] = mixed(state, i - 1, 1_812_433_253) + i;

  let place = 1;
  const advance = () => {
    place++;
    if (place < STATE_LENGTH) return;
    state[0] = state[STATE_LENGTH - 1]!;
    place = 1;
  };
  for (let step = 0; step < Math.max(STATE_LENGTH, key.length); step++) {
    const keyPlace = step % key.length;
    state[place] = (state[place]! ^ mixed(state, place - 1, 1_664_525)) + key[keyPlace]! + keyPlace;
    advance();
  }
  for (let step = 1; step < STATE_LENGTH; step++) {
    state[place] = (state[place]! ^ mixed(state, place - 1, 1_566_083_941)) - place;
    advance();
  }
  state[0] = -(2 ** 31);
  return state;
}

function mixed(state: Int32Array, place: number, multiplier: number): number {
  const word = state[place]!;
  return Math.imul(word ^ (word >>> 30), multiplier);
}

/** The next 624 words, before they are tempered. */
function twist(state: Int32Array): void {
  for (let i = 0; i < STATE_LENGTH - MIDDLE; i++) state[i] = state[i + MIDDLE]! ^ twisted(state[i]!, state[i + 1]!);
  for (let i = STATE_LENGTH - MIDDLE; i < STATE_LENGTH - 1; i++) {
    state[i] = state[i + MIDDLE - STATE_LENGTH]! ^ twisted(state[i]!, state[i + 1]!);
  }
  state[STATE_LENGTH - 1] = state[MIDDLE - 1]! ^ twisted(state[STATE_LENGTH - 1]!, state[0]!);
}

/** The top bit of one word and the rest of the next, times the matrix A. */
function twisted(word: number, next: number): number {
  const joined = (word & 0x80000000) | (next & 0x7fffffff);
  return (joined >>> 1) ^ (-(joined & 1) & 0x9908b0df);
}
