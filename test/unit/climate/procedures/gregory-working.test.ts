import { describe, expect, it } from 'vitest';
import { gregory } from '../../../../src-main/climate/gregory.ts';
import { gregoryWorking } from '../../../../src-main/climate/procedures/gregory-working.ts';
import type { GregoryProcedure } from '../../../../src-main/contract/procedure.ts';
import { annualSeries } from '../../../helpers/claim-computation.ts';
import { expectClose } from '../../../helpers/close.ts';

// By hand: five points of N = 4 − 0.8 ΔT, so that F/λ = 5 K, and 2.5 K for a doubling.
const years = [1, 2, 4, 5, 6];
const warmingK = [1, 2, 2.5, 3, 3.5];
const imbalanceWm2 = warmingK.map((warming) => 4 - 0.8 * warming);
const split = { early: { from: 1, to: 4 }, late: { from: 5, to: 6 } };
const procedure: GregoryProcedure = {
  kind: 'gregory',
  seriesId: 1,
  temperatureSeriesId: 2,
  minMonths: 12,
  window: null,
  split,
  divisor: 2,
  covariance: { kind: 'classical' },
};
const answer = gregory({ imbalanceWm2, warmingK, years, split, doublingDivisor: 2 });
const tables = gregoryWorking(
  procedure,
  [
    annualSeries('net-flux', 'other', 'W/m²', years, imbalanceWm2),
    annualSeries('warming', 'temperature-anomaly', 'K', years, warmingK),
  ],
  {
    window: { start: 1, end: 6 },
    years,
    columns: [imbalanceWm2, warmingK],
    leftOut: [{ year: 3, reason: 'no value' }],
    caveats: [],
  },
  answer,
);
const rounding = { rel: 1e-9, abs: 0, why: 'points on a line' };

describe('gregoryWorking', () => {
  it('says what goes in, and which years do not', () => {
    expect(tables[0]?.rows).toEqual([
      ['imbalance N', 'net-flux'],
      ['warming ΔT', 'warming'],
      ['years', '1–6, 5 of them'],
      ['years left out', '3'],
      ['equilibrium is divided by', '2'],
    ]);
  });

  it('has a row for all years and for each part, dashes where a part is too short', () => {
    const [all, early, late] = tables[1]?.rows ?? [];
    for (const row of [all, early])
      expectClose([row?.[1], row?.[3], row?.[5], row?.[7]].map(Number), [4, 0.8, 5, 2.5], rounding);
    expect([all?.[0], early?.[0]]).toEqual(['all, 1–6 (n = 5)', '1–4 (n = 3)']);
    expect(late).toEqual(['5–6', ...Array<null>(7).fill(null)]);
  });

  it('has the bracket, which is one line where all points lie on it', () => {
    for (const row of tables[2]?.rows ?? []) expectClose(row.slice(1).map(Number), [4, 0.8, 5, 2.5], rounding);
    expect(tables[2]?.rows).toHaveLength(3);
    expect(tables[3]?.rows).toEqual([[answer.convention]]);
  });
});
