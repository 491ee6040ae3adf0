/** What is asked of a profile likelihood. */
export interface ProfileSearch {
  /** Highest log-likelihood with the parameter held at a value. Called from the estimate outwards. */
  profile: (value: number) => number;
  /** Where it is highest, and how high. */
  estimate: number;
  top: number;
  /** How far the log-likelihood falls to the end of the interval: z²/2. */
  fall: number;
  /** Values to look at on the way out, the last being the bound of the search. */
  stations: readonly number[];
}

const MOST_STEPS = 60;

/**
 * One end of a profile-likelihood interval: the value at which the likelihood, with everything else fitted anew, has fallen
 * far enough below its top.
 *
 * The first station beyond the end brackets it; between, √(2·fall) is close to a straight line, and its crossing is found by
 * the regula falsi in Illinois form.
 *
 * @returns  the end; null when the likelihood has not fallen so far at the last station
 *
 * Source   Venzon & Moolgavkar 1988, J. Roy. Stat. Soc. C 37, 87–94 (definition); Dowell & Jarratt 1971, BIT 11, 168–174
 * Checked  test/unit/statistics/profile-end.test.ts (C: a parabola and a skewed likelihood with known ends)
 */
export function profileEnd({ profile, estimate, top, fall, stations }: ProfileSearch): number | null {
  const target = Math.sqrt(2 * fall);
  const excess = (value: number) => Math.sqrt(2 * Math.max(0, top - profile(value))) - target;
  let inside = { value: estimate, excess: -target };
  for (const station of stations) {
    const there = { value: station, excess: excess(station) };
    if (there.excess >= 0) return crossing(excess, inside, there);
    inside = there;
  }
  return null;
}

interface Tried {
  value: number;
  excess: number;
}

function crossing(excess: (value: number) => number, inside: Tried, outside: Tried): number {
  let [low, high] = [inside, outside];
  let lastSide = 0;
  for (let step = 0; step < MOST_STEPS; step++) {
    const width = high.value - low.value;
    if (Math.abs(width) <= 1e-9 * Math.max(Math.abs(high.value), Math.abs(low.value)) || high.excess === 0) break;
    const value = high.value - (high.excess * width) / (high.excess - low.excess);
    const there = { value, excess: excess(value) };
    if (Math.abs(there.excess) < 1e-9) return value;
    // The side that stays twice is weighed at half, so that the other one moves too.
    if (there.excess > 0) {
      if (lastSide === 1) low = { ...low, excess: low.excess / 2 };
      [high, lastSide] = [there, 1];
    } else {
      if (lastSide === -1) high = { ...high, excess: high.excess / 2 };
      [low, lastSide] = [there, -1];
    }
  }
  return high.value;
}
