import { windowSweep } from '../../src-main/robustness/window-sweep.ts';
import type { BenchCase } from './bench-case.ts';
import { sameNumbers } from './comparison.ts';
import { pythonRecord } from './python-peer.ts';

/** Every window of at least 20 of 61 years, through its first year and with an intercept, Newey–West errors of lag 5. */
export function caseOfSweeping(): BenchCase {
  const { co2Ppm, temperatureK: y } = pythonRecord('annual');
  const record = { years: co2Ppm.map((_, place) => 1960 + place), co2Ppm, y, minYears: 20 };
  const anchor = { kind: 'first-year' } as const;
  const covariance = { kind: 'newey-west', lag: 5, smallSample: false } as const;
  const compare = sameNumbers({ rel: 1e-10, why: 'the same rows, summed otherwise' });
  return {
    name: 'window sweep, 61 years',
    own: () => {
      const windows = [true, false].flatMap(
        (intercept) => windowSweep({ ...record, anchor, intercept, covariance }).windows,
      );
      return [windows.reduce((total, { slope, standardError }) => total + slope + standardError, 0), windows.length];
    },
    peers: [
      { name: 'a loop in numpy', work: { task: 'sweep-annual' }, atMost: 1 / 10, compare },
      { name: 'a loop of statsmodels', work: { task: 'sweep-annual-statsmodels' }, atMost: 1 / 50, compare },
    ],
  };
}
