import type { Values } from './bench-case.ts';

export interface Agreement {
  agrees: boolean;
  inWords: string;
}
export type Comparison = (own: Values, peer: Values) => Agreement;

/** Both sides fit the same numbers: |own − peer| ≤ rel·|peer|. */
export function sameNumbers({ rel, why }: { rel: number; why: string }): Comparison {
  return comparison((own, peer) => (own === peer ? 0 : Math.abs(own - peer) / Math.abs(peer)), {
    most: rel,
    measure: 'relative difference',
    why,
  });
}

/** A difference of two draws is normal with √2 of one's standard error: beyond this, chance is 1 in a million. */
const MOST_STANDARD_ERRORS = 5 * Math.SQRT2;

/** Each side drew its own random numbers: |own − peer| is measured in Monte Carlo standard errors of one side. */
export function sameButForChance(standardErrors: Values): Comparison {
  return comparison((own, peer, place) => Math.abs(own - peer) / (standardErrors[place] ?? NaN), {
    most: MOST_STANDARD_ERRORS,
    measure: 'Monte Carlo standard errors apart',
    why: 'either side draws its own numbers',
  });
}

function comparison(
  difference: (own: number, peer: number, place: number) => number,
  { most, measure, why }: { most: number; measure: string; why: string },
): Comparison {
  return (own, peer) => {
    if (own.length !== peer.length || own.length === 0) {
      return { agrees: false, inWords: `${own.length} values against ${peer.length}` };
    }
    const differences = own.map((value, place) => difference(value, peer[place] ?? NaN, place));
    // Not `<=` of the largest alone: a NaN compares false, and would hide behind Math.max in some orders.
    const agrees = differences.every((value) => value <= most);
    const worst = differences.some(Number.isNaN) ? NaN : Math.max(...differences);
    return { agrees, inWords: `${measure} ${worst.toPrecision(2)}, at most ${most.toPrecision(2)} (${why})` };
  };
}

/** Standard deviation of each value over runs with different seeds. */
export function standardErrors(nRuns: number, run: (seed: number) => Values): Values {
  const runs = Array.from({ length: nRuns }, (_, place) => run(1000 + place));
  return (runs[0] ?? []).map((_, place) => {
    const values = runs.map((run) => run[place] ?? NaN);
    const centre = values.reduce((total, value) => total + value, 0) / nRuns;
    return Math.sqrt(values.reduce((total, value) => total + (value - centre) ** 2, 0) / (nRuns - 1));
  });
}
