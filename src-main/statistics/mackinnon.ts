import normalCdf from '@stdlib/stats-base-dists-normal-cdf';
import { InputError } from '../errors.ts';
import { finiteNumber } from './finite-values.ts';
import { criticalSurfaces, pValueSurfaces, type Deterministic } from './mackinnon-tables.ts';

export type CriticalValues = Record<'1%' | '5%' | '10%', number>;

/**
 * Approximate asymptotic p-value of a unit-root (one series) or cointegration (several) t statistic τ: the probability of
 * a τ at least as negative when there is a unit root.
 *
 * @param tau      t statistic
 * @param nSeries  1 for Dickey–Fuller; for Engle–Granger the number of series, the regressand among them; at most 6
 * @returns  0 below and 1 above the range that the surface was fitted on
 * @throws   InputError out-of-range
 *
 * Source   MacKinnon 1994, J. Bus. Econ. Stat. 12, 167–176
 * Checked  test/reference/statistics/unit-root.test.ts (A: the critical values have p of 1, 5 and 10 % within the
 *          surface's stated accuracy; a figure printed by statsmodels)
 */
export function mackinnonP(tau: number, deterministic: Deterministic, nSeries = 1): number {
  finiteNumber('mackinnonP', 'tau', tau);
  const { lowest, star, highest, small, large } = surfaceOf(pValueSurfaces, deterministic, nSeries);
  if (tau < lowest) return 0;
  if (tau > highest) return 1;
  const polynomial = tau <= star ? small : large;
  return normalCdf(
    polynomial.reduceRight((total, coefficient) => total * tau + coefficient, 0),
    0,
    1,
  );
}

/**
 * Critical values of the same statistics in a sample of nObs rows (rows of the test regression, after lags).
 *
 * @throws   InputError out-of-range
 *
 * Source   MacKinnon 2010, Queen's Economics Department Working Paper 1227
 * Checked  test/reference/statistics/unit-root.test.ts (A: asymptotic values; statsmodels' and Stata's printed ones)
 */
export function mackinnonCritical(deterministic: Deterministic, nObs: number, nSeries = 1): CriticalValues {
  finiteNumber('mackinnonCritical', 'nObs', nObs, { isWhole: true, atLeast: 5 });
  const surface = surfaceOf(criticalSurfaces, deterministic, nSeries);
  const at = (level: keyof CriticalValues) =>
    surface[level].reduceRight((total, coefficient) => total / nObs + coefficient, 0);
  return { '1%': at('1%'), '5%': at('5%'), '10%': at('10%') };
}

function surfaceOf<Surface>(
  surfaces: Record<Deterministic, readonly Surface[]>,
  deterministic: Deterministic,
  nSeries: number,
): Surface {
  const surface = surfaces[deterministic][nSeries - 1];
  if (surface) return surface;
  throw new InputError({
    code: 'out-of-range',
    where: 'mackinnon, nSeries',
    expected: `a whole number from 1 to ${surfaces[deterministic].length} with deterministic terms "${deterministic}"`,
    received: String(nSeries),
  });
}
