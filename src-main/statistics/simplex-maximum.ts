/** A point and the height of the function there. */
export interface Summit {
  at: number[];
  height: number;
}

const MOST_STEPS = 2000;
/** The simplex is done when its heights agree to this and its corners to that. */
const LEVEL = 1e-11;
const NARROW = 1e-7;
const MOST_RESTARTS = 12;

/**
 * Climbs to a local maximum of a function of a few variables without its slopes: a simplex that turns over its lowest
 * corner. It is set up anew at each summit, at full and at small size, until that gains nothing: a simplex can collapse on
 * a slope.
 *
 * @param height  of a point; −∞ where the function is not defined
 * @param start   a point where it is
 * @param sizes   of the first simplex, along each variable
 *
 * Source   Nelder & Mead 1965, Comput. J. 7, 308–313; restarts: Press et al. 2007, Numerical Recipes, §10.5
 * Checked  test/unit/statistics/simplex-maximum.test.ts (C: valleys and ridges with known tops)
 */
export function simplexMaximum(
  height: (at: readonly number[]) => number,
  start: readonly number[],
  sizes: readonly number[],
): Summit {
  let best: Summit = { at: [...start], height: height(start) };
  for (let restart = 0; restart < MOST_RESTARTS; restart++) {
    const scale = 0.2 ** restart;
    const next = climb(
      height,
      best,
      sizes.map((size) => size * Math.max(scale, 1e-3) * (restart % 2 === 0 ? 1 : -1)),
    );
    const gain = next.height - best.height;
    if (gain >= 0) best = next;
    if (restart > 0 && gain <= LEVEL) break;
  }
  return best;
}

function climb(height: (at: readonly number[]) => number, start: Summit, sizes: readonly number[]): Summit {
  const n = sizes.length;
  const corners = [start, ...sizes.map((size, i) => cornerAt(start.at.map((v, j) => (i === j ? v + size : v))))];
  for (let step = 0; step < MOST_STEPS; step++) {
    corners.sort((a, b) => b.height - a.height);
    const [top, lowest, second] = [corners[0]!, corners[n]!, corners[n - 1]!];
    const isLevel = top.height - lowest.height <= LEVEL;
    if (isLevel && sizes.every((size, i) => widthOf(i) <= NARROW * Math.abs(size))) break;
    const centre = top.at.map((_, i) => corners.slice(0, n).reduce((total, corner) => total + corner.at[i]!, 0) / n);
    const along = (share: number) => cornerAt(centre.map((value, i) => value + share * (value - lowest.at[i]!)));
    const turned = along(1);
    if (turned.height > top.height) {
      const farther = along(2);
      corners[n] = farther.height > turned.height ? farther : turned;
    } else if (turned.height > second.height) {
      corners[n] = turned;
    } else {
      const nearer = along(turned.height > lowest.height ? 0.5 : -0.5);
      if (nearer.height > Math.max(turned.height, lowest.height)) corners[n] = nearer;
      else
        for (let i = 1; i <= n; i++) {
          corners[i] = cornerAt(corners[i]!.at.map((value, j) => (value + top.at[j]!) / 2));
        }
    }
  }
  return corners.reduce((a, b) => (b.height > a.height ? b : a));

  function cornerAt(at: number[]): Summit {
    return { at, height: height(at) };
  }

  function widthOf(i: number): number {
    const values = corners.map(({ at }) => at[i]!);
    return Math.max(...values) - Math.min(...values);
  }
}
